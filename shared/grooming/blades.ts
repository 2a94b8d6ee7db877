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
 * What a clipper cut leaves, in tenths of a millimetre: with growth about twice as much as against
 * (two suppliers agree on the ratio).
 */
export function leftTenthsMm(cut: {
  lengthTenthsMm: number;
  direction: 'with' | 'against';
}): number {
  return cut.direction === 'with' ? cut.lengthTenthsMm * 2 : cut.lengthTenthsMm;
}
