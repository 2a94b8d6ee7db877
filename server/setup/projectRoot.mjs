import path from 'node:path';
import { fileURLToPath } from 'node:url';

/** The checkout this file belongs to, wherever `npm` was called from. */
export const projectRoot = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..');

/**
 * Where this checkout keeps what it makes: database, keys, area, passwords.
 * `FURLONG_DATA` moves it (a server with its own disk); else `.data` in the checkout.
 */
export const dataFolder = path.resolve(projectRoot, process.env.FURLONG_DATA || '.data');
