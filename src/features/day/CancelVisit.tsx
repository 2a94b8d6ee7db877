import { useState } from 'react';
import type { VisitCard } from '#shared/api/visits.ts';
import { useCancelVisit } from '#src/api/visits.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { TextField } from '#src/components/TextField.tsx';

/** Cancels a visit, with a reason that stays with it. */
export function CancelVisit({
  card,
  label,
  onBack,
  onCancelled,
}: {
  card: VisitCard;
  label: string;
  onBack: () => void;
  onCancelled: () => void;
}) {
  const [reason, setReason] = useState('');
  const [tried, setTried] = useState(false);
  const cancel = useCancelVisit();
  return (
    <Dialog
      title={`Cancel ${label}?`}
      onClose={onBack}
      actions={
        <>
          <Button
            kind="danger"
            busy={cancel.isPending}
            onClick={() => {
              setTried(true);
              if (reason.trim() === '') return;
              cancel.mutate(
                { params: { visitId: card.id }, body: { reason: reason.trim() } },
                { onSuccess: onCancelled },
              );
            }}
          >
            Cancel the visit
          </Button>
          <Button onClick={onBack}>Keep it</Button>
        </>
      }
    >
      <p className="text-slate">
        {card.householdName} loses this appointment. Nobody is told by itself: call or text them.
      </p>
      <TextField
        label="Why"
        className="mt-3"
        value={reason}
        maxLength={200}
        placeholder="household is away"
        error={tried && reason.trim() === '' ? 'Say why; it stays with the visit' : undefined}
        onChange={(event) => setReason(event.target.value)}
      />
      {cancel.error && <ErrorNote error={cancel.error} className="mt-3" />}
    </Dialog>
  );
}
