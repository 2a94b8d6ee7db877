import { expect, test } from 'vitest';
import { installDbArguments, mariadbArguments } from './mariadbArguments.mjs';

const place = {
  dataDir: `/a/${'long/'.repeat(40)}data/mariadb`,
  port: 40123,
  initFile: '/d/init.sql',
  logFile: '/d/mariadb.log',
  asRoot: false,
  throwaway: false,
};

test('--no-defaults comes first, or mariadbd ignores it', () => {
  expect(mariadbArguments(place)[0]).toBe('--no-defaults');
  expect(installDbArguments({ ...place, systemUser: 'ada' })[0]).toBe('--no-defaults');
});

test('it listens on loopback alone, in UTF-8 and UTC', () => {
  expect(mariadbArguments(place)).toEqual(
    expect.arrayContaining([
      '--bind-address=127.0.0.1',
      '--port=40123',
      '--character-set-server=utf8mb4',
      '--default-time-zone=+00:00',
    ]),
  );
});

test('the socket name keeps under 107 bytes however deep the checkout lies', () => {
  const socket = mariadbArguments(place).find((arg) => arg.startsWith('--socket='));
  expect(socket).toBe('--socket=furlong.sock');
});

test('only root says --user=root', () => {
  expect(mariadbArguments(place)).not.toContain('--user=root');
  expect(mariadbArguments({ ...place, asRoot: true })).toContain('--user=root');
  expect(installDbArguments({ ...place, systemUser: 'ada' })).not.toContain('--user=root');
});

test('only a throwaway database gives up durability', () => {
  const loose = '--innodb-flush-log-at-trx-commit=0';
  expect(mariadbArguments(place)).not.toContain(loose);
  expect(mariadbArguments({ ...place, throwaway: true })).toContain(loose);
});

test("the database's root is the system's own user, by socket, never an empty password", () => {
  const args = installDbArguments({ ...place, systemUser: 'ada' });
  expect(args).toContain('--auth-root-authentication-method=socket');
  expect(args).toContain('--auth-root-socket-user=ada');
});
