/**
 * The tint of a length in tenths of a millimetre: short is dark collar, long is pale. On a scale of
 * ratios, 1 mm to 40 mm, because a blade step is a ratio.
 */
export function lengthTint(tenthsMm: number): string {
  const place = Math.log(Math.max(10, tenthsMm) / 10) / Math.log(40);
  return mix([0x17, 0x54, 0x4e], [0xd5, 0xe5, 0xe0], Math.min(1, place));
}

/** The same for scissor work: a deeper apricot is shorter. */
export function scissorTint(tenthsMm: number): string {
  const place = Math.log(Math.max(100, tenthsMm) / 100) / Math.log(6);
  return mix([0xd8, 0x74, 0x34], [0xf4, 0xbd, 0x95], Math.min(1, place));
}

function mix(from: readonly number[], to: readonly number[], share: number): string {
  const parts = from.map((value, index) => Math.round(value + (to[index]! - value) * share));
  return `#${parts.map((part) => part.toString(16).padStart(2, '0')).join('')}`;
}
