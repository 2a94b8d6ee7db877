import { expect, test } from 'vitest';
import { startMode } from './startMode.mjs';

test('a bare start is the demo on loopback', () => {
  expect(startMode({})).toEqual({
    databaseUrl: undefined,
    host: '127.0.0.1',
    port: undefined,
    nodeEnv: 'development',
    demo: true,
    noDemoBecause: undefined,
  });
});

test('a database of yours: no demo, and the real thing', () => {
  const mode = startMode({ DATABASE_URL: 'mariadb://u:p@db.example:3306/furlong', PORT: '80' });
  expect(mode).toMatchObject({ demo: false, nodeEnv: 'production', port: 80 });
});

test('asking for fakes does not bring the demo to a database of yours', () => {
  const env = { DATABASE_URL: 'mariadb://u:p@db.example/furlong', FURLONG_FAKES: '1' };
  expect(startMode(env).demo).toBe(false);
});

test.each([
  [{ NODE_ENV: 'production' }, 'NODE_ENV is production'],
  [{ HOST: '0.0.0.0' }, 'HOST 0.0.0.0 can be reached from other machines'],
  [{ PUBLIC_URL: 'https://vans.example.org' }, 'PUBLIC_URL https://vans.example.org can be'],
  [{ HOST: '127.0.0.1.example.org' }, 'HOST 127.0.0.1.example.org can be reached'],
])('no demo with %o', (env, reason) => {
  const mode = startMode(env);
  expect(mode.demo).toBe(false);
  expect(mode.noDemoBecause).toContain(reason);
});

test.each(['127.0.0.1', '::1', 'localhost'])('%s is loopback', (HOST) => {
  expect(startMode({ HOST }).demo).toBe(true);
});

test.each(['abc', '-1', '70000', '80.5'])('PORT=%s is refused by name', (PORT) => {
  expect(() => startMode({ PORT })).toThrow('PORT must be a whole number');
});

test('a PUBLIC_URL on this machine keeps the demo, one that is no address is refused by name', () => {
  expect(startMode({ PUBLIC_URL: 'http://127.0.0.1:5173' }).demo).toBe(true);
  expect(() => startMode({ PUBLIC_URL: 'vans' })).toThrow('PUBLIC_URL must be an address');
});

test('a DATABASE_URL without a database is refused by name', () => {
  expect(() => startMode({ DATABASE_URL: 'mariadb://u:p@host/' })).toThrow(
    'DATABASE_URL must look',
  );
  expect(() => startMode({ DATABASE_URL: 'postgres://u:p@host/x' })).toThrow('DATABASE_URL');
});
