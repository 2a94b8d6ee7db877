/** A named road piece as a list of node ids. */
export interface NamedPiece {
  name: string;
  kind: string;
  refs: number[];
}

/**
 * Joins pieces of one name and kind end to end, so that lettering has a whole street to run along
 * instead of the short ways between crossings.
 */
export function chainNamedRoads(pieces: readonly NamedPiece[]): NamedPiece[] {
  const groups = new Map<string, NamedPiece[]>();
  for (const piece of pieces) {
    const key = `${piece.kind}\n${piece.name}`;
    const group = groups.get(key);
    if (group) group.push(piece);
    else groups.set(key, [piece]);
  }
  return [...groups.values()].flatMap(chainGroup);
}

function chainGroup(group: NamedPiece[]): NamedPiece[] {
  const byEnd = new Map<number, Set<NamedPiece>>();
  const ends = ({ refs }: NamedPiece) => [refs[0]!, refs.at(-1)!];
  for (const piece of group) {
    for (const end of ends(piece)) byEnd.set(end, (byEnd.get(end) ?? new Set()).add(piece));
  }
  const take = (end: number): NamedPiece | undefined => {
    const [piece] = byEnd.get(end) ?? [];
    if (piece) for (const at of ends(piece)) byEnd.get(at)?.delete(piece);
    return piece;
  };
  const chains: NamedPiece[] = [];
  for (const first of group) {
    if (!byEnd.get(first.refs[0]!)?.has(first)) continue;
    for (const at of ends(first)) byEnd.get(at)?.delete(first);
    const refs = [...first.refs];
    for (const side of ['tail', 'head'] as const) {
      for (let next = take(refs.at(-1)!); next; next = take(refs.at(-1)!)) {
        const ahead = next.refs[0] === refs.at(-1) ? next.refs : next.refs.toReversed();
        refs.push(...ahead.slice(1));
      }
      if (side === 'tail') refs.reverse();
    }
    chains.push({ ...first, refs });
  }
  return chains;
}
