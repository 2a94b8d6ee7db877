/** One standard normal draw from two uniform ones (Box and Muller 1958, the cosine half). */
export function normalDraw(random: () => number): number {
  // 1 − u lies in (0, 1], so the logarithm is finite.
  const radius = Math.sqrt(-2 * Math.log(1 - random()));
  return radius * Math.cos(2 * Math.PI * random());
}
