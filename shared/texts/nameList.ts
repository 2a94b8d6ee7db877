/**
 * Names as spoken: 'Pip', 'Pip and Juno', 'Pip, Juno and Bo'. Past `mostLetters` the rest is
 * counted, 'Pip, Juno and 3 more', because a text pays by the letter.
 */
export function nameList(names: readonly string[], mostLetters = 48): string {
  const all = join(names);
  if (all.length <= mostLetters || names.length < 2) return all;
  for (let kept = names.length - 1; kept > 1; kept -= 1) {
    const some = join([...names.slice(0, kept), `${names.length - kept} more`]);
    if (some.length <= mostLetters) return some;
  }
  return join([names[0]!, `${names.length - 1} more`]);
}

function join(names: readonly string[]): string {
  if (names.length < 2) return names[0] ?? '';
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
