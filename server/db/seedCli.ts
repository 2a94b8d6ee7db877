import { clock } from '#server/clock.ts';
import { database } from './database.ts';
import { seedDemo } from './seed/seedDemo.ts';

const say = (value: object) => process.stdout.write(`${JSON.stringify(value)}\n`);
let last = 0;
const signIns = await seedDemo(clock.now(), (step, done, of) => {
  const now = Date.now();
  if (now - last < 300 && done !== of) return;
  last = now;
  say({ step, done, of });
});
if (signIns) say({ signIns });
await database.close();
