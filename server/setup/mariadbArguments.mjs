/**
 * @typedef {object} MariadbPlace
 * @property {string} dataDir absolute
 * @property {number} port
 * @property {string} initFile SQL run at start, before anyone may connect
 * @property {string} logFile
 * @property {boolean} asRoot whether we are root: then, and only then, mariadbd must be told
 * @property {boolean} throwaway nothing needs to survive a crash (tests)
 */

/**
 * Command line of our own `mariadbd`. `--no-defaults` keeps the machine's my.cnf out, and with it
 * Debian's utf8mb4: hence the character set here.
 * @param {MariadbPlace} place
 * @returns {string[]}
 */
export function mariadbArguments({ dataDir, port, initFile, logFile, asRoot, throwaway }) {
  return [
    '--no-defaults',
    `--datadir=${dataDir}`,
    '--bind-address=127.0.0.1',
    `--port=${port}`,
    // Relative to the data folder: a full path may pass the 107 bytes a socket's name can have.
    '--socket=furlong.sock',
    '--pid-file=furlong.pid',
    `--init-file=${initFile}`,
    `--log-error=${logFile}`,
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    '--default-time-zone=+00:00',
    '--skip-name-resolve',
    '--skip-log-bin',
    '--performance-schema=OFF',
    '--max-connections=100',
    '--innodb-buffer-pool-size=128M',
    '--aria-pagecache-buffer-size=8M',
    '--key-buffer-size=1M',
    ...(asRoot ? ['--user=root'] : []),
    ...(throwaway ? notDurable : []),
  ];
}

/**
 * Command line of `mariadb-install-db`. Root signs in only as the same person on the same machine
 * (by socket), so no account without a password exists at any time.
 * @param {{ dataDir: string, asRoot: boolean, systemUser: string }} place
 * @returns {string[]}
 */
export function installDbArguments({ dataDir, asRoot, systemUser }) {
  return [
    '--no-defaults',
    `--datadir=${dataDir}`,
    '--auth-root-authentication-method=socket',
    `--auth-root-socket-user=${systemUser}`,
    '--skip-test-db',
    '--skip-name-resolve',
    ...(asRoot ? ['--user=root'] : []),
    ...notDurable,
  ];
}

// The install fills a new folder that is renamed into place only when complete: no need to flush.
const notDurable = [
  '--innodb-flush-log-at-trx-commit=0',
  '--sync-binlog=0',
  '--innodb-doublewrite=0',
  '--innodb-flush-method=nosync',
];
