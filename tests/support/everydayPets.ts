/**
 * The page of twenty everyday pets, forecast minutes beside published ranges. Writes it anew when
 * run: `npx tsx tests/support/everydayPets.ts`. A test holds the page to what the model says.
 */
import { writeFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { format } from 'prettier';
import { bodyOf } from '#shared/grooming/body.ts';
import { findBreed } from '#shared/grooming/breeds.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import { groomModel } from '#shared/grooming/groomModel.ts';
import { petLike } from '#shared/grooming/petLike.ts';
import { findStyle } from '#shared/grooming/styles.ts';
import type { PetForecast, StepFamily, StepKey } from '#shared/grooming/types.ts';

/** What is set beside a published range: step families, cutting as one, the whole pet. */
export type Measure = 'prep' | 'wash' | 'dry' | 'cut' | 'whole';

export interface Range {
  /** null: published as an upper bound only. */
  least: number | null;
  most: number;
  /** Letter of the source in `sources`. */
  source: string;
}

export interface EverydayPet {
  breedId: string;
  styleId: string;
  forecast: PetForecast;
  published: Partial<Record<Measure, Range>>;
}

export const page = fileURLToPath(new URL('../../shared/grooming/EVERYDAY.md', import.meta.url));

/** Calm, grown, six weeks since the last groom, coat in good order, the breed's middle weight. */
export function everydayPets(): EverydayPet[] {
  return chosen.map(([breedId, styleId]) => {
    const { species } = findBreed(breedId);
    const pet = petLike({ species, breedId, weightGrams: null, coatType: null });
    const body = bodyOf(pet);
    const forecast = forecastPet(pet, findStyle(styleId));
    const published =
      species === 'cat'
        ? forCat(styleId)
        : forDog(breedId, body.weightGrams, body.coatType, styleId);
    return { breedId, styleId, forecast, published };
  });
}

/** Minutes of what a published range speaks about. Check-in is in nobody's figure for prep. */
export function minutesOf(forecast: PetForecast, measure: Measure): number {
  if (measure === 'whole') return forecast.medianSeconds / 60;
  if (measure === 'prep')
    return sum(forecast, ({ family, key }) => family === 'prep' && key !== 'checkIn');
  if (measure === 'cut')
    return sum(forecast, ({ family }) => family === 'clip' || family === 'scissor');
  return sum(forecast, ({ family }) => family === measure);
}

/** Whether whole minutes lie in the range, as the page shows them. */
export function isInside(minutes: number, { least, most }: Range): boolean {
  return Math.round(minutes) >= (least ?? 0) && Math.round(minutes) <= most;
}

export const sources: Record<string, string> = {
  a: 'grooming trade school, “Time is money”: prep 5 min if back within six weeks, up to 15 if longer; bath 5–10 for small to medium pets with a bathing system',
  b: 'a salon groomer’s time chart: bath and brush-out small 10–20, large 15–30; all over to half an inch small 30–60, large 45–75; body clipped and head, feet and tail scissored 30–60',
  c: 'a fleet owner of ten vans (Yale Climate Connections, February 2020): blow-dry 15–20 of a 90-minute groom, set beside brush-out from (b); no source gives a small pet’s dryer minutes, so its range starts at brush-out alone',
  d: 'contest limits, an upper bound for an experienced groomer’s cutting: poodles by height 90/105/120/135 (Groom Team Canada-sanctioned classes), scissored purebreds 120 (a US trade show)',
  e: 'hand-stripping sold in sessions of one to three hours; one kennel’s Cairn takes 90 min',
  f: 'whole haircuts by size, from salons and vans: small 60–120, medium 90–150, large 120–210',
  g: 'two cat groomers: most cats 40–60 min',
};

const chosen: readonly [breedId: string, styleId: string][] = [
  ['poodle-toy', 'teddy'],
  ['poodle-miniature', 'scissored-curly'],
  ['poodle-standard', 'clean-face-and-feet'],
  ['bichon-frise', 'scissored-curly'],
  ['cockapoo', 'teddy'],
  ['goldendoodle', 'half-inch-all-over'],
  ['shih-tzu', 'short-all-over'],
  ['maltese', 'long-coat-kept'],
  ['yorkshire-terrier', 'teddy'],
  ['miniature-schnauzer', 'bearded-outline'],
  ['west-highland-terrier', 'terrier-jacket-clipped'],
  ['border-terrier', 'terrier-jacket-stripped'],
  ['english-cocker', 'spaniel-outline'],
  ['cavalier', 'feather-tidy'],
  ['golden-retriever', 'outline-tidied'],
  ['labrador', 'bath-and-brush'],
  ['german-shepherd', 'bath-and-deshed'],
  ['pug', 'bath-and-brush'],
  ['ragdoll', 'cat-bath-and-comb'],
  ['british-shorthair', 'cat-comb-out'],
];

/** Small under 10 kg, large from 22 kg: about where the charts' words begin. */
function sizeOf(grams: number): 'small' | 'medium' | 'large' {
  return grams < 10_000 ? 'small' : grams < 22_000 ? 'medium' : 'large';
}

function forDog(
  breedId: string,
  grams: number,
  coat: string,
  styleId: string,
): EverydayPet['published'] {
  const size = sizeOf(grams);
  const style = findStyle(styleId);
  const longHaired = coat !== 'smooth' && coat !== 'wire';
  const cut = cutRange(breedId, styleId, size);
  const haircut = cut !== null && cut.source !== 'e';
  return {
    prep: { least: 5, most: 15, source: 'a' },
    ...(style.services.includes('bath') && {
      wash: {
        small: { least: 5, most: 20, source: 'a, b' },
        medium: { least: 5, most: 30, source: 'a, b' },
        large: { least: 15, most: 30, source: 'b' },
      }[size],
    }),
    ...(longHaired && {
      dry: {
        small: { least: 10, most: 40, source: 'b, c' },
        medium: { least: 25, most: 50, source: 'b, c' },
        large: { least: 30, most: 50, source: 'b, c' },
      }[size],
    }),
    ...(cut && { cut }),
    ...(haircut && {
      whole: {
        small: { least: 60, most: 120, source: 'f' },
        medium: { least: 90, most: 150, source: 'f' },
        large: { least: 120, most: 210, source: 'f' },
      }[size],
    }),
  };
}

function cutRange(
  breedId: string,
  styleId: string,
  size: 'small' | 'medium' | 'large',
): Range | null {
  if (styleId === 'scissored-curly') {
    const poodle = { small: 105, medium: 120, large: 135 }[size];
    return { least: null, most: breedId.startsWith('poodle') ? poodle : 120, source: 'd' };
  }
  if (styleId === 'terrier-jacket-stripped') return { least: 60, most: 180, source: 'e' };
  if (styleId === 'half-inch-all-over' || styleId === 'short-all-over') {
    return size === 'small'
      ? { least: 30, most: 60, source: 'b' }
      : { least: 45, most: 75, source: 'b' };
  }
  const part = [
    'teddy',
    'bearded-outline',
    'terrier-jacket-clipped',
    'spaniel-outline',
    'clean-face-and-feet',
  ];
  return part.includes(styleId) ? { least: 30, most: 60, source: 'b' } : null;
}

function forCat(styleId: string): EverydayPet['published'] {
  return styleId === 'cat-bath-and-comb' ? { whole: { least: 40, most: 60, source: 'g' } } : {};
}

function sum(
  forecast: PetForecast,
  of: (step: { family: StepFamily; key: StepKey }) => boolean,
): number {
  return (
    forecast.steps.filter(of).reduce((total, { medianSeconds }) => total + medianSeconds, 0) / 60
  );
}

/** The page as prettier leaves it, so that formatting the house changes nothing. */
export async function everydayPage(): Promise<string> {
  const pets = everydayPets();
  const rows = pets.map(({ breedId, styleId, forecast, published }) => {
    const cell = (measure: Measure, minutes: number) => {
      const range = published[measure];
      if (minutes === 0) return '–';
      const shown = String(Math.round(minutes));
      return range
        ? `${shown} (${rangeWords(range)})${isInside(minutesOf(forecast, measure), range) ? '' : ' ▲'}`
        : shown;
    };
    const family = (name: StepFamily) => sum(forecast, (step) => step.family === name);
    const cells = [
      findBreed(breedId).name,
      `${(forecast.heaviestGrams / 1000).toFixed(1)}`,
      findStyle(styleId).name,
      cell('prep', minutesOf(forecast, 'prep')),
      cell('wash', family('wash')),
      cell('dry', family('dry')),
      `${whole(family('clip'))}`,
      `${whole(family('scissor'))}`,
      cell('cut', minutesOf(forecast, 'cut')),
      whole(family('wrap') + sum(forecast, ({ key }) => key === 'checkIn')),
      cell('whole', forecast.medianSeconds / 60),
      `${Math.round(forecast.p10Seconds / 60)}–${Math.round(forecast.p90Seconds / 60)}`,
    ];
    return `| ${cells.join(' | ')} |`;
  });
  const compared = pets.flatMap(({ forecast, published }) =>
    (Object.entries(published) as [Measure, Range][])
      .filter(([measure]) => minutesOf(forecast, measure) > 0)
      .map(([measure, range]) => isInside(minutesOf(forecast, measure), range)),
  );
  const heads = [
    'Pet',
    'kg',
    'Style',
    'prep',
    'wash',
    'dry and brush',
    'clip',
    'scissor',
    'clip + scissor',
    'check-in, wrap-up',
    'whole pet',
    '8 in 10',
  ];
  const text = `# Twenty everyday pets

Written by \`tests/support/everydayPets.ts\` from the starting values \`${groomModel.version}\`; do not edit.

Medians in minutes for a calm, grown pet of the breed’s middle weight, six weeks since the last groom, coat in good order, without the minutes around the pet. In brackets a published range where one was found; ▲ marks a forecast outside it. The whole is a median, so it is not quite the sum of the steps’ medians. ${compared.filter(Boolean).length} of ${compared.length} lie inside. Trade sources are weak evidence (no time-and-motion study was found): they are where learning starts, and a business’s own records overwrite them.

| ${heads.join(' | ')} |
| ${heads.map((_, index) => (index === 0 || index === 2 ? ':-' : '-:')).join(' | ')} |
${rows.join('\n')}

## Published ranges

${Object.entries(sources)
  .map(([letter, words]) => `- **${letter}** ${words}.`)
  .join('\n')}

By column: prep (a), without check-in; wash small and medium (a, b), large (b); dry and brush of coats that need brushing (b, c); clip + scissor (b), scissored all over (d), hand-stripped (e); whole haircuts (f), bathed cats (g). Small is under 10 kg, large from 22 kg.
`;
  return format(text, {
    parser: 'markdown',
    printWidth: 100,
    singleQuote: true,
    proseWrap: 'preserve',
  });
}

function whole(minutes: number): string {
  return minutes === 0 ? '–' : String(Math.round(minutes));
}

function rangeWords({ least, most }: Range): string {
  return least === null ? `≤ ${most}` : `${least}–${most}`;
}

if (process.argv[1] === fileURLToPath(import.meta.url)) writeFileSync(page, await everydayPage());
