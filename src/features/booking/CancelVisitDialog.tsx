import { cancelVisit } from '#shared/api/visits.ts';
import { useCancelVisit } from '#src/api/visits.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { writeDate } from '#src/lib/words.ts';

export function CancelVisitDialog({
  visitId,
  date,
  householdName,
  onClose,
}: {
  visitId: string;
  date: string;
  householdName: string;
  onClose: () => void;
}) {
  const cancel = useCancelVisit();
  const form = useZodForm(cancelVisit.body, { reason: '' });
  const submit = useSubmit(form, async (body) => {
    await cancel.mutateAsync({ params: { visitId }, body });
    toast(`The visit on ${writeDate(date)} is cancelled.`);
    onClose();
  });
  return (
    <Dialog title={`Cancel ${householdName} on ${writeDate(date)}?`} onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <p className="text-slate">
          The visit leaves the day. Tell the household yourself: no text goes out for it.
        </p>
        <TextField
          label="Why"
          hint="“Household asked by phone.”"
          {...form.register('reason')}
          error={form.formState.errors.reason?.message}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="danger" busy={submit.busy} busyWords="Cancelling">
            Cancel the visit
          </Button>
          <Button onClick={onClose}>Keep the visit</Button>
        </div>
      </form>
    </Dialog>
  );
}
