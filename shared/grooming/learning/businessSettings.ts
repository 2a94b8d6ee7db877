/** The business `simulateBusiness` draws from. Counts, weeks, chances and SDs in permille. */
export interface BusinessSettings {
  visits: number;
  /** Last ones, never learned from before they are forecast. */
  heldOutVisits: number;
  groomers: number;
  pets: number;
  /** Chance that a pet comes for the first time after the start; it joins on a day of its own. */
  joinsLaterPermille: number;
  weeks: number;
  intervalWeeks: readonly number[];
  breedIds: readonly string[];
  /** Chance of the pet's regular groomer; else anyone. */
  regularGroomerPermille: number;
  /** Chance that today is the breed's second usual style rather than the pet's own. */
  otherStylePermille: number;
  /** Chance that a visit's steps were timed, not only the pet's start and end. */
  stepsTimedPermille: number;
  /** Pet's own stopwatch forgotten: recorded as 0 or nine hours. */
  petTimerForgottenPermille: number;
  /** Matting on the day by level 0, 1, 2, 3; permille. */
  mattingPermille: readonly number[];
  /** Chance that a mat level was told one better than it is. */
  toldBetterPermille: number;
  /** The truth leans with weight: × (weight / 8 kg)^tilt, tilt drawn once with this SD. */
  sizeTiltPermille: number;
  /** Every pet slows with age, per year. */
  petAgeingPermille: number;
  seeds: readonly number[];
}

/**
 * Fixed before the learning was written, and not changed since. Wrong on purpose in ways the learning
 * has no term for: groomers speed up, pets slow down, coats are told better than they are, the truth
 * leans with weight, noise has heavy tails (`simulationSettings`), timers are forgotten.
 */
export const businessSettings: BusinessSettings = {
  visits: 2_000,
  heldOutVisits: 400,
  groomers: 4,
  pets: 260,
  joinsLaterPermille: 450,
  weeks: 78,
  intervalWeeks: [4, 5, 6, 6, 8, 8, 10, 12],
  breedIds: [
    'bichon-frise', 'poodle-toy', 'poodle-miniature', 'shih-tzu', 'yorkshire-terrier', 'maltese',
    'english-cocker', 'cavalier', 'west-highland-terrier', 'miniature-schnauzer', 'golden-retriever',
    'labrador', 'border-terrier', 'pug', 'cockapoo', 'cavapoo', 'labradoodle', 'springer-spaniel',
    'pomeranian', 'havanese', 'shetland-sheepdog', 'chihuahua',
  ], // prettier-ignore
  regularGroomerPermille: 700,
  otherStylePermille: 150,
  stepsTimedPermille: 350,
  petTimerForgottenPermille: 15,
  mattingPermille: [780, 140, 60, 20],
  toldBetterPermille: 120,
  sizeTiltPermille: 60,
  petAgeingPermille: 15,
  seeds: Array.from({ length: 20 }, (_, index) => index + 1),
};
