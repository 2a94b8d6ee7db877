import { linkParts } from './linkParts.ts';

/** A text with its addresses made clickable. */
export function LinkedWords({ text }: { text: string }) {
  return linkParts(text).map((part, index) =>
    part.href ? (
      <a
        key={index}
        href={part.href}
        className="font-semibold wrap-anywhere text-inherit underline underline-offset-3"
      >
        {part.words}
      </a>
    ) : (
      <span key={index}>{part.words}</span>
    ),
  );
}
