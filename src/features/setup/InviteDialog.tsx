import type { Groomer } from '#shared/api/groomers.ts';
import { inviteMember } from '#shared/api/members.ts';
import { useInviteMember } from '#src/api/members.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { RoleFields } from './RoleFields.tsx';

export function InviteDialog({
  groomers,
  onClose,
}: {
  groomers: readonly Groomer[];
  onClose: () => void;
}) {
  const invite = useInviteMember();
  const form = useZodForm(inviteMember.body, { email: '', roles: [], groomerId: null });
  const submit = useSubmit(form, async (body) => {
    const groomerId = body.roles.includes('groomer') ? body.groomerId : null;
    await invite.mutateAsync({ body: { ...body, groomerId } });
    toast(`A letter is on its way to ${body.email}.`);
    onClose();
  });
  return (
    <Dialog title="Invite someone" onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <TextField
          label="E-mail"
          type="email"
          hint="The letter carries a link that works once."
          {...form.register('email')}
          error={form.formState.errors.email?.message}
        />
        <RoleFields
          control={form.control}
          isGroomer={form.watch('roles').includes('groomer')}
          groomers={groomers.filter((groomer) => groomer.userId === null)}
          groomerField={form.register('groomerId', { setValueAs: emptyToNull })}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Sending the letter">
            Send the invitation
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}
