/** The first letter large, the rest as it is. */
export function sentenceCase(words: string): string {
  return words.slice(0, 1).toUpperCase() + words.slice(1);
}
