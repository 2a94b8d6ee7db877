import { describe, expect, it } from 'vitest';
import { chainNamedRoads } from './chainNamedRoads.ts';

const piece = (name: string, refs: number[], kind = 'street') => ({ name, kind, refs });

describe('chainNamedRoads', () => {
  it('joins pieces of one name on both sides, whatever their direction', () => {
    const chains = chainNamedRoads([
      piece('Tern Street', [3, 4]),
      piece('Tern Street', [5, 4]),
      piece('Tern Street', [1, 2, 3]),
    ]);
    expect(chains).toHaveLength(1);
    const refs = chains[0]!.refs;
    expect(refs[0]! < refs.at(-1)! ? refs : refs.toReversed()).toEqual([1, 2, 3, 4, 5]);
  });

  it('keeps other names, other kinds and far pieces apart', () => {
    const chains = chainNamedRoads([
      piece('Tern Street', [1, 2]),
      piece('Gull Lane', [2, 3]),
      piece('Tern Street', [2, 9], 'primary'),
      piece('Tern Street', [7, 8]),
    ]);
    expect(chains).toHaveLength(4);
  });

  it('ends on a street that runs in a ring', () => {
    expect(chainNamedRoads([piece('Circle', [1, 2, 3]), piece('Circle', [3, 4, 1])])).toHaveLength(
      1,
    );
  });
});
