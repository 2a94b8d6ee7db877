/** A query taken apart the way the index is: words to match, and the house number wherever it stood. */
export interface AddressQuery {
  words: string[];
  number: string | null;
}

const WHOLE_WORDS: Readonly<Record<string, string>> = {
  st: 'street',
  str: 'street',
  rd: 'road',
  ave: 'avenue',
  av: 'avenue',
  dr: 'drive',
  ln: 'lane',
  la: 'lane',
  cl: 'close',
  ct: 'court',
  crt: 'court',
  pl: 'place',
  sq: 'square',
  ter: 'terrace',
  terr: 'terrace',
  gdns: 'gardens',
  gdn: 'gardens',
  cres: 'crescent',
  cr: 'crescent',
  gr: 'grove',
  wy: 'way',
  blvd: 'boulevard',
  hwy: 'highway',
  pkwy: 'parkway',
  n: 'north',
  s: 'south',
  e: 'east',
  w: 'west',
  mt: 'mount',
  upr: 'upper',
  lwr: 'lower',
};

/** Lower-case words without accents or punctuation, abbreviations written out. */
export function addressWords(text: string): string[] {
  const words = text
    .toLowerCase()
    .replaceAll('ß', 'ss')
    .normalize('NFD')
    .replace(/\p{M}/gu, '')
    .replace(/['’`.]/g, '')
    .split(/[^\p{L}\p{N}/-]+/u)
    .filter(Boolean);
  return words.map((word, i) => {
    if (word === 'st' && i === 0) return 'saint';
    // German compounds: Landstr. is Landstrasse.
    if (word.length > 5 && word.endsWith('str')) return `${word}asse`;
    return WHOLE_WORDS[word] ?? word;
  });
}

/** `isPostcode` keeps a postcode from being taken for a house number. */
export function addressQuery(text: string, isPostcode: (word: string) => boolean): AddressQuery {
  const words = addressWords(text);
  const at = words.findIndex(
    (word) => /^\d+[a-z]?([/-]\d*[a-z]?)?$/.test(word) && !isPostcode(word),
  );
  if (at < 0) return { words, number: null };
  const number = words[at]!;
  const rest = words.toSpliced(at, 1);
  // "12 st osla road": the saint stood second only because of the number.
  if (at === 0 && rest[0] === 'street' && rest.length > 1) rest[0] = 'saint';
  return { words: rest, number };
}
