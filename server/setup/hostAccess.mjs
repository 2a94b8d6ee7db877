import { execFileSync } from 'node:child_process';
import fs from 'node:fs';
import { debianSources } from './debianSources.mjs';

/**
 * @typedef {object} HostAccess how this machine reaches packages; a bare system is given the same
 * @property {string} mirror Debian's
 * @property {string} release e.g. 'bookworm'
 * @property {string} aptSources for /etc/apt/sources.list
 * @property {string} aptConfig for a file in /etc/apt/apt.conf.d
 * @property {string | undefined} certificates file of trusted certificates
 * @property {Record<string, string>} env for npm and other programs; never a credential
 */

/** @returns {HostAccess} */
export function hostAccess() {
  const release = /^VERSION_CODENAME=(\w+)$/m.exec(fs.readFileSync('/etc/os-release', 'utf8'))?.[1];
  if (!release) throw new Error('/etc/os-release names no VERSION_CODENAME: this is no Debian');
  const sources = debianSources(
    output(
      'apt-get',
      'indextargets',
      '--format',
      '$(REPO_URI) $(RELEASE) $(COMPONENT) $(CREATED_BY)',
    ),
    release,
  );
  return {
    ...sources,
    release,
    aptConfig: output('apt-config', 'dump', 'Acquire')
      .split('\n')
      .filter((line) => /^Acquire::(https?::Proxy|Check-)[^:]* "/i.test(line))
      .join('\n'),
    certificates: firstFile(process.env.NODE_EXTRA_CA_CERTS, npmSetting('cafile')),
    env: { ...proxyVariables(), ...npmSettings() },
  };
}

function proxyVariables() {
  const names = ['http_proxy', 'https_proxy', 'no_proxy'].flatMap((n) => [n, n.toUpperCase()]);
  return defined(Object.fromEntries(names.map((name) => [name, process.env[name]])));
}

function npmSettings() {
  const names = ['registry', 'proxy', 'https-proxy'];
  return defined(
    Object.fromEntries(names.map((n) => [`npm_config_${n.replace('-', '_')}`, npmSetting(n)])),
  );
}

/** @param {string} name */
function npmSetting(name) {
  const value = output('npm', 'config', 'get', name).trim();
  return value === 'null' || value === 'undefined' || value === '' ? undefined : value;
}

/** @param {Record<string, string | undefined>} values @returns {Record<string, string>} */
function defined(values) {
  const entries = Object.entries(values).filter(([, value]) => value);
  return /** @type {Record<string, string>} */ (Object.fromEntries(entries));
}

/** @param {(string | undefined)[]} files */
function firstFile(...files) {
  return files.find((file) => file && fs.existsSync(file));
}

/** @param {string} command @param {string[]} args */
function output(command, ...args) {
  return execFileSync(command, args, { encoding: 'utf8' });
}
