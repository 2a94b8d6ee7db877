import type { CautionKey, StepKey } from './types.ts';

/** Who decides whether and how the work goes on. All of it defers to a veterinarian and local rules. */
export type Decider = 'groomer' | 'household' | 'vet' | 'business';

/**
 * What raises a caution: noted on the pet; a fact of breed, age, coat, style or species; something
 * seen on the day; the day's weather; or always, while one of `steps` is under way.
 */
export type CautionTrigger =
  | { kind: 'noted' }
  | { kind: 'fact' }
  | { kind: 'seen' }
  | { kind: 'day' }
  | { kind: 'always'; steps: readonly StepKey[] };

export interface Caution {
  key: CautionKey;
  trigger: CautionTrigger;
  /** Short words for a card, said to the groomer. */
  words: string;
  /** Steps left out until the decider clears them. */
  barred: readonly StepKey[];
  /** Steps that take longer, and the reason shown. */
  slower: readonly { steps: readonly StepKey[]; permille: number; because: string }[];
  /** Cleaning beyond the usual before the next pet: contact time of the disinfectant. */
  extraCleanSeconds: number;
  /** Do not start, or stop now. */
  stop: boolean;
  decides: Decider;
}

const handsOn: readonly StepKey[] = [
  'nails',
  'ears',
  'tidy',
  'mats',
  'strip',
  'clip',
  'comb',
  'scissor',
  'head',
];
const atTheSkin: readonly StepKey[] = ['mats', 'clipOff', 'clip'];
const everyStep: readonly StepKey[] = [
  'checkIn',
  'nails',
  'ears',
  'tidy',
  'teeth',
  'mats',
  'clipOff',
  'strip',
  'bath',
  'dry',
  'brush',
  'clip',
  'comb',
  'scissor',
  'head',
  'blend',
  'rest',
  'wrap',
];

/**
 * Cautions as data, common practice and published harms, never veterinary advice. Contact time of
 * ten minutes: Moriello, Vet Med Int 2015. Factors are guesses.
 */
export const cautions: readonly Caution[] = [
  noted(
    'bites',
    'Has bitten. Loop, calm hands, muzzle only if it breathes easily; end for the pet if it escalates.',
    {
      slower: [{ steps: ['nails', 'tidy'], permille: 1150, because: 'has bitten' }],
    },
  ),
  noted('feetShy', 'Pulls away when feet are held. Short turns, feet last.', {
    slower: [
      { steps: ['nails', 'tidy'], permille: 1350, because: 'shy of feet' },
      { steps: ['scissor'], permille: 1050, because: 'shy of feet' },
    ],
  }),
  noted('dryerShy', 'Afraid of the dryer. Towels and low air by hand, ears covered.', {
    slower: [{ steps: ['dry'], permille: 1500, because: 'dried by hand' }],
  }),
  noted(
    'heart',
    'Heart condition. Unheated air, rests, short stay; call the vet if it tires or coughs.',
    {
      slower: [{ steps: ['dry'], permille: 1150, because: 'unheated air' }],
      decides: 'vet',
    },
  ),
  noted(
    'seizures',
    'Has seizures. Low noise, no flashing light; note time and length, call the vet.',
    {
      slower: [{ steps: ['dry'], permille: 1150, because: 'low noise' }],
      decides: 'vet',
    },
  ),
  noted('breathing', 'Trouble breathing. No groom until a vet clears it.', {
    stop: true,
    decides: 'vet',
  }),
  noted('sedated', 'Sedated. Groom only with a vet present.', { stop: true, decides: 'vet' }),
  noted('stitches', 'Fresh wound or stitches. No bath, no dryer until the vet clears it.', {
    barred: ['bath', 'dry'],
    decides: 'vet',
  }),
  noted('inSeason', 'In season. No other dog aboard; clean table and tub after.', {}),
  noted('pregnant', 'Pregnant. Lift chest and rump, short stay; near term ask the vet first.', {
    slower: [{ steps: ['dry'], permille: 1100, because: 'gently' }],
    decides: 'vet',
  }),
  noted('weakJoints', 'Weak joints. Low lift, soft mat, let it lie; no leg held high.', {
    slower: [{ steps: handsOn, permille: 1080, because: 'no leg held high' }],
  }),
  noted('thinSkin', 'Thin or loose skin. Stretch by hand, finish blades only.', {
    slower: [{ steps: atTheSkin, permille: 1150, because: 'thin skin' }],
  }),
  noted('skinSore', 'Sore skin. Clip around it; bath only as the vet says.', { decides: 'vet' }),
  noted('earTrouble', 'Ear trouble. Leave the ears to the vet.', {
    barred: ['ears'],
    decides: 'vet',
  }),
  noted('allergy', 'Allergy. Use the product noted on the pet, nothing else.', {
    decides: 'household',
  }),
  noted('deafOrBlind', 'Deaf or blind. Hand on the body before every move.', {
    slower: [
      { steps: ['checkIn', 'nails', 'scissor', 'head'], permille: 1080, because: 'hand first' },
    ],
  }),
  noted('fleas', 'Fleas. Flea bath; treat tub, table and tools before the next pet.', {
    slower: [{ steps: ['bath'], permille: 1200, because: 'flea bath' }],
    extraCleanSeconds: 600,
  }),
  noted(
    'ringworm',
    'Ringworm or suspect. No groom until a vet clears it; disinfect for ten minutes of contact.',
    {
      extraCleanSeconds: 600,
      stop: true,
      decides: 'vet',
    },
  ),

  fact(
    'shortNosed',
    'Short-nosed. Unheated air, no muzzle, no warm van; stop at noisy or hard breathing.',
    {
      slower: [{ steps: ['dry'], permille: 1100, because: 'unheated air' }],
    },
  ),
  fact('senior', 'Old. Rests, soft mat, ten minutes of mat work at most.', {
    slower: [{ steps: handsOn, permille: 1080, because: 'gently, an old pet' }],
  }),
  fact('young', 'Young. Short turns, praise, ten minutes of mat work at most.', {
    slower: [{ steps: handsOn, permille: 1100, because: 'still learning' }],
  }),
  fact('doubleCoatShort', 'Double coat cut short. Get consent: it may not grow back as before.', {
    decides: 'household',
  }),
  fact(
    'matLimit',
    'Mats past what a pet should bear. Clip short with consent; show photos first.',
    {
      decides: 'household',
    },
  ),
  fact(
    'skinAfterMats',
    'Skin under mats may be red, bruised or sore. Tell the household to watch it for a week.',
    {
      decides: 'household',
    },
  ),
  fact('catHandling', 'Cat. Doors shut, quiet, no force dryer; stop at open-mouth breathing.', {}),

  seen('openMouthCat', 'Open-mouth breathing. Stop, dark and quiet, call a vet now.', true, 'vet'),
  seen(
    'panting',
    'Heavy panting. No muzzle; pause and cool. Not settled in a few minutes: stop, vet.',
    false,
    'groomer',
  ),
  seen('vomiting', 'Vomiting. No muzzle. Stop and call the household and a vet.', true, 'vet'),
  {
    ...blank(
      'heat',
      { kind: 'day' },
      'Hot day. Cooling on before the pet comes aboard; short-nosed, old, heavy and ill pets not at noon.',
    ),
    decides: 'business',
  },

  always(
    'neverAlone',
    everyStep,
    'Never alone on the table or in the tub. Quick-release loop, never a noose.',
  ),
  always('dryerFace', ['dry'], 'No dryer at the face. Unheated for pets at risk.'),
  always('dryerNoise', ['dry'], 'Loud: cover the pet’s ears, wear ear protection.'),
  always(
    'hotBlade',
    [...atTheSkin, 'comb'],
    'Feel the blade every few minutes. Hot: change or cool it.',
  ),
  always('skipTooth', atTheSkin, 'Skip-tooth blades stay off flank, groin, thin or loose skin.'),
  always('shortestBlade', atTheSkin, 'Nothing shorter than a #10 unless the style says so.'),
  always('earPlucking', ['ears'], 'Do not pluck healthy ears unless a vet asks for it.'),
  always('shampooFresh', ['bath'], 'Diluted shampoo is made fresh each day; throw the rest away.'),
  always('lukewarm', ['bath'], 'Lukewarm water, tested on the wrist.'),
  always(
    'carbonMonoxide',
    everyStep,
    'Generator or heater on: alarm working, a vent open. Headache: out, all of you.',
  ),
  always(
    'catBite',
    ['checkIn', 'nails', 'bath', 'brush', 'clip'],
    'Cat bite: wash, then a doctor the same day, every time.',
  ),
];

const byKey = new Map(cautions.map((caution) => [caution.key, caution]));

/**
 * One caution of the table.
 * @throws RangeError naming the key when it is not in the table.
 */
export function findCaution(key: CautionKey): Caution {
  const caution = byKey.get(key);
  if (!caution)
    throw new RangeError(`cautions holds "${key}", which is not in the cautions table.`);
  return caution;
}

/** The caution's name for a list or a chip: its first sentence, "Afraid of the dryer". */
export function cautionName({ words }: Pick<Caution, 'words'>): string {
  return words.slice(0, words.search(/[.:,]/));
}

/** Cautions a person may note on a pet, in the order of the table. */
export function notedCautions(): Caution[] {
  return cautions.filter(({ trigger }) => trigger.kind === 'noted');
}

/** Standing cautions to show while a step is under way. `catBite` only with cats. */
export function standingCautions(step: StepKey, species: 'dog' | 'cat'): Caution[] {
  return cautions.filter(
    ({ key, trigger }) =>
      trigger.kind === 'always' &&
      trigger.steps.includes(step) &&
      (key !== 'catBite' || species === 'cat'),
  );
}

type Effect = Partial<
  Pick<Caution, 'barred' | 'slower' | 'extraCleanSeconds' | 'stop' | 'decides'>
>;

function blank(key: CautionKey, trigger: CautionTrigger, words: string): Caution {
  return {
    key,
    trigger,
    words,
    barred: [],
    slower: [],
    extraCleanSeconds: 0,
    stop: false,
    decides: 'groomer',
  };
}

function noted(key: CautionKey, words: string, effect: Effect): Caution {
  return { ...blank(key, { kind: 'noted' }, words), ...effect };
}

function fact(key: CautionKey, words: string, effect: Effect): Caution {
  return { ...blank(key, { kind: 'fact' }, words), ...effect };
}

function seen(key: CautionKey, words: string, stop: boolean, decides: Decider): Caution {
  return { ...blank(key, { kind: 'seen' }, words), stop, decides };
}

function always(key: CautionKey, steps: readonly StepKey[], words: string): Caution {
  return blank(key, { kind: 'always', steps }, words);
}
