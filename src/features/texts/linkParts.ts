export interface TextPart {
  words: string;
  /** Set for a part that is an address. */
  href: string | null;
}

/** A text cut into words and http(s) addresses; a full stop or bracket behind one is not part of it. */
export function linkParts(text: string): TextPart[] {
  const parts: TextPart[] = [];
  let from = 0;
  for (const match of text.matchAll(/https?:\/\/[^\s<>"']+/g)) {
    const href = match[0].replace(/[.,;:!?)\]]+$/, '');
    if (match.index > from) parts.push({ words: text.slice(from, match.index), href: null });
    parts.push({ words: href, href });
    from = match.index + href.length;
  }
  if (from < text.length) parts.push({ words: text.slice(from), href: null });
  return parts;
}
