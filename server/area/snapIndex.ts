import { E7 } from '#tiles/osm/NodeStore.ts';
import { DOORLESS, type RoadGraph } from '#tiles/roads/RoadGraph.ts';
import type { Snap } from './Area.ts';

const METRES_PER_DEGREE = 111195.08;
const CELL_METRES = 250;
/** Beyond this a point has no road: its drives are guessed and marked rough. */
export const MOST_SNAP_METRES = 2000;

interface Nearest {
  metres: number;
  section: number;
  segment: number;
  t: number;
}

/**
 * Finds the road nearest to a point through a grid over all road segments. Motorways, ramps and
 * tunnels answer only when nothing else is within reach: no household's door is on one.
 */
export function snapIndex(graph: RoadGraph): (lat: number, lon: number) => Snap | null {
  const grid = layGrid(graph);
  return (lat, lon) => {
    const found = search(graph, grid, lat, lon, true) ?? search(graph, grid, lat, lon, false);
    return found && toSnap(graph, found);
  };
}

interface Grid {
  south: number;
  west: number;
  latStep: number;
  lonStep: number;
  columns: number;
  rows: number;
  /** Cell c holds the entries cellStart[c] … cellStart[c+1]−1. */
  cellStart: Uint32Array;
  section: Int32Array;
  segment: Int32Array;
}

function layGrid(graph: RoadGraph): Grid {
  const { shapeLatE7, shapeLonE7, shapeStart, sectionCount } = graph;
  const [south, north] = extent(shapeLatE7);
  const [west, east] = extent(shapeLonE7);
  const latStep = CELL_METRES / METRES_PER_DEGREE;
  const lonStep = latStep / Math.max(0.05, Math.cos((((south + north) / 2) * Math.PI) / 180));
  const columns = Math.floor((east - west) / lonStep) + 1;
  const rows = Math.floor((north - south) / latStep) + 1;
  const cellStart = new Uint32Array(columns * rows + 1);
  const eachEntry = (visit: (cell: number, section: number, segment: number) => void) => {
    for (let section = 0; section < sectionCount; section++) {
      for (let i = shapeStart[section]!; i + 1 < shapeStart[section + 1]!; i++) {
        const x = [shapeLonE7[i]!, shapeLonE7[i + 1]!].map((v) => (v / E7 - west) / lonStep);
        const y = [shapeLatE7[i]!, shapeLatE7[i + 1]!].map((v) => (v / E7 - south) / latStep);
        const toX = Math.floor(Math.max(x[0]!, x[1]!));
        const toY = Math.floor(Math.max(y[0]!, y[1]!));
        for (let cx = Math.floor(Math.min(x[0]!, x[1]!)); cx <= toX; cx++)
          for (let cy = Math.floor(Math.min(y[0]!, y[1]!)); cy <= toY; cy++)
            visit(cy * columns + cx, section, i);
      }
    }
  };
  eachEntry((cell) => (cellStart[cell + 1]! += 1));
  for (let c = 0; c < columns * rows; c++) cellStart[c + 1]! += cellStart[c]!;
  const next = cellStart.slice();
  const section = new Int32Array(cellStart.at(-1)!);
  const segment = new Int32Array(cellStart.at(-1)!);
  eachEntry((cell, s, i) => {
    const at = next[cell]!;
    next[cell] = at + 1;
    section[at] = s;
    segment[at] = i;
  });
  return { south, west, latStep, lonStep, columns, rows, cellStart, section, segment };
}

function extent(valuesE7: Int32Array): [number, number] {
  let least = Infinity;
  let most = -Infinity;
  for (const value of valuesE7) {
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return [least / E7, most / E7];
}

function search(graph: RoadGraph, grid: Grid, lat: number, lon: number, doorsOnly: boolean) {
  const column = Math.floor((lon - grid.west) / grid.lonStep);
  const row = Math.floor((lat - grid.south) / grid.latStep);
  const rings = Math.ceil(MOST_SNAP_METRES / CELL_METRES) + 1;
  let best: Nearest | null = null;
  for (let ring = 0; ring <= rings; ring++) {
    // Cells of this ring are at least (ring − 1) whole cells away.
    if (best && best.metres < (ring - 1) * CELL_METRES * 0.98) break;
    for (let cy = row - ring; cy <= row + ring; cy++) {
      const edge = Math.abs(cy - row) === ring;
      for (let cx = column - ring; cx <= column + ring; cx += edge || ring === 0 ? 1 : 2 * ring) {
        if (cx < 0 || cy < 0 || cx >= grid.columns || cy >= grid.rows) continue;
        best = nearestInCell(graph, grid, cy * grid.columns + cx, lat, lon, doorsOnly, best);
      }
    }
  }
  return best && best.metres <= MOST_SNAP_METRES ? best : null;
}

function nearestInCell(
  graph: RoadGraph,
  grid: Grid,
  cell: number,
  lat: number,
  lon: number,
  doorsOnly: boolean,
  best: Nearest | null,
): Nearest | null {
  const yScale = METRES_PER_DEGREE / E7;
  const xScale = yScale * Math.cos((lat * Math.PI) / 180);
  for (let entry = grid.cellStart[cell]!; entry < grid.cellStart[cell + 1]!; entry++) {
    const section = grid.section[entry]!;
    if (doorsOnly && graph.sectionFlags[section]! & DOORLESS) continue;
    const i = grid.segment[entry]!;
    const ax = (graph.shapeLonE7[i]! - lon * E7) * xScale;
    const ay = (graph.shapeLatE7[i]! - lat * E7) * yScale;
    const dx = (graph.shapeLonE7[i + 1]! - graph.shapeLonE7[i]!) * xScale;
    const dy = (graph.shapeLatE7[i + 1]! - graph.shapeLatE7[i]!) * yScale;
    const length2 = dx * dx + dy * dy;
    const t = length2 === 0 ? 0 : Math.max(0, Math.min(1, -(ax * dx + ay * dy) / length2));
    const metres = Math.hypot(ax + t * dx, ay + t * dy);
    if (!best || metres < best.metres) best = { metres, section, segment: i, t };
  }
  return best;
}

function toSnap(graph: RoadGraph, { metres, section, segment, t }: Nearest): Snap {
  const { shapeStart, shapeLatE7, shapeLonE7 } = graph;
  const xShrink = Math.cos(((shapeLatE7[segment]! / E7) * Math.PI) / 180);
  let before = 0;
  let total = 0;
  for (let i = shapeStart[section]!; i + 1 < shapeStart[section + 1]!; i++) {
    const length = Math.hypot(
      shapeLatE7[i + 1]! - shapeLatE7[i]!,
      (shapeLonE7[i + 1]! - shapeLonE7[i]!) * xShrink,
    );
    if (i < segment) before += length;
    else if (i === segment) before += length * t;
    total += length;
  }
  const at = (values: Int32Array) =>
    (values[segment]! + (values[segment + 1]! - values[segment]!) * t) / E7;
  const share = total === 0 ? 0 : Math.max(0, Math.min(1, before / total));
  return { section, share, lat: at(shapeLatE7), lon: at(shapeLonE7), metres };
}
