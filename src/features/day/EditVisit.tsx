import { useState } from 'react';
import type { VisitCard } from '#shared/api/visits.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { useUpdateVisit } from '#src/api/visits.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { TimeField } from '#src/components/TimeField.tsx';

/** Changes what the household was promised, and the note. A new promise never erases the old one. */
export function EditVisit({
  card,
  onBack,
  onClose,
}: {
  card: VisitCard;
  onBack: () => void;
  onClose: () => void;
}) {
  const [from, setFrom] = useState<number | null>(card.promise?.startMinutes ?? null);
  const [to, setTo] = useState<number | null>(card.promise?.endMinutes ?? null);
  const [note, setNote] = useState(card.note);
  const [tried, setTried] = useState(false);
  const update = useUpdateVisit();
  const wrong = wrongWindow(from, to);
  const fields = update.error instanceof ApiError ? update.error.fields : {};
  const save = () => {
    setTried(true);
    if (wrong.from || wrong.to) return;
    const promise = from === null || to === null ? null : { startMinutes: from, endMinutes: to };
    update.mutate({ params: { visitId: card.id }, body: { promise, note } }, { onSuccess: onBack });
  };
  return (
    <Dialog
      title="Promise and note"
      onClose={onClose}
      actions={
        <>
          <Button kind="go" busy={update.isPending} busyWords="Saving" onClick={save}>
            Save
          </Button>
          <Button onClick={onBack}>Leave as it was</Button>
        </>
      }
    >
      <div className="grid grid-cols-2 gap-3">
        <TimeField
          label="Promised from"
          value={from}
          onChange={setFrom}
          error={tried ? wrong.from : undefined}
        />
        <TimeField
          label="until"
          value={to}
          onChange={setTo}
          error={(tried ? wrong.to : undefined) ?? fields['promise.endMinutes']}
        />
      </div>
      <p className="mt-1 text-sm text-slate">
        Both empty: nothing is promised. The household is told only when you tell them.
      </p>
      <TextArea
        label="Note for the groomer"
        className="mt-3"
        rows={4}
        value={note}
        maxLength={2000}
        onChange={(event) => setNote(event.target.value)}
      />
      {update.error && <ErrorNote error={update.error} className="mt-3" />}
    </Dialog>
  );
}

/** What is wrong with a typed window, by field. */
export function wrongWindow(
  from: number | null,
  to: number | null,
): { from?: string; to?: string } {
  if (Number.isNaN(from)) return { from: 'Write a time like 9:30' };
  if (Number.isNaN(to)) return { to: 'Write a time like 11:30' };
  if (from === null && to !== null) return { from: 'Write when it begins' };
  if (from !== null && to === null) return { to: 'Write when it ends' };
  if (from !== null && to !== null && to <= from) return { to: 'Must be after the start' };
  return {};
}
