/**
 * Debian's own repositories among what apt knows; the machine's other ones stay out.
 * @param {string} targets lines of `<uri> <release> <component> <created by>`
 * @param {string} release
 */
export function debianSources(targets, release) {
  const rows = [...new Set(targets.split('\n'))]
    .map((line) => line.trim().split(' '))
    .filter(([, name = '', , by]) => by === 'Packages' && name.split('-')[0] === release);
  const main = rows.find(([, name]) => name === release);
  if (!main?.[0])
    throw new Error(`apt knows no repository of ${release}: run apt-get update first`);
  const lines = rows.map(([uri, name, component]) => `deb ${uri} ${name} ${component}`);
  return { mirror: main[0], aptSources: `${lines.join('\n')}\n` };
}
