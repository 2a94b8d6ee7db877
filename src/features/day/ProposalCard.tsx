import { Button } from '#src/components/Button.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import type { Proposal } from '#shared/api/days.ts';
import { writeList } from '#src/lib/words.ts';
import { Notice } from './KnockOnCard.tsx';
import type { ProposalRow } from './proposalRows.ts';

export type ProposalView = 'now' | 'proposed';

/** A day the optimiser offers: what it changes, and the choice. Nothing changes until it is kept. */
export function ProposalCard({
  proposal,
  rows,
  movedCount,
  takenOff,
  placed,
  view,
  notice,
  busy,
  canKeep,
  onView,
  onKeep,
  onDrop,
}: {
  proposal: Proposal;
  rows: readonly ProposalRow[];
  movedCount: number;
  /** Visits in words that leave the vans, and that come onto one. */
  takenOff: readonly string[];
  placed: readonly string[];
  view: ProposalView;
  notice: string | null;
  busy: boolean;
  canKeep: boolean;
  onView: (view: ProposalView) => void;
  onKeep: () => void;
  onDrop: () => void;
}) {
  const working = proposal.state === 'working';
  const ready = proposal.state === 'ready';
  const same = ready && rows.length > 0 && movedCount === 0;
  return (
    <section className="card border-collar px-4 py-4 md:px-5" aria-label="Proposed day">
      <h2 className="text-base font-semibold">
        {working
          ? 'Looking for a better day'
          : ready
            ? same
              ? 'No better day found'
              : 'A proposed day'
            : 'The search stopped'}
      </h2>
      {working && <Progress permille={proposal.progressPermille} />}
      {proposal.message && <p className="mt-1 text-slate">{proposal.message}</p>}
      {notice && <Notice words={notice} />}
      {same && (
        <p className="mt-1 text-slate">The order of the day is the best the search knows.</p>
      )}
      {rows.length > 0 && !same && (
        <>
          {working && <p className="mt-2 text-sm text-slate">Best so far</p>}
          <Numbers rows={rows} />
          {takenOff.length > 0 && (
            <p className="pt-2 font-semibold text-rosette">
              ▲ Leaves the vans: {writeList(takenOff)}
            </p>
          )}
          {placed.length > 0 && <p className="pt-1">Comes onto a van: {writeList(placed)}</p>}
          <p className="pt-2 text-sm text-slate">
            {movedCount === 0
              ? 'No visit moves.'
              : `${movedCount} ${movedCount === 1 ? 'visit changes its van or place' : 'visits change their van or place'}, drawn with a dashed edge.`}
          </p>
          <Segmented
            label="Strips and map show"
            className="mt-2"
            choices={[
              { value: 'now', label: 'the day now' },
              { value: 'proposed', label: working ? 'best so far' : 'the proposal' },
            ]}
            value={view}
            onChange={onView}
          />
        </>
      )}
      <div className="mt-3 flex flex-wrap gap-2">
        {ready && !same && canKeep && (
          <Button kind="go" busy={busy} onClick={onKeep}>
            Keep this day
          </Button>
        )}
        <Button onClick={onDrop} disabled={busy}>
          {working ? 'Stop looking' : same ? 'Close' : 'Drop it'}
        </Button>
      </div>
    </section>
  );
}

function Progress({ permille }: { permille: number }) {
  return (
    <div
      role="progressbar"
      aria-label="Search"
      aria-valuemin={0}
      aria-valuemax={100}
      aria-valuenow={Math.round(permille / 10)}
      className="mt-2 h-2 overflow-hidden rounded-full bg-linen"
    >
      <div
        className="h-full rounded-full bg-collar transition-[width] duration-300"
        style={{ width: `${Math.max(2, permille / 10)}%` }}
      />
    </div>
  );
}

const tones = {
  same: { mark: '', words: '', color: 'text-slate' },
  better: { mark: '✓', words: 'better', color: 'text-collar' },
  worse: { mark: '▲', words: 'worse', color: 'text-rosette' },
};

function Numbers({ rows }: { rows: readonly ProposalRow[] }) {
  return (
    <dl className="rows mt-1 text-[15px]">
      {rows.map((row) => (
        <div key={row.label} className="flex items-baseline justify-between gap-4 py-[6px]">
          <dt className="text-slate">{row.label}</dt>
          <dd className={`text-right font-semibold ${tones[row.tone].color}`}>
            {row.tone === 'same' ? `${row.after} as now` : `${row.before} → ${row.after}`}
            {row.tone !== 'same' && (
              <>
                <span aria-hidden="true"> {tones[row.tone].mark}</span>
                <span className="sr-only"> {tones[row.tone].words}</span>
              </>
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
