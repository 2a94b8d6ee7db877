import { expect, it } from 'vitest';
import { logSerializers } from './log.ts';

it('leaves links and signatures out of a logged call', () => {
  const url = (text: string) => logSerializers.req({ id: '1', method: 'GET', url: text }).url;
  expect(url('/a/AAAAAAAAAAAAAAAAAAAA-_')).toBe('/a/…');
  expect(url('/api/invitations/AAAAAAAAAAAAAAAAAAAAAA/open?x=1')).toBe(
    '/api/invitations/…/open?x=1',
  );
  expect(url('/hooks/sms/status?text=0190&mark=secret')).toBe('/hooks/sms/status?text=0190&mark=…');
  // Ids are 36 letters and stay: they are what a log is searched for.
  const id = '/api/runs/0190d3a4-7b1c-7c3e-9f5a-0123456789ab/events';
  expect(url(id)).toBe(id);
});

it('leaves statements and values out of a logged error', () => {
  const error = Object.assign(
    new Error("Data too long for column 'phone'\nsql: INSERT INTO x - parameters:['+44770']"),
    { name: 'SequelizeDatabaseError', sql: 'INSERT', parameters: ['+44770'], code: 'ER_LONG' },
  );
  const told = logSerializers.err(error);
  expect(told).toMatchObject({ type: 'SequelizeDatabaseError', code: 'ER_LONG' });
  expect(told.message).toBe("Data too long for column 'phone'");
  expect(told.stack).toContain('\n    at ');
  expect(JSON.stringify(told)).not.toMatch(/44770|INSERT/);
});
