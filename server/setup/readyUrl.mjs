/**
 * The address in a server's ready line; undefined for any other line.
 * @param {string} line
 * @returns {string | undefined}
 */
export function readyUrl(line) {
  return /^furlong ready (https?:\/\/\S+)\s*$/.exec(line)?.[1];
}
