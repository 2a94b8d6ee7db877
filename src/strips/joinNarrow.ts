import type { Tower } from './types.ts';

/**
 * Neighbouring towers of one pet and family joined while one of them would be narrower than
 * `leastSeconds`: slivers of a pixel or two are ink, not information. A joined tower is as tall as
 * its tallest step and keeps every step for the tooltip.
 */
export function joinNarrow(towers: readonly Tower[], leastSeconds: number): Tower[] {
  const joined: Tower[] = [];
  for (const tower of towers) {
    const before = joined.at(-1);
    const fits = before && before.petId === tower.petId && before.family === tower.family;
    if (fits && (widthOf(before) < leastSeconds || widthOf(tower) < leastSeconds))
      joined[joined.length - 1] = {
        ...before,
        toSeconds: tower.toSeconds,
        attentionPermille: Math.max(before.attentionPermille, tower.attentionPermille),
        steps: [...before.steps, ...tower.steps],
      };
    else joined.push(tower);
  }
  return joined;
}

function widthOf(tower: Tower): number {
  return tower.toSeconds - tower.fromSeconds;
}
