import { planBOf } from './planB.ts';
import type { CoatType, PlanB, RegionCut, Style } from './types.ts';

// Cut shorthands. A blade's number names no fixed length, so styles carry millimetres; the numbers
// in the comments are the usual labels. Above the table because it is built at once.
const scissor: RegionCut = { tool: 'scissor', lengthTenthsMm: null };
const strip: RegionCut = { tool: 'strip' };
const blade10 = blade(15, 'with'); // #10
const blade7 = blade(32, 'with'); // #7F
const blade5 = blade(63, 'with'); // #5F
const blade10Against = blade(15, 'against');
const comb13 = comb(130); // half an inch
const comb16 = comb(160); // five eighths
const comb22 = comb(220); // seven eighths
const leave: RegionCut = { tool: 'leave' };
const longKept = { neck: leave, back: leave, belly: leave, foreLegs: leave, hindLegs: leave };

const scissoredLegs = { foreLegs: scissor, hindLegs: scissor, feet: scissor };
const scissoredHead = { head: scissor, ears: scissor };
const feathers = { ears: scissor, belly: scissor, foreLegs: scissor, hindLegs: scissor };

const growing: readonly CoatType[] = ['curly', 'drop', 'combination', 'wire'];
const jacketed: readonly CoatType[] = ['wire', 'curly', 'drop'];
const feathered: readonly CoatType[] = ['combination', 'double', 'drop'];
const brushed: readonly CoatType[] = ['smooth', 'double', 'curly', 'drop', 'wire', 'combination'];
const cats: readonly CoatType[] = ['catShort', 'catLong'];

/**
 * Starting styles. Names are neutral words of the trade, the cut plans our own; a business edits
 * copies. Regions not named are left alone; `sanitary` and pads are services, not cuts.
 */
export const styles: readonly Style[] = [
  dogStyle('bath-and-brush', 'Bath and brush', brushed, 'tidy', {}, ['bath', 'nails', 'ears']),
  dogStyle('bath-and-deshed', 'Bath and undercoat out', ['double', 'smooth', 'wire'], 'tidy', {}, [
    'bath',
    'deshed',
    'nails',
    'ears',
  ]),
  dogStyle('nails-and-ears', 'Nails and ears only', brushed, 'tidy', {}, ['nails', 'ears']),
  dogStyle(
    'feet-and-sanitary',
    'Bath, feet and sanitary tidy',
    brushed,
    'tidy',
    { feet: scissor },
    full(),
  ),
  dogStyle(
    'first-puppy',
    'First puppy visit',
    growing,
    'tidy',
    { head: scissor, feet: scissor },
    full(),
    // The first visit teaches; nothing on it is worth a fright.
    {
      services: { nails: 'ifAllowed', sanitary: 'ifAllowed', pads: 'leave', ears: 'leave' },
      regions: { head: 'ifAllowed', feet: 'ifAllowed' },
    },
  ),
  dogStyle(
    'short-all-over',
    'Short all over',
    growing,
    'pet',
    {
      neck: blade7,
      back: blade7,
      belly: blade7,
      foreLegs: blade5,
      hindLegs: blade5,
      head: scissor,
      ears: scissor,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'half-inch-all-over',
    'Half inch all over',
    growing,
    'pet',
    {
      neck: comb13,
      back: comb13,
      belly: comb13,
      foreLegs: comb13,
      hindLegs: comb13,
      head: scissor,
      ears: scissor,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'teddy',
    'Teddy: combed body, round head and legs',
    growing,
    'pet',
    {
      neck: comb13,
      back: comb13,
      belly: comb13,
      ...scissoredLegs,
      ...scissoredHead,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'lamb-legs',
    'Short body, full legs',
    ['curly', 'drop'],
    'pet',
    {
      neck: blade5,
      back: blade5,
      belly: blade5,
      ...scissoredLegs,
      ...scissoredHead,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'clean-face-and-feet',
    'Clean face and feet, scissored legs',
    ['curly'],
    'pet',
    {
      neck: comb16,
      back: comb16,
      belly: comb16,
      head: scissor,
      ears: scissor,
      foreLegs: scissor,
      hindLegs: scissor,
      tail: scissor,
      feet: blade10Against,
    },
    full(),
  ),
  dogStyle(
    'scissored-curly',
    'Scissored all over',
    ['curly', 'drop'],
    'full',
    {
      neck: scissor,
      back: scissor,
      belly: scissor,
      ...scissoredLegs,
      ...scissoredHead,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'terrier-jacket-clipped',
    'Terrier jacket, clipped',
    jacketed,
    'pet',
    {
      neck: blade5,
      back: blade5,
      ears: blade10,
      tail: blade5,
      head: scissor,
      belly: scissor,
      foreLegs: scissor,
      feet: scissor,
    },
    full(),
  ),
  dogStyle(
    'terrier-jacket-stripped',
    'Terrier jacket, hand-stripped',
    ['wire'],
    'pet',
    {
      neck: strip,
      back: strip,
      belly: strip,
      tail: strip,
      head: scissor,
      feet: scissor,
    },
    full(),
    // A jacket may be rolled in two sittings; the back first.
    { services: {}, regions: { back: 'must', neck: 'ifAllowed', belly: 'leave', tail: 'leave' } },
  ),
  dogStyle(
    'bearded-outline',
    'Beard and brows, clipped jacket',
    ['wire'],
    'pet',
    {
      neck: blade7,
      back: blade7,
      belly: blade7,
      ears: blade10,
      tail: blade7,
      head: scissor,
      foreLegs: scissor,
      hindLegs: scissor,
      feet: scissor,
    },
    full(),
  ),
  dogStyle(
    'spaniel-outline',
    'Spaniel outline, clipped back',
    ['combination', 'curly', 'drop'],
    'pet',
    {
      neck: blade7,
      back: blade7,
      head: blade10,
      ...feathers,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'spaniel-outline-stripped',
    'Spaniel outline, hand-stripped back',
    ['combination'],
    'pet',
    {
      neck: strip,
      back: strip,
      head: blade10,
      ...feathers,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'feather-tidy',
    'Feathers and feet tidied',
    feathered,
    'tidy',
    {
      ears: scissor,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'long-coat-kept',
    'Long coat kept, ends trimmed',
    ['drop', 'combination'],
    'tidy',
    {
      ...longKept,
      head: scissor,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'longer-all-over',
    'Longer all over, combed',
    ['curly', 'drop', 'combination'],
    'pet',
    {
      neck: comb22,
      back: comb22,
      belly: comb22,
      foreLegs: comb22,
      hindLegs: comb22,
      ...scissoredHead,
      feet: scissor,
      tail: scissor,
    },
    full(),
  ),
  dogStyle(
    'between-visits',
    'Face, feet and sanitary between grooms',
    growing,
    'tidy',
    { head: scissor, feet: scissor },
    ['nails', 'ears', 'sanitary', 'pads'],
  ),
  dogStyle(
    'outline-tidied',
    'Undercoat out, outline tidied',
    ['double'],
    'tidy',
    { hindLegs: { tool: 'scissor', lengthTenthsMm: 400 }, feet: scissor, tail: scissor },
    ['bath', 'deshed', 'nails', 'ears', 'sanitary', 'pads'],
  ),
  dogStyle(
    'jacket-rolled',
    'Jacket rolled, furnishings combed',
    ['wire'],
    'tidy',
    { neck: strip, back: strip },
    ['nails', 'ears', 'pads'],
    { services: {}, regions: { neck: 'ifAllowed', back: 'must' } },
  ),
  dogStyle('bath-brush-and-teeth', 'Bath, brush and teeth', brushed, 'tidy', {}, [
    'bath',
    'nails',
    'ears',
    'teeth',
  ]),
  dogStyle('corded-bath', 'Cords washed and parted', ['corded'], 'tidy', {}, full()),
  dogStyle('skin-bath', 'Skin bath', ['hairless'], 'tidy', {}, ['bath', 'nails', 'ears']),
  catStyle('cat-nails', 'Cat nails', [...cats, 'hairless'], {}, ['nails']),
  catStyle('cat-comb-out', 'Cat comb-out', cats, {}, ['deshed', 'nails']),
  catStyle('cat-bath-and-comb', 'Cat bath and comb-out', cats, {}, [
    'bath',
    'deshed',
    'nails',
    'ears',
  ]),
  catStyle('cat-belly-clear', 'Cat comb-out, belly clipped', ['catLong'], { belly: blade10 }, [
    'deshed',
    'nails',
    'sanitary',
  ]),
  catStyle(
    'cat-body-clip',
    'Cat body clip, mane and tail tip left',
    cats,
    {
      back: blade10,
      belly: blade10,
      hindLegs: blade10,
    },
    ['bath', 'nails', 'ears', 'sanitary'],
  ),
  catStyle(
    'cat-combed-short',
    'Cat combed short, half an inch',
    ['catLong'],
    { neck: comb13, back: comb13, belly: comb13, hindLegs: comb13 },
    ['bath', 'nails', 'ears', 'sanitary'],
  ),
  catStyle('cat-skin-bath', 'Cat skin bath', ['hairless'], {}, ['bath', 'nails', 'ears']),
];

const byId = new Map(styles.map((style) => [style.id, style]));

/**
 * The starting style with this id.
 * @throws RangeError naming the field when there is none.
 */
export function findStyle(styleId: string): Style {
  const style = byId.get(styleId);
  if (!style) {
    throw new RangeError(
      `styleId "${styleId}" is not a starting style; see styles.ts for the ids.`,
    );
  }
  return style;
}

function blade(lengthTenthsMm: number, direction: 'with' | 'against'): RegionCut {
  return { tool: 'blade', lengthTenthsMm, direction };
}

function comb(lengthTenthsMm: number): RegionCut {
  return { tool: 'comb', lengthTenthsMm, direction: 'with' };
}

function full(): Style['services'] {
  return ['bath', 'nails', 'ears', 'sanitary', 'pads'];
}

function dogStyle(
  id: string,
  name: string,
  coats: readonly CoatType[],
  finish: Style['finish'],
  cuts: Style['cuts'],
  services: Style['services'],
  planB?: PlanB,
): Style {
  return complete({ id, name, species: 'dog', coats, cuts, finish, services, planB });
}

function catStyle(
  id: string,
  name: string,
  coats: readonly CoatType[],
  cuts: Style['cuts'],
  services: Style['services'],
): Style {
  // A cat that has had enough has had enough: the bath goes before the coat is cared for.
  const planB: PlanB = {
    services: { bath: 'leave', ears: 'ifAllowed', deshed: 'must' },
    regions: {},
  };
  return complete({ id, name, species: 'cat', coats, cuts, finish: 'tidy', services, planB });
}

/** Every starting style carries its whole plan B, so that a business sees what it edits. */
function complete(style: Style): Style {
  return { ...style, planB: planBOf(style) };
}
