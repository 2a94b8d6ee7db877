import type { QueuedEvent } from '#src/offline/PhoneStore.ts';
import { Button } from '#src/components/Button.tsx';

/** Taps the server will never take, with its reason: told, never silent. */
export function UnsentNotes({
  refused,
  onDismiss,
}: {
  refused: readonly QueuedEvent[];
  onDismiss: (id: string) => void;
}) {
  return refused.map(({ event, refusedWhy }) => (
    <div
      key={event.id}
      role="alert"
      className="mb-3 rounded-card border border-rosette bg-rosette-soft px-4 py-3"
    >
      <p>
        <b>▲ ‘{kindWords[event.kind]}’ was not taken.</b> {refusedWhy} Tell the desk what happened.
      </p>
      <Button className="mt-2 min-h-12" onClick={() => onDismiss(event.id)}>
        I told them
      </Button>
    </div>
  ));
}

const kindWords: Record<QueuedEvent['event']['kind'], string> = {
  startDriving: 'Start driving',
  arrived: 'Arrived',
  petOnTable: 'Pet on the table',
  stepDone: 'Section done',
  petDone: 'Pet done',
  stopDone: 'Done here',
  cannotDo: "Can't do it",
};
