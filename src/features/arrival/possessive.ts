/** "Clover's", "Rook and Wren's", "Otis'". */
export function possessive(names: string): string {
  return names.endsWith('s') ? `${names}'` : `${names}'s`;
}
