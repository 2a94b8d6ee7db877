import type { PointerEvent } from 'react';
import type { VisitCard } from '#shared/api/visits.ts';
import type { NotPlacedReason } from '#shared/schedule/explainNotPlaced.ts';
import type { VanReason } from '#shared/schedule/vanReason.ts';
import type { DayProblem } from '#shared/schedule/types.ts';
import { formatWallRange } from '#shared/time/formatWall.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { writeWeight, type WeightUnit } from '#src/lib/measures.ts';
import { writeSpan } from '#src/lib/words.ts';
import { petWords } from '#src/strips/petWords.ts';

/** Visits on no van, why, and the smallest thing that would place each. Also a place to drop on. */
export function NotPlacedCard({
  problem,
  visitIds,
  cards,
  reasons,
  unit,
  past,
  canMove,
  dropping,
  onOpen,
  onTry,
  onPointerDown,
  onFindPlaces,
}: {
  problem: DayProblem;
  visitIds: readonly string[];
  cards: ReadonlyMap<string, VisitCard>;
  reasons: ReadonlyMap<string, NotPlacedReason>;
  unit: WeightUnit;
  past: boolean;
  canMove: boolean;
  /** A visit in hand is over this card. */
  dropping: boolean;
  onOpen: (visitId: string) => void;
  onTry: (visitId: string, vanId: string, index: number) => void;
  onPointerDown: (visitId: string, event: PointerEvent) => void;
  onFindPlaces: (() => void) | null;
}) {
  return (
    <div
      data-drop="notPlaced"
      className={`rounded-card ${dropping ? 'outline-2 outline-offset-2 outline-collar outline-dashed' : ''}`}
    >
      <Card
        title="Not placed"
        dim={`· ${visitIds.length}`}
        aside={
          onFindPlaces && visitIds.length > 0 ? (
            <Button kind="quiet" size="small" onClick={onFindPlaces}>
              Find places
            </Button>
          ) : undefined
        }
      >
        {visitIds.length === 0 && (
          <p className="text-slate">
            {problem.visits.length === 0
              ? 'No visit is booked on this day.'
              : `Every visit of the day is on a van.${canMove ? ' Drop one here to take it off.' : ''}`}
          </p>
        )}
        <ul className="rows">
          {visitIds.map((visitId) => (
            <NotPlacedRow
              key={visitId}
              problem={problem}
              visitId={visitId}
              card={cards.get(visitId)}
              reason={reasons.get(visitId)}
              unit={unit}
              past={past}
              canMove={canMove}
              onOpen={() => onOpen(visitId)}
              onTry={onTry}
              onPointerDown={(event) => onPointerDown(visitId, event)}
            />
          ))}
        </ul>
      </Card>
    </div>
  );
}

function NotPlacedRow({
  problem,
  visitId,
  card,
  reason,
  unit,
  past,
  canMove,
  onOpen,
  onTry,
  onPointerDown,
}: {
  problem: DayProblem;
  visitId: string;
  card: VisitCard | undefined;
  reason: NotPlacedReason | undefined;
  unit: WeightUnit;
  past: boolean;
  canMove: boolean;
  onOpen: () => void;
  onTry: (visitId: string, vanId: string, index: number) => void;
  onPointerDown: (event: PointerEvent) => void;
}) {
  const fact = problem.visits.find((visit) => visit.id === visitId);
  const place = reason ? placeToTry(reason) : null;
  const van = problem.vans.find((one) => one.vanId === place?.vanId);
  if (!fact) return null;
  const about = [
    card ? petWords(card.pets) : '',
    card?.pets.length === 1 ? writeWeight(card.pets[0]!.weightGrams, unit) : '',
    writeSpan(fact.work.meanSeconds),
    fact.promise
      ? `promised ${formatWallRange(problem, fact.promise.startSeconds, fact.promise.endSeconds)}`
      : '',
  ].filter((words) => words !== '');
  return (
    <li
      className={`flex items-start justify-between gap-3 py-2.5 ${canMove ? 'cursor-grab' : ''}`}
      onPointerDown={(event) => {
        if (!(event.target as Element).closest('[data-still]')) onPointerDown(event);
      }}
    >
      <div className="min-w-0 select-none">
        <button
          type="button"
          onClick={onOpen}
          className="text-left font-semibold underline decoration-fawn underline-offset-3 hover:decoration-collar"
        >
          {fact.label}
        </button>{' '}
        <span className="text-slate">{about.join(' · ')}</span>
        <p className="text-[14.5px] text-slate first-letter:uppercase">
          {past
            ? 'was on no van'
            : reason
              ? whyWords(reason, van?.vanName)
              : 'Looking for places …'}
        </p>
      </div>
      {canMove && place && van && (
        <span data-still>
          <Button
            size="small"
            className="whitespace-nowrap"
            onClick={() => onTry(visitId, place.vanId, place.index)}
            title={`Draws it on ${van.vanName}; nothing is kept yet`}
          >
            Try {van.vanName}
          </Button>
        </span>
      )}
    </li>
  );
}

/** No rule keeps it off a van, yet others' promises may: the trial shows them. */
function whyWords(reason: NotPlacedReason, vanName: string | undefined): string {
  return reason.smallest?.rule === 'fits' && vanName
    ? `Nothing forbids ${vanName}: try it to see what it changes.`
    : reason.words;
}

/** The place the smallest relaxation names, else the van where least stands in the way. */
function placeToTry(reason: NotPlacedReason): { vanId: string; index: number } | null {
  const placed = reason.vans.filter(
    (van): van is VanReason & { index: number } => van.index !== null,
  );
  const smallest = placed.find((van) => van.vanId === reason.smallest?.vanId);
  const best =
    smallest ?? placed.sort((a, b) => a.otherRules - b.otherRules || a.addedCost - b.addedCost)[0];
  return best ? { vanId: best.vanId, index: best.index } : null;
}
