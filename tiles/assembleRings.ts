/**
 * Joins ways end to end into closed rings of node ids. Ways of a multipolygon come in any order and
 * direction; what never closes (the extract's border cut it) is left out.
 */
export function assembleRings(ways: readonly (readonly number[])[]): number[][] {
  const rings: number[][] = [];
  const open: number[][] = [];
  for (const way of ways) {
    if (way.length < 2) continue;
    if (way[0] === way.at(-1)) rings.push([...way]);
    else open.push([...way]);
  }
  const byEnd = new Map<number, Set<number[]>>();
  const remember = (piece: number[]) => {
    for (const end of [piece[0]!, piece.at(-1)!]) {
      byEnd.set(end, (byEnd.get(end) ?? new Set()).add(piece));
    }
  };
  const forget = (piece: number[]) => {
    for (const end of [piece[0]!, piece.at(-1)!]) byEnd.get(end)?.delete(piece);
  };
  open.forEach(remember);
  const used = new Set<number[]>();
  for (const piece of open) {
    if (used.has(piece)) continue;
    used.add(piece);
    forget(piece);
    const ring = piece;
    while (ring[0] !== ring.at(-1)) {
      const [next] = byEnd.get(ring.at(-1)!) ?? [];
      if (!next) break;
      used.add(next);
      forget(next);
      const ahead = next[0] === ring.at(-1) ? next : next.toReversed();
      for (let i = 1; i < ahead.length; i++) ring.push(ahead[i]!);
    }
    if (ring.length > 3 && ring[0] === ring.at(-1)) rings.push(ring);
  }
  return rings;
}
