import { useState } from 'react';
import { Link } from 'react-router-dom';
import { requestPasswordReset } from '#shared/api/session.ts';
import { useRequestPasswordReset } from '#src/api/session.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';

/** Asks for a letter with a link. It never says whether the address is known. */
export function ForgottenScreen() {
  const request = useRequestPasswordReset();
  const [sentTo, setSentTo] = useState<string | null>(null);
  const form = useZodForm(requestPasswordReset.body, { email: '' });
  const submit = useSubmit(form, async (body) => {
    await request.mutateAsync({ body });
    setSentTo(body.email);
  });
  if (sentTo)
    return (
      <>
        <PageHeader title="Look for a letter" />
        <Card>
          <p>
            If {sentTo} signs in to Furlong, a letter with a link is on its way. The link works once
            and ends after a while.
          </p>
          <p className="mt-2 text-slate">
            Nothing after ten minutes? Look among the junk, then ask again.
          </p>
        </Card>
        <p className="mt-5">
          <Link to="/sign-in" className="text-link inline-flex min-h-11 items-center">
            Back to the sign-in
          </Link>
        </p>
      </>
    );
  return (
    <>
      <PageHeader title="Set a new password" dim="We send you a letter with a link." />
      <Card>
        <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
          <TextField
            label="E-mail"
            type="email"
            autoComplete="username"
            {...form.register('email')}
            error={form.formState.errors.email?.message}
          />
          <FormErrors error={submit.failure} fields={submit.strayFields} />
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Sending the letter">
            Send the letter
          </Button>
        </form>
      </Card>
      <p className="mt-5">
        <Link to="/sign-in" className="text-link inline-flex min-h-11 items-center">
          Back to the sign-in
        </Link>
      </p>
    </>
  );
}
