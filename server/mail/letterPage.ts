/** One paragraph of a letter: words, or a button-like link written out in full in plain text. */
export type LetterPart = string | { label: string; url: string };

/** The same parts as plain text and as simple HTML; every word is escaped in HTML. */
export function letterPage(parts: readonly LetterPart[]): { text: string; html: string } {
  const text = parts
    .map((part) => (typeof part === 'string' ? part : `${part.label}:\n${part.url}`))
    .join('\n\n');
  const html = parts
    .map((part) => {
      if (typeof part === 'string') return `<p>${escapeHtml(part)}</p>`;
      const url = escapeHtml(part.url);
      return `<p><a href="${url}" style="color:#0f5c5a;font-weight:600">${escapeHtml(part.label)}</a><br><small>${url}</small></p>`;
    })
    .join('\n');
  return {
    text: `${text}\n`,
    html: `<!doctype html>\n<html lang="en"><body style="font-family:sans-serif;font-size:16px;line-height:1.5;color:#1f2a2e">\n${html}\n</body></html>\n`,
  };
}

function escapeHtml(text: string): string {
  const entities: Record<string, string> = {
    '&': '&amp;',
    '<': '&lt;',
    '>': '&gt;',
    '"': '&quot;',
    "'": '&#39;',
  };
  return text.replace(/[&<>"']/g, (letter) => entities[letter]!);
}
