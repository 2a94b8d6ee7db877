/** The part of a pet the strips name; a pet of `VisitCard` fits. */
export interface NamedPet {
  breedName: string;
  styleName: string;
}

/**
 * Whom a stop is for, in a few words: "Toy poodle, teddy"; "2 Miniature schnauzers, teddy" where
 * breed and style are shared; else the breeds: "Pug & Shih Tzu".
 */
export function petWords(pets: readonly NamedPet[]): string {
  const breeds = [...new Set(pets.map((pet) => breedWords(pet.breedName)))];
  const styles = [...new Set(pets.map((pet) => pet.styleName.toLowerCase()))];
  if (breeds.length === 0) return '';
  const shared = styles.length === 1 && styles[0] !== '' ? `, ${styles[0]}` : '';
  if (pets.length === 1) return `${breeds[0]}${shared}`;
  if (breeds.length === 1) return `${pets.length} ${plural(breeds[0]!)}${shared}`;
  return breeds.join(' & ');
}

/** Tables sort by kind ("Poodle, toy"); people say "Toy poodle". Names keep their capitals. */
export function breedWords(name: string): string {
  const [kind, variety, ...rest] = name.split(', ');
  if (kind === undefined || variety === undefined || rest.length > 0) return name;
  return `${variety.slice(0, 1).toUpperCase()}${variety.slice(1)} ${kind.slice(0, 1).toLowerCase()}${kind.slice(1)}`;
}

function plural(noun: string): string {
  if (/(s|x|z|ch|sh)$/.test(noun)) return `${noun}es`;
  return /[^aeiou]y$/.test(noun) ? `${noun.slice(0, -1)}ies` : `${noun}s`;
}
