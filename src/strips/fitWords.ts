/**
 * The words cut with an ellipsis to about `widthPx` at a font size; empty where not even three
 * letters fit. SVG text does not cut itself, and measuring every label would cost the frame.
 */
export function fitWords(words: string, widthPx: number, fontPx: number): string {
  const most = Math.floor(widthPx / (fontPx * LETTER));
  if (words.length <= most) return words;
  return most < 4 ? '' : `${words.slice(0, most - 1).trimEnd()}…`;
}

/** Mean width of Work Sans' letters in ems, a little on the safe side. */
const LETTER = 0.57;
