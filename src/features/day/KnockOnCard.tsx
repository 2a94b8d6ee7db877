import { Button } from '#src/components/Button.tsx';
import { Chip } from '#src/components/Chip.tsx';
import type { KnockOnRow } from './knockOnRows.ts';

/** Everything a move changes, before anybody keeps it. */
export function KnockOnCard({
  title,
  rows,
  refusedBecause,
  unchanged,
  notice,
  keeping,
  carried,
  onKeep,
  onPutBack,
}: {
  /** "Juniper moves to Plover, after Sorrel" */
  title: string;
  rows: readonly KnockOnRow[];
  refusedBecause: string | null;
  unchanged: boolean;
  notice: string | null;
  keeping: boolean;
  /** Still in hand: Enter drops it first. */
  carried: boolean;
  onKeep: () => void;
  onPutBack: () => void;
}) {
  return (
    <section className="card border-collar px-4 py-4 md:px-5" aria-label="What the move changes">
      <h2 className="mb-1 text-base font-semibold">If {title}</h2>
      {notice && <Notice words={notice} />}
      {refusedBecause ? (
        <Notice words={refusedBecause} />
      ) : unchanged ? (
        <p className="py-2 text-slate">
          {carried
            ? 'In hand. Arrow keys move it, Enter drops it, Escape puts it back.'
            : 'It is there already: nothing changes.'}
        </p>
      ) : (
        <dl className="rows text-[15px]">
          {rows.map((row) => (
            <div key={row.key} className="flex items-baseline justify-between gap-4 py-[7px]">
              <dt className={row.tone === 'bad' ? '' : 'text-slate'}>{row.label}</dt>
              <dd className="shrink-0 text-right">
                <RowValue row={row} />
              </dd>
            </div>
          ))}
        </dl>
      )}
      <div className="mt-3 flex flex-wrap gap-2">
        {!refusedBecause && !unchanged && (
          <Button kind="go" busy={keeping} busyWords="Keeping" onClick={onKeep}>
            Keep the move
          </Button>
        )}
        <Button onClick={onPutBack} disabled={keeping}>
          Put it back
        </Button>
      </div>
    </section>
  );
}

function RowValue({ row }: { row: KnockOnRow }) {
  if (row.tone === 'ok' || row.tone === 'bad') return <Chip tone={row.tone}>{row.value}</Chip>;
  return <b className={row.tone === 'less' ? 'text-collar' : ''}>{row.value}</b>;
}

/** Something to know before going on, in words; polite, so that it does not cut a sentence. */
export function Notice({ words }: { words: string }) {
  return (
    <p
      role="status"
      className="my-2 rounded-[10px] bg-[var(--honey-soft)] px-3 py-2 text-[14.5px] leading-snug"
    >
      <span aria-hidden="true">◆ </span>
      {words}
    </p>
  );
}
