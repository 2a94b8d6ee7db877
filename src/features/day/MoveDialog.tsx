import { useMemo, useState } from 'react';
import type { DayProblem, DayTimes, Move, Plan } from '#shared/schedule/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import type { WeightUnit } from '#src/lib/measures.ts';
import { begunBefore, stayMove } from './carryVisit.ts';
import { knockOnRows } from './knockOnRows.ts';
import { otherVisits } from './moveWords.ts';
import { tryMove } from './tryMove.ts';

/** Moving a visit without dragging: pick van and place, see the first of what it changes, draw it. */
export function MoveDialog({
  problem,
  plan,
  times,
  visitId,
  unit,
  onPropose,
  onClose,
}: {
  problem: DayProblem;
  plan: Plan;
  times: DayTimes;
  visitId: string;
  unit: WeightUnit;
  onPropose: (move: Move) => void;
  onClose: () => void;
}) {
  const label = problem.visits.find((visit) => visit.id === visitId)?.label ?? 'the visit';
  const [move, setMove] = useState<Move>(() => stayMove(plan, visitId));
  const trial = useMemo(() => tryMove(problem, plan, times, move), [problem, plan, times, move]);
  const rows = knockOnRows(problem, trial.times, trial.knockOn, move, unit);
  const vanId = move.kind === 'placeVisit' ? move.vanId : '';
  const others = vanId ? otherVisits(plan, vanId, visitId) : [];
  const least = begunBefore(problem, others);
  const nameOf = (id: string) => problem.visits.find((visit) => visit.id === id)?.label ?? '';
  return (
    <Dialog
      title={`Move ${label}`}
      onClose={onClose}
      actions={
        <>
          <Button
            kind="go"
            disabled={!trial.moved}
            onClick={() => {
              onPropose(move);
              onClose();
            }}
          >
            Draw it on the day
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </>
      }
    >
      <div className="grid gap-3">
        <SelectField
          label="Van"
          value={vanId}
          choices={[
            ...problem.vans.map((van) => ({
              value: van.vanId,
              label: `${van.vanName} · ${van.groomerName}`,
            })),
            { value: '', label: 'No van: not placed' },
          ]}
          onChange={(event) => {
            const to = event.target.value;
            setMove(
              to
                ? cheapestPlace(problem, plan, times, visitId, to)
                : { kind: 'unplaceVisit', visitId },
            );
          }}
        />
        {move.kind === 'placeVisit' && (
          <SelectField
            label="Place"
            value={String(move.index)}
            choices={Array.from({ length: others.length - least + 1 }, (_, at) => at + least).map(
              (index) => ({
                value: String(index),
                label: index === 0 ? 'First' : `After ${nameOf(others[index - 1]!)}`,
              }),
            )}
            onChange={(event) => setMove({ ...move, index: Number(event.target.value) })}
          />
        )}
      </div>
      <div className="mt-3 min-h-24" aria-live="polite">
        {trial.refusedBecause ? (
          <p>{trial.refusedBecause}</p>
        ) : trial.moved ? (
          <dl className="rows text-[15px]">
            {rows.map((row) => (
              <div key={row.key} className="flex justify-between gap-4 py-1.5">
                <dt className="text-slate">{row.label}</dt>
                <dd
                  className={`text-right font-semibold ${row.tone === 'bad' ? 'text-rosette' : row.tone === 'plain' ? '' : 'text-collar'}`}
                >
                  {row.tone === 'bad' && '▲ '}
                  {row.value}
                </dd>
              </div>
            ))}
          </dl>
        ) : (
          <p className="text-slate">It is there now.</p>
        )}
      </div>
    </Dialog>
  );
}

/** The place on a van that costs the day least: where the list begins. */
function cheapestPlace(
  problem: DayProblem,
  plan: Plan,
  times: DayTimes,
  visitId: string,
  vanId: string,
): Move {
  const others = otherVisits(plan, vanId, visitId);
  const least = begunBefore(problem, others);
  let best: Move = { kind: 'placeVisit', visitId, vanId, index: others.length };
  let bestCost = Infinity;
  for (let index = least; index <= others.length; index += 1) {
    const move: Move = { kind: 'placeVisit', visitId, vanId, index };
    const trial = tryMove(problem, plan, times, move);
    const cost = trial.times.totalCost + (trial.times.feasible ? 0 : 1e9);
    if (trial.refusedBecause || cost >= bestCost) continue;
    best = move;
    bestCost = cost;
  }
  return best;
}
