import { blades, leftTenthsMm } from '#shared/grooming/blades.ts';
import { cutTenthsMm } from '#shared/grooming/coatLengths.ts';
import { groomModel } from '#shared/grooming/groomModel.ts';
import { regionWords } from '#shared/grooming/regionWords.ts';
import type { Region, RegionCut, Style } from '#shared/grooming/types.ts';

/** One region's cut as a row of the table and a label of the drawing. */
export interface CutWords {
  /** "front legs" */
  region: string;
  /** "blade 4F", "guide comb", "scissors", "hand-strip", "kept long", "not touched" */
  tool: string;
  /** "with growth"; empty where it has none. */
  direction: string;
  /** "9.5 mm", "30 mm by eye"; empty where nothing is cut. */
  left: string;
  /** "4F · 9.5 mm": as short as a label needs it. */
  label: string;
}

export function cutWords(cuts: Style['cuts'], region: Region): CutWords {
  const cut = cuts[region];
  const name = regionWords([region]);
  if (!cut)
    return { region: name, tool: 'not touched', direction: '', left: '', label: 'as it is' };
  if (cut.tool === 'leave')
    return { region: name, tool: 'kept long', direction: '', left: '', label: 'kept long' };
  const left = `${writeMm(cutTenthsMm(cuts, region, groomModel)!)} mm`;
  if (cut.tool === 'strip')
    return { region: name, tool: 'hand-strip', direction: '', left, label: 'hand-strip' };
  if (cut.tool === 'scissor') {
    const aimed = cut.lengthTenthsMm === null ? `${left} by eye` : left;
    return {
      region: name,
      tool: 'scissors',
      direction: '',
      left: aimed,
      label: `scissor · ${left}`,
    };
  }
  const direction = cut.direction === 'with' ? 'with growth' : 'against growth';
  const tool = cut.tool === 'blade' ? `blade ${bladeLabel(cut.lengthTenthsMm)}` : 'guide comb';
  const short = cut.tool === 'blade' ? shortBlade(cut.lengthTenthsMm) : 'comb';
  return { region: name, tool, direction, left, label: `${short} · ${left}` };
}

/** "9.5": millimetres of tenths, the tenth only where it says something. */
export function writeMm(tenthsMm: number): string {
  const rounded = tenthsMm >= 130 ? Math.round(tenthsMm / 10) * 10 : Math.round(tenthsMm);
  return String(rounded / 10);
}

/** The usual number of a blade of this length; its millimetres where no blade has it. */
export function bladeLabel(lengthTenthsMm: number): string {
  const blade = blades.find((one) => one.lengthTenthsMm === lengthTenthsMm);
  return blade?.label ?? `${writeMm(lengthTenthsMm)} mm`;
}

/** "leaves 19 mm", for a choice that says what it will do. */
export function leavesWords(cut: Extract<RegionCut, { tool: 'blade' | 'comb' }>): string {
  return `leaves ${writeMm(leftTenthsMm(cut))} mm`;
}

/** "4F", "#10": beside a length a bare number would read as another one. */
function shortBlade(lengthTenthsMm: number): string {
  const label = bladeLabel(lengthTenthsMm);
  return /^\d+½?$/.test(label) ? `#${label}` : label;
}
