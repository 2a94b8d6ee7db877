import type { Day } from '#shared/api/days.ts';
import type { DayTimes, Move } from '#shared/schedule/types.ts';
import { usePinVisit } from '#src/api/days.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { writeCount } from '#src/lib/words.ts';
import { AddVisitDialog } from './AddVisitDialog.tsx';
import { MoveDialog } from './MoveDialog.tsx';
import { placeOf } from './moveWords.ts';
import { SendDialog } from './SendDialog.tsx';
import { VisitDialog } from './VisitDialog.tsx';

export type OpenDialog =
  | { kind: 'visit'; visitId: string }
  | { kind: 'move'; visitId: string }
  | { kind: 'send' }
  | { kind: 'add' }
  | null;

/** Whichever dialog of the board is open. */
export function DayDialogs({
  day,
  dialog,
  base,
  shown,
  can,
  stays,
  onDialog,
  onDay,
  onDrawMove,
  readAgain,
}: {
  day: Day;
  dialog: OpenDialog;
  /** Times of the day as it is; `shown`: as it is drawn. */
  base: DayTimes;
  shown: DayTimes;
  can: { move: boolean; edit: boolean };
  stays: (visitId: string) => string | null;
  onDialog: (dialog: OpenDialog) => void;
  onDay: (day: Day) => void;
  onDrawMove: (visitId: string, move: Move) => void;
  readAgain: () => Promise<unknown>;
}) {
  const { business } = useSession();
  const pin = usePinVisit();
  const close = () => onDialog(null);
  if (!dialog) return null;
  if (dialog.kind === 'add') return <AddVisitDialog date={day.date} onClose={close} />;
  if (dialog.kind === 'send')
    return (
      <SendDialog
        day={day}
        onDay={onDay}
        onClose={close}
        onSent={(next, count) => {
          onDay(next);
          close();
          toast(`Sent to ${writeCount(count, 'van')}.`);
        }}
      />
    );
  const { visitId } = dialog;
  const fact = day.problem.visits.find((visit) => visit.id === visitId);
  const card = day.visits.find((one) => one.id === visitId);
  if (!fact || !card) return null;
  if (dialog.kind === 'move')
    return (
      <MoveDialog
        problem={day.problem}
        plan={day.plan}
        times={base}
        visitId={visitId}
        unit={business.weightUnit}
        onPropose={(move) => onDrawMove(visitId, move)}
        onClose={close}
      />
    );
  const run = shown.runs.find((one) => one.stops.some((stop) => stop.stopId === visitId));
  const home = placeOf(day.plan, visitId);
  const van = day.problem.vans.find((one) => one.vanId === run?.vanId);
  const pinnedTo = fact.pin?.vanId;
  return (
    <VisitDialog
      problem={day.problem}
      fact={fact}
      card={card}
      stop={run?.stops.find((one) => one.stopId === visitId) ?? null}
      vanName={van?.vanName ?? null}
      pinned={pinnedTo !== undefined && pinnedTo === van?.vanId}
      unit={business.weightUnit}
      canMove={can.move}
      canEdit={can.edit}
      stays={stays(visitId)}
      pinning={pin.isPending}
      onMove={() => onDialog({ kind: 'move', visitId })}
      onPin={(wanted) =>
        pin.mutate(
          {
            params: { date: day.date, visitId },
            body: { vanId: wanted ? (home?.vanId ?? null) : null },
          },
          { onSuccess: onDay, onError: (error) => toast(errorWords(error), 'bad') },
        )
      }
      onClose={close}
      onCancelled={() => {
        close();
        toast(`${fact.label} is cancelled.`);
        void readAgain();
      }}
    />
  );
}
