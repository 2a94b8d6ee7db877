/**
 * Why node_modules is not what package-lock.json asks for; undefined when it is. Compares the lock
 * with npm's own record of what it installed (node_modules/.package-lock.json), which npm writes
 * last: an install that was cut short leaves none.
 *
 * @typedef {{ version?: string, optional?: boolean, devOptional?: boolean, link?: boolean, os?: string[], cpu?: string[] }} LockedPackage
 * @typedef {{ packages?: Record<string, LockedPackage> }} Lock
 *
 * @param {Lock} wanted
 * @param {Lock | undefined} installed
 * @param {{ os: string, cpu: string }} machine
 * @returns {string | undefined}
 */
export function moduleDifference(wanted, installed, machine) {
  if (!installed?.packages) return 'they are not installed';
  for (const [place, { version, optional }] of Object.entries(wanted.packages ?? {})) {
    if (place === '') continue; // The project itself.
    const found = installed.packages[place];
    // An optional package is left out where it does not fit the machine.
    if (!found && optional) continue;
    if (!found) return `${place} is missing`;
    if (found.version !== version) return `${place} is ${found.version}, not ${version}`;
  }
  for (const [place, { os, cpu }] of Object.entries(installed.packages)) {
    if (!wanted.packages?.[place]) return `${place} is no longer wanted`;
    // A node_modules copied from another kind of machine.
    if (!admits(os, machine.os) || !admits(cpu, machine.cpu))
      return `${place} is for another machine`;
  }
  return undefined;
}

/** @param {string[] | undefined} allowed @param {string} value */
function admits(allowed, value) {
  if (!allowed) return true;
  const named = allowed.filter((name) => !name.startsWith('!'));
  return !allowed.includes(`!${value}`) && (named.length === 0 || named.includes(value));
}
