import type { Feature, Label, LabelSymbolizer, Layout } from 'protomaps-leaflet';

type Spot = Feature['geom'][number][number];

/** How lettering along a line looks. */
export interface CurvedNameLook {
  /** Canvas font by zoom. */
  font: (zoom: number) => string;
  /** Letter height in pixels by zoom, for room around letters. */
  size: (zoom: number) => number;
  fill: string;
  halo: string;
}

interface Glyph {
  text: string;
  x: number;
  y: number;
  angle: number;
}

/** A name reads badly when it turns more than this between two letters, or in all (radians). */
const MOST_TURN = 0.5;
const MOST_BEND = 1.7;
/** The same name again after this many pixels. */
const REPEAT = 420;
const LETTER_SPACING = 0.35;

/**
 * Sets a street's name letter by letter along its line. The library's own line labels want a run that
 * is straight within four degrees, which leaves most curved streets nameless.
 */
export class CurvedNames implements LabelSymbolizer {
  readonly #look: CurvedNameLook;

  constructor(look: CurvedNameLook) {
    this.#look = look;
  }

  place(layout: Layout, geom: Spot[][], feature: Feature): Label[] | undefined {
    const name = feature.props.name;
    if (typeof name !== 'string' || name === '') return undefined;
    const font = this.#look.font(layout.zoom);
    const size = this.#look.size(layout.zoom);
    layout.scratch.font = font;
    const widths = [...name].map((c) => layout.scratch.measureText(c).width + LETTER_SPACING);
    const labels = geom.flatMap((line) =>
      letterings(line, [...name], widths).map((glyphs) =>
        this.#label(line[0]!, glyphs, size, font, name),
      ),
    );
    return labels.length > 0 ? labels : undefined;
  }

  #label(somePoint: Spot, glyphs: Glyph[], size: number, font: string, name: string): Label {
    const middle = glyphs[glyphs.length >> 1]!;
    const anchor = somePoint.clone();
    anchor.x = middle.x;
    anchor.y = middle.y;
    const reach = size * 0.62;
    const { fill, halo } = this.#look;
    return {
      anchor,
      bboxes: glyphs.map(({ x, y }) => ({
        minX: x - reach,
        minY: y - reach,
        maxX: x + reach,
        maxY: y + reach,
      })),
      deduplicationKey: name,
      deduplicationDistance: REPEAT * 0.6,
      draw: (ctx) => {
        ctx.font = font;
        ctx.textAlign = 'center';
        ctx.textBaseline = 'middle';
        ctx.lineJoin = 'round';
        ctx.lineWidth = 3;
        ctx.globalAlpha = 1;
        // All halos first, or each would eat its neighbour's letter.
        for (const paint of ['halo', 'fill'] as const) {
          ctx.strokeStyle = halo;
          ctx.fillStyle = fill;
          for (const { text, x, y, angle } of glyphs) {
            ctx.save();
            ctx.translate(x - anchor.x, y - anchor.y);
            ctx.rotate(angle);
            if (paint === 'halo') ctx.strokeText(text, 0, 0);
            else ctx.fillText(text, 0, 0);
            ctx.restore();
          }
        }
      },
    };
  }
}

/** Every place along a line where the letters fit without turning too sharply. Left to right. */
export function letterings(
  line: readonly { x: number; y: number }[],
  letters: readonly string[],
  widths: readonly number[],
): Glyph[][] {
  const along = [0];
  for (let i = 1; i < line.length; i++) {
    const from = line[i - 1]!;
    const to = line[i]!;
    along.push(along[i - 1]! + Math.hypot(to.x - from.x, to.y - from.y));
  }
  const length = along.at(-1)!;
  const width = widths.reduce((sum, w) => sum + w, 0);
  if (length < width + 8) return [];
  const count = Math.max(1, Math.round(length / REPEAT));
  const found: Glyph[][] = [];
  for (let k = 0; k < count; k++) {
    const centre = ((k + 0.5) / count) * length;
    const shifts = [0, 0.25, -0.25, 0.5, -0.5].map(
      (s) => s * Math.min(length / count, length - width),
    );
    for (const shift of shifts) {
      const start = centre + shift - width / 2;
      if (start < 2 || start + width > length - 2) continue;
      const glyphs = lettering(line, along, letters, widths, start, width);
      if (!glyphs) continue;
      found.push(glyphs);
      break;
    }
  }
  return found;
}

function lettering(
  line: readonly { x: number; y: number }[],
  along: readonly number[],
  letters: readonly string[],
  widths: readonly number[],
  start: number,
  width: number,
): Glyph[] | null {
  const first = pointAt(line, along, start);
  const last = pointAt(line, along, start + width);
  const backward = last.x < first.x;
  const glyphs: Glyph[] = [];
  let walked = 0;
  for (const [i, text] of letters.entries()) {
    const offset = walked + widths[i]! / 2;
    walked += widths[i]!;
    const at = backward ? start + width - offset : start + offset;
    // Over the letter's own width, so that a kink in the line does not twist a single letter.
    const before = pointAt(line, along, at - widths[i]!);
    const after = pointAt(line, along, at + widths[i]!);
    const { x, y } = pointAt(line, along, at);
    const turn = Math.atan2(after.y - before.y, after.x - before.x) + (backward ? Math.PI : 0);
    glyphs.push({ text, x, y, angle: wrapped(turn) });
  }
  const bend = (a: Glyph, b: Glyph) => Math.abs(wrapped(a.angle - b.angle));
  for (let i = 1; i < glyphs.length; i++) {
    if (bend(glyphs[i]!, glyphs[i - 1]!) > MOST_TURN) return null;
    if (bend(glyphs[i]!, glyphs[0]!) > MOST_BEND) return null;
  }
  return glyphs;
}

function pointAt(
  line: readonly { x: number; y: number }[],
  along: readonly number[],
  distance: number,
): { x: number; y: number } {
  let i = 1;
  while (i < line.length - 1 && along[i]! < distance) i++;
  const span = along[i]! - along[i - 1]! || 1;
  const t = Math.max(0, Math.min(1, (distance - along[i - 1]!) / span));
  const a = line[i - 1]!;
  const b = line[i]!;
  return { x: a.x + (b.x - a.x) * t, y: a.y + (b.y - a.y) * t };
}

function wrapped(angle: number): number {
  return Math.atan2(Math.sin(angle), Math.cos(angle));
}
