import { describe, expect, it } from 'vitest';
import { fitWords, gainWords, recordsWords } from './fitWords.ts';

const fit = {
  state: 'kept' as const,
  records: 412,
  leftOut: 9,
  heldOut: 43,
  beforeSeconds: 300,
  afterSeconds: 207,
};

describe('fitWords', () => {
  it('says what a kept fit gains', () => {
    expect(fitWords(fit)).toBe('Kept: misses 31 % smaller on 43 visits it had not seen.');
    expect(gainWords({ ...fit, afterSeconds: 299 })).toBe('misses a little smaller');
    expect(gainWords({ ...fit, beforeSeconds: 0, afterSeconds: 0 })).toBe('misses as before');
  });

  it('says why a fit is not kept', () => {
    expect(fitWords({ ...fit, state: 'notKept', afterSeconds: 300 })).toBe(
      'Not kept: no better than before on 43 visits it had not seen.',
    );
    expect(fitWords({ ...fit, state: 'notKept', heldOut: 4 })).toBe(
      'Not kept: too few visits to judge it by, 4 of 20.',
    );
  });

  it('counts what was learned from', () => {
    expect(recordsWords(fit)).toBe('From 412 pet visits; 9 with odd clocks left out.');
    expect(recordsWords({ ...fit, records: 1, leftOut: 0 })).toBe('From 1 pet visit.');
  });
});
