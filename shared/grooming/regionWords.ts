import type { Region } from './types.ts';

/** Regions as people say them: "legs, head and tail". Both pairs of legs become "legs". */
export function regionWords(chosen: readonly Region[]): string {
  const both = chosen.includes('foreLegs') && chosen.includes('hindLegs');
  const order: readonly Region[] = SPOKEN.filter((region) => chosen.includes(region));
  const words = order.flatMap((region) => {
    if (both && region === 'foreLegs') return ['legs'];
    if (both && region === 'hindLegs') return [];
    return [WORDS[region]];
  });
  const last = words.pop() ?? '';
  return words.length > 0 ? `${words.join(', ')} and ${last}` : last;
}

const SPOKEN: readonly Region[] = [
  'back',
  'belly',
  'neck',
  'foreLegs',
  'hindLegs',
  'feet',
  'head',
  'ears',
  'tail',
  'sanitary',
];

const WORDS: Record<Region, string> = {
  head: 'head',
  ears: 'ears',
  neck: 'neck',
  back: 'back',
  belly: 'belly',
  foreLegs: 'front legs',
  hindLegs: 'back legs',
  feet: 'feet',
  tail: 'tail',
  sanitary: 'sanitary area',
};
