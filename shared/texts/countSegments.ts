import { septetsOf } from './gsm7.ts';

export interface SegmentCount {
  encoding: 'GSM-7' | 'UCS-2';
  /** Septets, or 16-bit units. */
  units: number;
  /** SMS parts the carrier charges; 0 for an empty text. */
  segments: number;
  /** Units in each part. A letter of two units is never split, so a part may hold one fewer. */
  partUnits: number[];
}

/** A part alone, and a part of several that gives 6 octets to the concatenation header (TS 23.040, 9.2.3.24.1). */
const room = { 'GSM-7': { alone: 160, joined: 153 }, 'UCS-2': { alone: 70, joined: 67 } };

/** Counts the parts an SMS body is charged as. */
export function countSegments(text: string): SegmentCount {
  const letters = [...text];
  const septets = letters.map(septetsOf);
  const encoding = septets.includes(null) ? 'UCS-2' : 'GSM-7';
  const sizes =
    encoding === 'GSM-7' ? septets.map((size) => size!) : letters.map((letter) => letter.length);
  const units = sizes.reduce<number>((sum, size) => sum + size, 0);
  const partUnits =
    units <= room[encoding].alone ? (units > 0 ? [units] : []) : pack(sizes, room[encoding].joined);
  return { encoding, units, segments: partUnits.length, partUnits };
}

function pack(sizes: readonly number[], most: number): number[] {
  const parts = [0];
  for (const size of sizes) {
    const last = parts.length - 1;
    if (parts[last]! + size > most) parts.push(size);
    else parts[last]! += size;
  }
  return parts;
}
