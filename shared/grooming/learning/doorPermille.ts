/** Minutes around the pets of one finished visit. */
export interface DoorVisit {
  /** Set-up and clean-down as usual for the business, before any learning of the door. */
  usualSeconds: number;
  /** From arrival to the first pet on the table, and from the last pet done to driving off. */
  actualSeconds: number;
}

export interface DoorLearned {
  /** For `forecastVisit`; 1000 = usual. */
  permille: number;
  /** Visits it was learned from. */
  visits: number;
}

/**
 * A household's door, gate, stairs and talk against the usual: the mean of its visits' log ratios,
 * shrunk towards none (normal prior, normal noise) by the SDs below. One visit moves it little more
 * than a quarter of the way, twelve most of it. A ratio is believed between a quarter and four times:
 * a tap forgotten and made up for leaves seconds, one forgotten over a meal leaves an hour.
 * @throws RangeError when seconds are negative or not whole.
 */
export function doorPermille(visits: readonly DoorVisit[]): DoorLearned {
  const logs = visits.flatMap(({ usualSeconds, actualSeconds }) => {
    check('usualSeconds', usualSeconds);
    check('actualSeconds', actualSeconds);
    const believed =
      usualSeconds > 0 && actualSeconds * mostTimes >= usualSeconds && actualSeconds <= usualSeconds * mostTimes; // prettier-ignore
    return believed ? [Math.log(actualSeconds / usualSeconds)] : [];
  });
  const sum = logs.reduce((total, log) => total + log, 0);
  const shrunk = sum / (logs.length + priorVisits);
  return { permille: Math.round(1000 * Math.exp(shrunk)), visits: logs.length };
}

const mostTimes = 4;

/** SDs of log seconds, between households and between a household's visits. Our guesses, no source. */
const householdSigma = 0.25;
const visitSigma = 0.4;

/** The prior weighs as much as so many visits, 2.56. */
const priorVisits = (visitSigma / householdSigma) ** 2;

function check(field: keyof DoorVisit, seconds: number): void {
  if (!Number.isInteger(seconds) || seconds < 0)
    throw new RangeError(`${field} must be whole seconds, 0 or more, got ${seconds}.`);
}
