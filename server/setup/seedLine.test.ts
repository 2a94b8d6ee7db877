import { expect, test } from 'vitest';
import { seedLine } from './seedLine.mjs';

test('progress, sign-ins and words for people are told apart', () => {
  const signIns = [{ role: 'operator', email: 'odile@saltmarsh.example', password: 'x' }];
  expect(seedLine('{"step":"visits","done":3,"of":12}')).toEqual({ progress: 'visits 3 of 12' });
  expect(seedLine('{"step":"top up"}')).toEqual({ progress: 'top up' });
  expect(seedLine(JSON.stringify({ signIns }))).toEqual({ signIns });
  expect(seedLine('Warning: late')).toEqual({ text: 'Warning: late' });
  expect(seedLine('{"level":30}')).toEqual({ text: '{"level":30}' });
  expect(seedLine('null')).toEqual({ text: 'null' });
});
