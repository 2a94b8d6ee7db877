import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams } from 'react-router-dom';
import { acceptInvitation } from '#shared/api/members.ts';
import { memberQueries } from '#src/api/members.ts';
import { useAcceptInvitation } from '#src/api/session.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { writeList } from '#src/lib/words.ts';

/** Where the link of an invitation letter leads. */
export function InvitationScreen() {
  const token = useParams().token!;
  const invitation = useQuery(memberQueries.invitation(token));
  if (invitation.isPending) return <Loading words="Opening the invitation" />;
  if (invitation.isError)
    return (
      <>
        <PageHeader title="This invitation does not open" />
        <ErrorNote error={invitation.error} onRetry={() => invitation.refetch()} />
        <p className="mt-4 text-slate">
          If it was used already, sign in. Else ask whoever invited you for a new letter.
        </p>
        <Link to="/sign-in" className="text-link inline-flex min-h-11 items-center">
          Sign in
        </Link>
      </>
    );
  const { businessName, email, roles, knownPerson } = invitation.data;
  return (
    <>
      <PageHeader
        title={`Join ${businessName}`}
        dim={`As ${writeList(roles)}, signing in with ${email}.`}
      />
      <JoinForm token={token} email={email} knownPerson={knownPerson} />
    </>
  );
}

function JoinForm(about: { token: string; email: string; knownPerson: boolean }) {
  const navigate = useNavigate();
  const accept = useAcceptInvitation();
  // A known person gives no name, and an empty one would be refused.
  const schema = about.knownPerson
    ? acceptInvitation.body.omit({ name: true })
    : acceptInvitation.body.required({ name: true });
  const form = useZodForm<{ name?: string; password: string }, { name?: string; password: string }>(
    schema,
    about.knownPerson ? { password: '' } : { name: '', password: '' },
  );
  const submit = useSubmit(form, async (body) => {
    await accept.mutateAsync({ params: { token: about.token }, body });
    navigate('/', { replace: true });
  });
  const { errors } = form.formState;
  return (
    <Card>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <input type="email" autoComplete="username" value={about.email} readOnly hidden />
        {!about.knownPerson && (
          <TextField
            label="Your name"
            autoComplete="name"
            {...form.register('name')}
            error={errors.name?.message}
          />
        )}
        <TextField
          label={about.knownPerson ? 'Your present password' : 'Choose a password'}
          type="password"
          autoComplete={about.knownPerson ? 'current-password' : 'new-password'}
          hint={
            about.knownPerson
              ? 'You have a sign-in already; it opens this business too.'
              : '10 letters or more. Three unrelated words do well.'
          }
          {...form.register('password')}
          error={errors.password?.message}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <Button type="submit" kind="go" busy={submit.busy} busyWords="Joining">
          Join the business
        </Button>
      </form>
    </Card>
  );
}
