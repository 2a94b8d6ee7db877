import type { AgeBand } from './age.ts';
import type { Caution } from './cautions.ts';
import { durationWords } from './durationWords.ts';
import type { GroomModel } from './groomModel.ts';
import { regionWords } from './regionWords.ts';
import { planBOf } from './planB.ts';
import type { OverTable, PetFacts, PlanBWord, Region, Service, Style } from './types.ts';

/**
 * Most seconds this pet should bear in tub and on table: as noted on the pet, else the least that
 * species, age and health allow.
 * @throws RangeError when the pet's own limit is not whole seconds from 5 minutes to 8 hours.
 */
export function tableLimitSeconds(
  pet: PetFacts,
  age: AgeBand,
  cautions: readonly Caution[],
  model: GroomModel,
): number {
  const own = pet.tableLimitSeconds;
  if (own != null) {
    if (!Number.isInteger(own) || own < 300 || own > 28_800) {
      throw new RangeError(
        `tableLimitSeconds must be whole seconds from 300 to 28800, got ${own}.`,
      );
    }
    return own;
  }
  const { bySpeciesAge, byCaution } = model.tableLimit;
  const health = cautions.map(({ key }) => byCaution[key] ?? Infinity);
  return Math.min(bySpeciesAge[pet.species][age], ...health);
}

/**
 * What to leave out when the style asks for more than the limit, by its plan B: first everything to
 * `leave`, then what is done `ifAllowed`, cuts before care, one after the other until it fits, and
 * back again what then still fits. What must be done stays, whether it fits or not. `secondsOf` is the time on the table in a style.
 */
export function overTable(
  style: Style,
  limit: number,
  tableSeconds: number,
  secondsOf: (style: Style) => number,
): OverTable | null {
  if (tableSeconds <= limit) return null;
  const parts = partsOf(style);
  const gone = parts.filter(({ word }) => word === 'leave');
  let given: Part[] = [];
  let seconds = gone.length > 0 ? secondsOf(without(style, gone)) : tableSeconds;
  for (const part of parts.filter(({ word }) => word === 'ifAllowed')) {
    if (seconds <= limit) break;
    given.push(part);
    seconds = secondsOf(without(style, [...gone, ...given]));
  }
  // A long part given up last may have made room for what went before it, the dearest first.
  for (const part of given.slice(0, -1).reverse()) {
    if (seconds > limit) break;
    const fewer = given.filter((each) => each !== part);
    const longer = secondsOf(without(style, [...gone, ...fewer]));
    if (longer <= limit) [given, seconds] = [fewer, longer];
  }
  const left = [...gone, ...given];
  const leftRegions = left.flatMap(({ regions }) => regions);
  const leftServices = left.flatMap(({ services }) => services);
  const fits = seconds <= limit;
  return {
    overSeconds: tableSeconds - limit,
    words: wordsOf(leftRegions, leftServices, seconds, limit),
    leftServices,
    leftRegions,
    tableSeconds: seconds,
    fits,
  };
}

interface Part {
  word: PlanBWord;
  regions: Region[];
  services: Service[];
}

/** Regions before services, in the order they are given up; both pairs of legs go together. */
const GIVEN_UP: readonly Region[][] = [
  ['tail'],
  ['ears'],
  ['foreLegs', 'hindLegs'],
  ['belly'],
  ['neck'],
  ['back'],
  ['feet'],
  ['head'],
];

const SERVICES_GIVEN_UP: readonly Service[] = [
  'teeth',
  'deshed',
  'ears',
  'pads',
  'bath',
  'sanitary',
  'nails',
];

function partsOf(style: Style): Part[] {
  const planB = planBOf(style);
  const cut = (region: Region) => (style.cuts[region]?.tool ?? 'leave') !== 'leave';
  const cuts = GIVEN_UP.map((group) => group.filter(cut))
    .filter((group) => group.length > 0)
    .map((group) => ({
      word: planB.regions[group[0]!] ?? 'ifAllowed',
      regions: group,
      services: [],
    }));
  const services = SERVICES_GIVEN_UP.filter((service) => style.services.includes(service)).map(
    (service) => ({
      word: planB.services[service] ?? 'ifAllowed',
      regions: [],
      services: [service],
    }),
  );
  return [...cuts, ...services];
}

function without(style: Style, left: readonly Part[]): Style {
  const regions = left.flatMap((part) => part.regions);
  const services = left.flatMap((part) => part.services);
  const kept = Object.entries(style.cuts).filter(([region]) => !regions.includes(region as Region));
  return {
    ...style,
    cuts: Object.fromEntries(kept),
    services: style.services.filter((service) => !services.includes(service)),
  };
}

function wordsOf(
  regions: readonly Region[],
  services: readonly Service[],
  seconds: number,
  limit: number,
): string {
  const parts = regions.length > 0 ? [`${regionWords(regions)} uncut`] : [];
  if (services.length > 0)
    parts.push(`no ${services.map((each) => SERVICE_WORDS[each]).join(', ')}`);
  const then = `${durationWords(seconds)} on the table of ${durationWords(limit)}`;
  if (parts.length === 0) return `Past what the pet should bear: ${then}. Split over two visits.`;
  const split = seconds > limit ? ' Still too long: split over two visits.' : '';
  return `Plan B: ${parts.join('; ')}; ${then}.${split}`;
}

const SERVICE_WORDS: Record<Service, string> = {
  bath: 'bath',
  deshed: 'undercoat work',
  nails: 'nails',
  ears: 'ear cleaning',
  sanitary: 'sanitary trim',
  pads: 'pads',
  teeth: 'teeth',
};
