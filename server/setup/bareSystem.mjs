import fs from 'node:fs';
import path from 'node:path';
import { runToEnd } from './childProcess.mjs';
import { findProgram } from './findProgram.mjs';
import { step } from './say.mjs';
import { SetupError } from './setupError.mjs';

const CERTIFICATES = '/usr/local/share/host-certificates.crt';

/**
 * Makes a bare Debian with nothing but Node and npm in a folder.
 * @param {string} folder empty
 * @param {import('./hostAccess.mjs').HostAccess} access
 * @returns {Promise<Record<string, string>>} the environment of whoever works in it
 */
export async function makeBareSystem(folder, access) {
  await step(`Making a bare Debian ${access.release}`, (progress) =>
    runToEnd(
      'debootstrap',
      findProgram('debootstrap') ?? 'debootstrap',
      ['--variant=minbase', access.release, folder, access.mirror],
      { onLine: progress },
    ),
  );
  write(folder, '/etc/apt/sources.list', access.aptSources);
  write(folder, '/etc/apt/apt.conf.d/99host', `${access.aptConfig}\n`);
  for (const file of ['/etc/hosts', '/etc/resolv.conf']) {
    fs.copyFileSync(file, path.join(folder, file));
  }
  copyNode(folder);
  const env = {
    ...access.env,
    PATH: '/usr/local/sbin:/usr/local/bin:/usr/sbin:/usr/bin:/sbin:/bin',
    HOME: '/root',
    LANG: 'C.UTF-8',
    // A newer npm somewhere is no part of the proof, and its notice would follow the last line.
    npm_config_update_notifier: 'false',
  };
  if (!access.certificates) return env;
  // Beside Debian's own bundle, which a package may replace on the way.
  fs.copyFileSync(access.certificates, path.join(folder, CERTIFICATES));
  return { ...env, NODE_EXTRA_CA_CERTS: CERTIFICATES, npm_config_cafile: CERTIFICATES };
}

/**
 * The command that runs something in such a folder, in mount and process namespaces of its own:
 * when it ends, however it ends, no mount is left behind and no process either.
 * @param {string} folder
 * @param {string[]} command
 * @returns {string[]}
 */
export function insideBareSystem(folder, command) {
  const enter = 'mount --rbind /dev "$0/dev" && exec chroot "$0" "$@"';
  const namespaces = ['--mount', '--pid', '--fork', '--kill-child', `--mount-proc=${folder}/proc`];
  return ['unshare', ...namespaces, 'sh', '-c', enter, folder, ...command];
}

/** @param {string} folder */
function copyNode(folder) {
  const npm = findProgram('npm');
  if (!npm) throw new SetupError('npm is not on PATH: it is what the bare system gets from here.');
  const bin = path.join(folder, 'usr/local/bin');
  fs.copyFileSync(process.execPath, path.join(bin, 'node'));
  // npm on PATH is a link into its own tree: <tree>/bin/npm-cli.js.
  const tree = path.resolve(fs.realpathSync(npm), '../..');
  const target = path.join(folder, 'usr/local/lib/node_modules/npm');
  fs.cpSync(tree, target, { recursive: true, dereference: true });
  for (const name of ['npm', 'npx']) {
    fs.symlinkSync(`../lib/node_modules/npm/bin/${name}-cli.js`, path.join(bin, name));
  }
}

/** @param {string} folder @param {string} file @param {string} text */
function write(folder, file, text) {
  fs.writeFileSync(path.join(folder, file), text);
}
