import { describe, expect, it } from 'vitest';
import { countSegments } from './countSegments.ts';
import { septetsOf } from './gsm7.ts';

const count = (text: string) => {
  const { encoding, segments } = countSegments(text);
  return [encoding, segments];
};

// Boundaries: 140 octets a part, 6 of them the header when joined, by the arithmetic of 3GPP
// TS 23.038 and TS 23.040 §9.2.3.24.1; the table is the one published with SMS segment calculators.
describe('countSegments', () => {
  it.each([
    [0, 0],
    [1, 1],
    [160, 1],
    [161, 2],
    [306, 2],
    [307, 3],
    [459, 3],
    [460, 4],
  ])('%i letters of GSM-7 are %i parts', (letters, parts) => {
    expect(count('a'.repeat(letters))).toEqual(['GSM-7', parts]);
  });

  it.each([
    [70, 1],
    [71, 2],
    [134, 2],
    [135, 3],
  ])('%i letters outside GSM-7 are %i parts', (letters, parts) => {
    expect(count('ж'.repeat(letters))).toEqual(['UCS-2', parts]);
  });

  it('never splits the two septets of an extension letter', () => {
    expect(countSegments(`${'a'.repeat(159)}€`)).toMatchObject({ units: 161, segments: 2 });
    const straddling = countSegments(`${'a'.repeat(152)}€${'a'.repeat(10)}`);
    expect(straddling).toEqual({
      encoding: 'GSM-7',
      units: 164,
      segments: 2,
      partUnits: [152, 12],
    });
  });

  it('never splits a surrogate pair', () => {
    expect(count('🐩'.repeat(35))).toEqual(['UCS-2', 1]);
    expect(countSegments('🐩'.repeat(36))).toMatchObject({ segments: 2, partUnits: [66, 6] });
  });

  it('knows which letters leave GSM-7', () => {
    for (const letter of '’“”–—…\t`ç') expect(count(letter)).toEqual(['UCS-2', 1]);
    for (const letter of 'ÇÄñü¡@£\n') expect(septetsOf(letter)).toBe(1);
    for (const letter of '^{}\\[~]|€\f') expect(septetsOf(letter)).toBe(2);
  });

  it('holds the whole alphabet: 127 letters beside the escape code, 10 extensions', () => {
    const all = Array.from({ length: 0x10000 }, (_, code) => String.fromCharCode(code));
    expect(all.filter((letter) => septetsOf(letter) === 1)).toHaveLength(127);
    expect(all.filter((letter) => septetsOf(letter) === 2)).toHaveLength(10);
  });
});
