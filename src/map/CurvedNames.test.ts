import { describe, expect, it } from 'vitest';
import { letterings } from './CurvedNames.ts';

const letters = [...'Tern Street'];
const widths = letters.map(() => 7);
const WIDTH = 77;

describe('letterings', () => {
  it('centres a name on a straight street, letter after letter', () => {
    const [glyphs] = letterings([{ x: 0, y: 5 }, { x: 200, y: 5 }], letters, widths); // prettier-ignore
    expect(glyphs!.map(({ text }) => text).join('')).toBe('Tern Street');
    expect(glyphs![0]!.x).toBeCloseTo(100 - WIDTH / 2 + 3.5, 6);
    expect(glyphs!.every(({ y, angle }) => y === 5 && Math.abs(angle) < 1e-9)).toBe(true);
  });

  it('never sets a name upside down', () => {
    const [glyphs] = letterings([{ x: 200, y: 0 }, { x: 0, y: 0 }], letters, widths); // prettier-ignore
    const xs = glyphs!.map(({ x }) => x);
    expect(xs).toEqual(xs.toSorted((a, b) => a - b));
    expect(glyphs!.every(({ angle }) => Math.abs(angle) < 1e-9)).toBe(true);
  });

  it('follows a curve', () => {
    const arc = Array.from({ length: 40 }, (_, i) => {
      const turn = Math.PI * (1 + i / 39);
      return { x: 100 + 90 * Math.cos(turn), y: 100 + 90 * Math.sin(turn) };
    });
    const [glyphs] = letterings(arc, letters, widths);
    for (const { x, y } of glyphs!) expect(Math.hypot(x - 100, y - 100)).toBeCloseTo(90, 0);
    expect(glyphs!.at(-1)!.angle).toBeGreaterThan(glyphs![0]!.angle);
  });

  it('says nothing where the street is too short or turns too sharply', () => {
    expect(letterings([{ x: 0, y: 0 }, { x: 60, y: 0 }], letters, widths)).toEqual([]); // prettier-ignore
    const hairpin = [{ x: 0, y: 0 }, { x: 50, y: 0 }, { x: 0, y: 8 }]; // prettier-ignore
    expect(letterings(hairpin, letters, widths)).toEqual([]);
  });

  it('repeats itself along a long street', () => {
    const found = letterings([{ x: 0, y: 0 }, { x: 1700, y: 0 }], letters, widths); // prettier-ignore
    expect(found).toHaveLength(4);
  });
});
