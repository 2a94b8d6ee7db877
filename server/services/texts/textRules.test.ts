import { expect, it } from 'vitest';
import { readTextRules } from './textRules.ts';

it('reads the rules, strict where nothing is said', () => {
  expect(readTextRules({ FURLONG_TEXT_PREFIXES: '+44, +351' })).toEqual({
    prefixes: ['+44', '+351'],
    perDay: 500,
    signUpsOpen: false,
  });
  expect(
    readTextRules({
      FURLONG_TEXT_PREFIXES: '+1',
      FURLONG_TEXTS_PER_DAY: '20',
      FURLONG_SIGN_UPS: 'open',
    }),
  ).toEqual({ prefixes: ['+1'], perDay: 20, signUpsOpen: true });
});

it.each([
  [{}, 'FURLONG_TEXT_PREFIXES must be set'],
  [{ FURLONG_TEXT_PREFIXES: '44' }, 'FURLONG_TEXT_PREFIXES must be set'],
  [{ FURLONG_TEXT_PREFIXES: '+44,' }, 'FURLONG_TEXT_PREFIXES must be set'],
  [{ FURLONG_TEXT_PREFIXES: '+44', FURLONG_TEXTS_PER_DAY: '0' }, 'FURLONG_TEXTS_PER_DAY'],
  [{ FURLONG_TEXT_PREFIXES: '+44', FURLONG_SIGN_UPS: 'yes' }, 'FURLONG_SIGN_UPS'],
])('refuses %o by name', (source, words) => {
  expect(() => readTextRules(source)).toThrow(words);
});
