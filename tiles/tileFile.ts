import { createHash } from 'node:crypto';
import {
  closeSync,
  fsyncSync,
  openSync,
  readFileSync,
  readSync,
  writeFileSync,
  writeSync,
} from 'node:fs';
import type { CutTile } from './cutTiles.ts';

/** Where each tile's gzipped bytes lie in the tile file: `"z/x/y"` → [offset, length]. */
type TileIndex = Record<string, [number, number]>;

/** Writes tiles into one file and their places into another; equal tiles (open sea) are kept once. */
export function writeTiles(file: string, indexFile: string, tiles: Iterable<CutTile>) {
  const fd = openSync(file, 'w');
  const index: TileIndex = {};
  const seen = new Map<string, [number, number]>();
  let bytes = 0;
  let count = 0;
  try {
    for (const { z, x, y, data } of tiles) {
      const hash = createHash('sha256').update(data).digest('base64');
      let place = seen.get(hash);
      if (!place) {
        place = [bytes, data.length];
        seen.set(hash, place);
        writeSync(fd, data, 0, data.length, bytes);
        bytes += data.length;
      }
      index[`${z}/${x}/${y}`] = place;
      count += 1;
    }
    fsyncSync(fd);
  } finally {
    closeSync(fd);
  }
  writeFileSync(indexFile, JSON.stringify(index), { flush: true });
  return { count, bytes };
}

/** Open tiles of an area. The descriptor outlives a re-import, so answers never mix two versions. */
export interface TileReader {
  /** Gzipped vector tile, or null where the map is blank. */
  read(z: number, x: number, y: number): Buffer | null;
  close(): void;
}

export function openTiles(file: string, indexFile: string): TileReader {
  const fd = openSync(file, 'r');
  const index = new Map(Object.entries(JSON.parse(readFileSync(indexFile, 'utf8')) as TileIndex));
  return {
    read(z, x, y) {
      const place = index.get(`${z}/${x}/${y}`);
      if (!place) return null;
      const data = Buffer.alloc(place[1]);
      readSync(fd, data, 0, place[1], place[0]);
      return data;
    },
    close: () => closeSync(fd),
  };
}
