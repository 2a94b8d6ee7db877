import { describe, expect, it } from 'vitest';
import { normalDraw } from '../normalDraw.ts';
import { doorPermille } from './doorPermille.ts';

const usualSeconds = 720;
const took = (...seconds: number[]) =>
  doorPermille(seconds.map((actualSeconds) => ({ usualSeconds, actualSeconds })));

describe('doorPermille', () => {
  it('is the usual without visits, and with visits as usual', () => {
    expect(took()).toEqual({ permille: 1000, visits: 0 });
    expect(took(720, 720, 720)).toEqual({ permille: 1000, visits: 3 });
  });

  it('is the posterior mean of normal prior and normal noise on logs', () => {
    // By hand: n · 0.25² ÷ (n · 0.25² + 0.4²) of ln 2 is 0.28090 for one visit, 0.82418 for twelve.
    expect(took(1440)).toEqual({ permille: Math.round(1000 * 2 ** (0.0625 / 0.2225)), visits: 1 });
    expect(took(...Array.from({ length: 12 }, () => 1440)).permille).toBe(
      Math.round(1000 * 2 ** (0.75 / 0.91)),
    );
    // Twice and half as long cancel.
    expect(took(1440, 360).permille).toBe(1000);
  });

  it('leaves out clocks nobody believes, at both ends', () => {
    expect(took(720, 5, 32_400)).toEqual({ permille: 1000, visits: 1 });
    expect(took(180, 2880).visits).toBe(2);
    expect(took(179, 2881)).toEqual({ permille: 1000, visits: 0 });
    expect(doorPermille([{ usualSeconds: 0, actualSeconds: 60 }]).visits).toBe(0);
  });

  it('names seconds that are none', () => {
    expect(() => took(-1)).toThrow('actualSeconds must be whole seconds, 0 or more, got -1.');
    expect(() => doorPermille([{ usualSeconds: 1.5, actualSeconds: 1 }])).toThrow('usualSeconds');
  });

  it('comes nearer to the truth than taking every door as usual, or the last visit', () => {
    let seed = 11;
    const random = () => (seed = (seed * 16_807) % 2_147_483_647) / 2_147_483_647;
    const off = { learned: 0, usual: 0, last: 0 };
    for (let household = 0; household < 400; household += 1) {
      const truth = 0.25 * normalDraw(random);
      const visits = Array.from({ length: 5 }, () =>
        Math.round(usualSeconds * Math.exp(truth + 0.4 * normalDraw(random))),
      );
      off.learned += Math.abs(Math.log(took(...visits).permille / 1000) - truth);
      off.usual += Math.abs(truth);
      off.last += Math.abs(Math.log(visits.at(-1)! / usualSeconds) - truth);
    }
    expect(off.learned).toBeLessThan(0.75 * off.usual);
    expect(off.learned).toBeLessThan(0.5 * off.last);
  });
});
