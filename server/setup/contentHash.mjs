import crypto from 'node:crypto';
import fs from 'node:fs';
import path from 'node:path';

/**
 * Hash of the names and bytes of files and folders. Content, not times: a git checkout touches
 * times without changing anything, and changes files without making them newer than a build.
 * @param {string} root
 * @param {string[]} places files or folders relative to root; an absent one counts as absent
 * @param {(file: string) => boolean} [counts] whether a file matters
 * @returns {string}
 */
export function contentHash(root, places, counts = () => true) {
  const hash = crypto.createHash('sha256');
  for (const file of places.flatMap((place) => filesUnder(root, place)).filter(counts)) {
    hash
      .update(`${file}\0`)
      .update(fs.readFileSync(path.join(root, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

/** @param {string} root @param {string} place @returns {string[]} */
function filesUnder(root, place) {
  const full = path.join(root, place);
  if (!fs.existsSync(full)) return [];
  if (fs.statSync(full).isFile()) return [place];
  return fs
    .readdirSync(full)
    .sort()
    .flatMap((name) => filesUnder(root, path.posix.join(place, name)));
}
