import type { Point } from './plane.ts';
import type { Settlement } from './settlements.ts';

/** A road on the drawing board: one name, one class, one unbroken line. */
export interface Road {
  name: string;
  highway: 'trunk' | 'primary' | 'secondary' | 'tertiary' | 'residential' | 'living_street';
  openKmh: number;
  townKmh: number;
  line: Point[];
  /** Which settlement a grown street belongs to; main roads pass through several. */
  settlement?: Settlement;
  oneway?: boolean;
  roundabout?: boolean;
}
