import type { RuleName } from './types.ts';

/** Why one van does not take a visit, at the place in its run where least stands in the way. */
export interface VanReason {
  vanId: string;
  /** The rule in the way; 'fits' when nothing is, 'notWorking' when the van is out at other hours. */
  rule: RuleName | 'fits' | 'notWorking';
  /** In the rule's unit: how far it would have to give. 0 when it cannot give by an amount. */
  byAmount: number;
  /** The stop that would break it: the visit itself, or one it pushes; null for the whole run. */
  stopId: string | null;
  /** Other rules broken at that place too. 0: giving way by `byAmount` alone places the visit. */
  otherRules: number;
  /** Where among the run's visits it was tried (`placeVisit`'s index), null when it never can be. */
  index: number | null;
  /** What placing it there adds to the cost, in drive-seconds, its own worth left out. */
  addedCost: number;
  words: string;
}
