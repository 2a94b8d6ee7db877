/**
 * The commands that install Debian packages, without anything merely recommended.
 * @param {string[]} packages
 * @returns {string[][]} argument vectors, to be run as root one after the other
 */
export function aptCommands(packages) {
  const env = ['env', 'DEBIAN_FRONTEND=noninteractive'];
  // Another apt may be busy (unattended upgrades): wait for it rather than fail.
  const wait = ['-o', 'DPkg::Lock::Timeout=300'];
  return [
    [...env, 'apt-get', ...wait, 'update'],
    [...env, 'apt-get', ...wait, 'install', '-y', '--no-install-recommends', ...packages],
  ];
}

/**
 * The same for a person to paste, when we may not install anything ourselves.
 * @param {string[]} packages
 * @returns {string}
 */
export function aptCommandToPaste(packages) {
  return (
    'sudo apt-get update && ' +
    `sudo apt-get install -y --no-install-recommends ${packages.join(' ')}`
  );
}
