import { expect, test } from 'vitest';
import { aptCommands, aptCommandToPaste } from './aptCommands.mjs';

test('a person without rights gets one line to paste', () => {
  expect(aptCommandToPaste(['mariadb-server-core', 'mariadb-client-core'])).toBe(
    'sudo apt-get update && sudo apt-get install -y --no-install-recommends ' +
      'mariadb-server-core mariadb-client-core',
  );
});

test('installing asks nothing, takes nothing that is only recommended and waits for other apts', () => {
  const [update, install] = aptCommands(['chromium']);
  expect(update?.at(-1)).toBe('update');
  expect(install).toContain('DEBIAN_FRONTEND=noninteractive');
  expect(install).toContain('DPkg::Lock::Timeout=300');
  expect(install?.slice(-4)).toEqual(['install', '-y', '--no-install-recommends', 'chromium']);
});
