import { database } from './database.ts';
import { migrate } from './migrate.ts';

const count = await migrate();
process.stdout.write(`${JSON.stringify({ step: 'migrated', count })}\n`);
await database.close();
