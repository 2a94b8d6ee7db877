/**
 * What a day is. `DayProblem` holds facts (plain JSON: it crosses the network, a worker thread and
 * the database); `Plan` holds only order and pins. Every time on a draft screen is derived by
 * `evaluateDay(problem, plan)`.
 *
 * Units: `…Seconds` are whole elapsed seconds since `dayStartUtc` (so days of 23 and 25 hours just
 * work) or whole seconds of duration; `…Metres`, `…Ml`, `…Grams` are integers; `…Permille` is 0–1000.
 */

/** A duration with its spread, moment form: whole seconds and whole seconds squared. */
export interface Spread {
  meanSeconds: number;
  varianceSeconds2: number;
}

/** Somewhere a van can stand. Its index in `DayProblem.points` is its row in the drive matrix. */
export interface Point {
  id: string;
  lat: number;
  lon: number;
  /** True when no road answer exists: legs touching it are straight-line estimates ("rough"). */
  rough: boolean;
}

/** From `fromSeconds` on, base driving seconds are scaled by `permille`. Bands ascend; first at 0. */
export interface DriveBand {
  fromSeconds: number;
  permille: number;
}

export interface DriveMatrix {
  /** Row-major, points × points; asymmetric; diagonal 0. */
  baseSeconds: number[];
  metres: number[];
  /** At most 8; one band of 1000 ‰ when nothing is known about traffic. */
  bands: DriveBand[];
  /** Spread of a leg: variance = (cvPermille/1000 × seconds)². */
  cvPermille: number;
}

/** What a tank holds. Names beyond these are allowed: anything used per step and refilled. */
export type TankKind = 'fresh' | 'grey' | 'energy' | 'towels';

/** `usedMl` counts up from a full (fresh) or empty (grey) tank; at `capacityMl` it needs a refill. */
export interface Tank {
  kind: TankKind;
  capacityMl: number;
  usedAtStartMl: number;
}

export interface TankUse {
  kind: TankKind;
  ml: number;
}

/** A pause of `lengthSeconds` starting inside [earliest, latest]; due only when the run spans more than `dueAfterSeconds`. */
export interface MealRule {
  lengthSeconds: number;
  earliestStartSeconds: number;
  latestStartSeconds: number;
  dueAfterSeconds: number;
}

/** One groomer's hours in one van on the day. */
export interface VanShift {
  vanId: string;
  vanName: string;
  groomerId: string;
  groomerName: string;
  startSeconds: number;
  endSeconds: number;
  mostOvertimeSeconds: number;
  /** null: no limit set by the business. */
  mostDriveSeconds: number | null;
  /** Morning loading before the first drive, wash-down after the last. Inside the shift. */
  loadSeconds: number;
  washDownSeconds: number;
  startPoint: number;
  endPoint: number;
  skills: string[];
  /** Heaviest pet the van's table takes, grams. */
  tableLimitGrams: number;
  tanks: Tank[];
  meal: MealRule | null;
}

/** What a window binds: the arrival, the whole stay (arrival and leaving), or both named apart. */
export interface AllowedWindow {
  startSeconds: number;
  endSeconds: number;
  binds: 'arrival' | 'stay';
}

/** The arrival window a household was told. Soft: breaking it is the worst thing a plan can do. */
export interface PromiseWindow {
  startSeconds: number;
  endSeconds: number;
  version: number;
}

export interface VisitPin {
  vanId?: string;
  position?: 'first' | 'last';
  /** Arrival no earlier than this; used for "keep this time". */
  startSeconds?: number;
}

export interface VisitFact {
  id: string;
  householdId: string;
  /** For people: pet names joined, e.g. "Rook & Wren". */
  label: string;
  point: number;
  /** Consecutive visits at one site pay set-up once and no driving. */
  siteId: string | null;
  work: Spread;
  /** Overrides `work` for a groomer whose pace is known. */
  workByGroomer: Record<string, Spread>;
  setUpSeconds: number;
  cleanDownSeconds: number;
  /** Hard. Empty: any time within the shift. */
  allowed: AllowedWindow[];
  promise: PromiseWindow | null;
  tankUse: TankUse[];
  /** Skills all needed. */
  needs: string[];
  heaviestGrams: number;
  preferredGroomerIds: string[];
  barredGroomerIds: string[];
  /** Worth of placing it, in the cost's drive-seconds. */
  valueSeconds: number;
  pin: VisitPin | null;
}

/** Where a tank is refilled or emptied. */
export interface RefillPlace {
  id: string;
  name: string;
  point: number;
  kinds: TankKind[];
  lengthSeconds: number;
  opensSeconds: number;
  closesSeconds: number;
}

/** What already happened at a stop, from the groomer's taps. Times are facts, never re-planned. */
export interface StopFact {
  stopId: string;
  vanId: string;
  drivingSinceSeconds: number | null;
  arrivedSeconds: number | null;
  workingSinceSeconds: number | null;
  leftSeconds: number | null;
  /** A visit that could not be done: the van left without working. */
  failedReason: string | null;
}

/** Plain-unit weights of the cost: integer drive-seconds. Screens show its parts, never the sum. */
export interface Weights {
  /** Drive-seconds one second late to a promise is worth ('one minute late = 6 minutes driving'). */
  lateFactor: number;
  waitFactorPermille: number;
  overtimeFactor: number;
  /** Flat cost of not giving a household a preferred groomer. */
  otherGroomerSeconds: number;
  /** Flat cost of moving a visit that was already sent to a van. */
  disturbSeconds: number;
}

export interface DayProblem {
  v: 1;
  /** The business's local date, YYYY-MM-DD, and its midnight as an instant. */
  date: string;
  dayStartUtc: string;
  timeZone: string;
  dayLengthSeconds: number;
  points: Point[];
  drive: DriveMatrix;
  vans: VanShift[];
  visits: VisitFact[];
  refills: RefillPlace[];
  weights: Weights;
  /** null before the day begins. */
  nowSeconds: number | null;
  facts: StopFact[];
  /** Order last sent to the vans, for disturbance; null when nothing was sent. */
  sent: Plan | null;
}

export type Stop =
  | { kind: 'visit'; id: string; visitId: string; pinned?: boolean }
  | { kind: 'refill'; id: string; placeId: string; pinned?: boolean }
  | { kind: 'meal'; id: string; pinned?: boolean }
  | { kind: 'rest'; id: string; lengthSeconds: number; pinned?: boolean }
  | { kind: 'errand'; id: string; point: number; lengthSeconds: number; pinned?: boolean };

/** One van's ordered stops. */
export interface Run {
  vanId: string;
  stops: Stop[];
}

/** The day as order and pins. `notPlaced` are visit ids. Stop id of a visit is its visit id. */
export interface Plan {
  runs: Run[];
  notPlaced: string[];
}

/** A change a person or the optimiser makes. `index` is where among the run's *visits* it lands (0 = first). */
export type Move =
  | { kind: 'placeVisit'; visitId: string; vanId: string; index: number }
  | { kind: 'unplaceVisit'; visitId: string }
  | { kind: 'swapRuns'; vanId: string; otherVanId: string }
  | { kind: 'replacePlan'; plan: Plan };

export type RuleName =
  | 'skill'
  | 'tableLimit'
  | 'barredGroomer'
  | 'window'
  | 'promise'
  | 'overtime'
  | 'driveLimit'
  | 'tank'
  | 'meal'
  | 'pin'
  | 'refillHours'
  | 'started';

/** A rule a run breaks. `byAmount` in the rule's own unit (seconds, grams, ml), 0 when it has none. */
export interface BrokenRule {
  rule: RuleName;
  hard: boolean;
  vanId: string;
  stopId: string | null;
  byAmount: number;
  /** True when facts broke it: reported, never a reason to refuse. */
  inherited: boolean;
}

/** One stop of an evaluated run. Means drive the plan; the 1-in-10 pair is the spread. */
export interface StopTimes {
  stopId: string;
  kind: Stop['kind'];
  point: number;
  /** The leg to here. */
  driveSeconds: number;
  driveMetres: number;
  rough: boolean;
  departSeconds: number;
  arriveSeconds: number;
  arriveEarlySeconds: number;
  arriveLateSeconds: number;
  waitSeconds: number;
  startSeconds: number;
  setUpSeconds: number;
  workSeconds: number;
  endSeconds: number;
  /** Chance to arrive before the promise ends; null without a promise. */
  onTimePermille: number | null;
  expectedLateSeconds: number;
  tanksUsedMl: { kind: TankKind; usedMl: number }[];
  state: 'ahead' | 'driving' | 'arrived' | 'working' | 'done' | 'failed';
}

export interface RunTimes {
  vanId: string;
  leaveSeconds: number;
  stops: StopTimes[];
  homeDriveSeconds: number;
  homeDriveMetres: number;
  homeRough: boolean;
  finishSeconds: number;
  driveSeconds: number;
  driveMetres: number;
  workSeconds: number;
  waitSeconds: number;
  overtimeSeconds: number;
  broken: BrokenRule[];
}

/** The documented cost, in integer drive-seconds, by part. */
export interface CostParts {
  driveSeconds: number;
  lateSeconds: number;
  waitSeconds: number;
  overtimeSeconds: number;
  notPlacedSeconds: number;
  otherGroomerSeconds: number;
  disturbSeconds: number;
}

export interface DayTimes {
  runs: RunTimes[];
  cost: CostParts;
  totalCost: number;
  driveSeconds: number;
  driveMetres: number;
  workSeconds: number;
  waitSeconds: number;
  promisesSafe: number;
  promisesAtRisk: number;
  /** Any hard rule broken and not inherited. */
  feasible: boolean;
}
