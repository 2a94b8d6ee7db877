/**
 * A seeded generator for one named thing (mulberry32 from an FNV-1a hash, both public domain): the
 * demo is the same on every machine, whatever order it is made in.
 */
export function randomFor(name: string): () => number {
  let hash = 0x811c9dc5;
  for (let i = 0; i < name.length; i++) hash = Math.imul(hash ^ name.charCodeAt(i), 0x01000193);
  let state = hash >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 4294967296;
  };
}

/** One of a list. */
export function pick<Item>(random: () => number, list: readonly Item[]): Item {
  return list[Math.floor(random() * list.length)]!;
}
