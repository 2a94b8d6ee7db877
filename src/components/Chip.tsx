import type { ReactNode } from 'react';

export type ChipTone = 'plain' | 'ok' | 'bad' | 'heed';

const looks: Record<ChipTone, { classes: string; symbol: string | null; words: string | null }> = {
  plain: { classes: 'bg-linen text-ink', symbol: null, words: null },
  ok: { classes: 'bg-collar-soft text-collar', symbol: '✓', words: null },
  bad: { classes: 'bg-rosette-soft text-rosette', symbol: '▲', words: 'Careful: ' },
  heed: { classes: 'bg-[var(--honey-soft)] text-ink', symbol: '◆', words: null },
};

/** A short fact in a pill. Tones carry a symbol too, never colour alone. */
export function Chip({
  tone = 'plain',
  children,
  className = '',
}: {
  tone?: ChipTone;
  children: ReactNode;
  className?: string;
}) {
  const look = looks[tone];
  return (
    <span
      className={`inline-block rounded-lg px-2.5 py-[3px] text-[13.5px] leading-snug font-semibold ${look.classes} ${className}`}
    >
      {look.symbol && <span aria-hidden="true">{look.symbol} </span>}
      {look.words && <span className="sr-only">{look.words}</span>}
      {children}
    </span>
  );
}
