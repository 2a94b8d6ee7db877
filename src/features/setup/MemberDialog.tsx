import type { Groomer } from '#shared/api/groomers.ts';
import { updateMember, type Member } from '#shared/api/members.ts';
import { callApi } from '#src/api/callApi.ts';
import { useUpdateMember } from '#src/api/members.ts';
import { setSession, useSession } from '#src/api/sessionStore.ts';
import { getSession } from '#shared/api/session.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { toast } from '#src/components/toast.ts';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { RoleFields } from './RoleFields.tsx';

export function MemberDialog({
  member,
  groomers,
  onClose,
}: {
  member: Member;
  groomers: readonly Groomer[];
  onClose: () => void;
}) {
  const me = useSession().user.id;
  const update = useUpdateMember();
  const form = useZodForm(updateMember.body, { roles: member.roles, groomerId: member.groomerId });
  const submit = useSubmit(form, async ({ roles, groomerId = null }) => {
    await update.mutateAsync({
      params: { userId: member.userId },
      body: { roles, groomerId: roles.includes('groomer') ? groomerId : null },
    });
    // One's own roles decide what the page may show.
    if (member.userId === me) setSession(await callApi(getSession, {}));
    toast(`${member.name}'s roles are saved.`);
    onClose();
  });
  const free = groomers.filter(
    (groomer) => groomer.userId === null || groomer.userId === member.userId,
  );
  return (
    <Dialog title={`Roles of ${member.name}`} onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <RoleFields
          control={form.control}
          isGroomer={form.watch('roles').includes('groomer')}
          groomers={free}
          groomerField={form.register('groomerId', { setValueAs: emptyToNull })}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            Save the roles
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}
