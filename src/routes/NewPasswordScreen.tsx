import { Link, useNavigate, useParams } from 'react-router-dom';
import { resetPassword } from '#shared/api/session.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { useResetPassword } from '#src/api/session.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';

/** Where the link of the reset letter leads. */
export function NewPasswordScreen() {
  const token = useParams().token!;
  const navigate = useNavigate();
  const reset = useResetPassword();
  const form = useZodForm(resetPassword.body, { password: '' });
  const submit = useSubmit(form, async (body) => {
    await reset.mutateAsync({ params: { token }, body });
    toast('The new password is set. Sign in with it.');
    navigate('/sign-in', { replace: true });
  });
  const usedUp =
    submit.failure instanceof ApiError && ['linkUsedUp', 'notFound'].includes(submit.failure.code);
  return (
    <>
      <PageHeader title="Choose a new password" dim="Every other sign-in of yours ends." />
      <Card>
        <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
          <TextField
            label="New password"
            type="password"
            autoComplete="new-password"
            hint="10 letters or more. Three unrelated words do well."
            {...form.register('password')}
            error={form.formState.errors.password?.message}
          />
          <FormErrors error={submit.failure} fields={submit.strayFields} />
          {usedUp && (
            <Link to="/reset" className="text-link">
              Ask for another letter
            </Link>
          )}
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Setting the password">
            Set the password
          </Button>
        </form>
      </Card>
    </>
  );
}
