/**
 * A household as spoken of at the kerb. "Adeyemi" → "the Adeyemis"; a name that already is a phrase
 * ("The Adeyemis", "Harbour Vets", "Ann & Bo") stays as it is.
 */
export function householdWords(name: string): string {
  if (/^the /i.test(name)) return `the ${name.slice(4)}`;
  return /^\p{Lu}[\p{L}'’-]+$/u.test(name) ? `the ${plural(name)}` : name;
}

/** "the Adeyemis'", "Harbour Vets'", "Ann & Bo's": where the van goes. */
export function atHousehold(name: string): string {
  const words = householdWords(name);
  return words.endsWith('s') ? `${words}'` : `${words}'s`;
}

function plural(surname: string): string {
  return /(s|x|z|ch|sh)$/.test(surname) ? `${surname}es` : `${surname}s`;
}
