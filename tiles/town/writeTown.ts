import { drawTown } from './drawTown.ts';
import { writeOsmPbf } from './writeOsmPbf.ts';

/** Draws Pellan Bay and writes it as an OpenStreetMap extract, byte for byte the same every time. */
export function writeTown(path: string): { nodes: number; ways: number; relations: number } {
  const draft = drawTown();
  writeOsmPbf(path, draft);
  return {
    nodes: draft.nodes.length,
    ways: draft.ways.length,
    relations: draft.relations.length,
  };
}
