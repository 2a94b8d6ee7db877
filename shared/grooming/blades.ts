/** A clipper blade as makers label it. The label fixes no length; the millimetres are the usual ones. */
export interface Blade {
  label: string;
  /** Left when cutting against growth. */
  lengthTenthsMm: number;
}

/** Usual lengths, shortest first (common practice: trade suppliers' charts, which differ by up to half). */
export const blades: readonly Blade[] = [
  { label: '50', lengthTenthsMm: 2 },
  { label: '40', lengthTenthsMm: 3 },
  { label: '30', lengthTenthsMm: 5 },
  { label: '15', lengthTenthsMm: 12 },
  { label: '10', lengthTenthsMm: 15 },
  { label: '9', lengthTenthsMm: 20 },
  { label: '8½', lengthTenthsMm: 28 },
  { label: '7F', lengthTenthsMm: 32 },
  { label: '5F', lengthTenthsMm: 63 },
  { label: '4F', lengthTenthsMm: 95 },
  { label: '3F', lengthTenthsMm: 130 },
];

/** Blades that are never a default: they reach the skin. Thinner than #10. */
export const shortestDefaultTenthsMm = 15;

/**
 * Usual guide combs over a blade, shortest first. Marks differ between makers' sets, so only lengths
 * are kept (from memory, low confidence: 6, 8, 10, 13, 16, 19, 22 and 32 mm).
 */
export const guideCombsTenthsMm: readonly number[] = [60, 80, 100, 130, 160, 190, 220, 320];

/**
 * What a clipper cut leaves, in tenths of a millimetre: a blade with growth about twice as much as
 * against (two suppliers agree on the ratio); a guide comb, which holds the coat off the blade, only
 * about a seventh more (our own guess). No tool named = a blade.
 */
export function leftTenthsMm(cut: {
  tool?: 'blade' | 'comb';
  lengthTenthsMm: number;
  direction: 'with' | 'against';
}): number {
  if (cut.direction === 'against') return cut.lengthTenthsMm;
  return cut.tool === 'comb' ? Math.round(cut.lengthTenthsMm * 1.15) : cut.lengthTenthsMm * 2;
}

/**
 * Blade steps between two lengths: places apart on the ladder of blades and, above the longest
 * blade, guide combs, in between by ratio. Never negative; a part of a step is a fraction.
 */
export function bladeSteps(oneTenthsMm: number, otherTenthsMm: number): number {
  return Math.abs(place(oneTenthsMm) - place(otherTenthsMm));
}

const ladder: readonly number[] = [
  ...blades.map(({ lengthTenthsMm }) => lengthTenthsMm),
  ...guideCombsTenthsMm.filter((length) => length > blades.at(-1)!.lengthTenthsMm),
];

const logLadder = ladder.map(Math.log);

/** Past the longest comb a step is as large as the last one on the ladder. */
const lastLogRatio = logLadder.at(-1)! - logLadder.at(-2)!;

function place(tenthsMm: number): number {
  const log = Math.log(Math.max(tenthsMm, ladder[0]!));
  const top = logLadder.length - 1;
  if (log >= logLadder[top]!) return top + (log - logLadder[top]!) / lastLogRatio;
  let below = 0;
  while (logLadder[below + 1]! <= log) below += 1;
  return below + (log - logLadder[below]!) / (logLadder[below + 1]! - logLadder[below]!);
}
