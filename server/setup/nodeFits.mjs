/**
 * Whether a Node version lies in a range such as '>=20.19 <21 || >=22.12'. Only `>=`, `<`, spaces
 * and `||` are understood: this runs before any package is installed.
 * @param {string} version e.g. '20.20.2'
 * @param {string} range
 * @returns {boolean}
 */
export function nodeFits(version, range) {
  return range.split('||').some((part) =>
    part
      .trim()
      .split(/\s+/)
      .every((rule) => {
        const [, sign, bound] = /^(>=|<)(\d+(?:\.\d+)*)$/.exec(rule) ?? [];
        if (!bound) throw new Error(`package.json engines.node: cannot read "${rule}"`);
        const order = compareVersions(version, bound);
        return sign === '<' ? order < 0 : order >= 0;
      }),
  );
}

/** @param {string} a @param {string} b */
function compareVersions(a, b) {
  const left = a.split('.').map(Number);
  const right = b.split('.').map(Number);
  for (let i = 0; i < 3; i++) {
    const difference = (left[i] ?? 0) - (right[i] ?? 0);
    if (difference !== 0) return difference;
  }
  return 0;
}
