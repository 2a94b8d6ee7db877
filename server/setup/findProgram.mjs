import fs from 'node:fs';
import path from 'node:path';

/**
 * Full path of a program, or undefined. Looks in the sbin folders too: Debian leaves them out of an
 * ordinary user's PATH, and that is where `mariadbd` lives.
 * @param {...string} names tried in order
 * @returns {string | undefined}
 */
export function findProgram(...names) {
  const folders = [...(process.env.PATH ?? '').split(':'), '/usr/local/sbin', '/usr/sbin', '/sbin'];
  for (const name of names) {
    for (const folder of folders.filter(Boolean)) {
      const file = path.join(folder, name);
      try {
        fs.accessSync(file, fs.constants.X_OK);
        if (fs.statSync(file).isFile()) return file;
      } catch {
        // Not here.
      }
    }
  }
  return undefined;
}
