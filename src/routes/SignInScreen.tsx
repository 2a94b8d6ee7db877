import { Link, Navigate, useNavigate, useSearchParams } from 'react-router-dom';
import { signIn } from '#shared/api/session.ts';
import { useSignIn } from '#src/api/session.ts';
import { useMaybeSession } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { safePlace } from '#src/lib/safePlace.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';

/** The door. `?to=` keeps the place a person was at. */
export function SignInScreen() {
  const session = useMaybeSession();
  const navigate = useNavigate();
  const place = safePlace(useSearchParams()[0].get('to'));
  const enter = useSignIn();
  const form = useZodForm(signIn.body, { email: '', password: '' });
  const submit = useSubmit(form, async (body) => {
    await enter.mutateAsync({ body });
    navigate(place, { replace: true });
  });
  if (session) return <Navigate to={place} replace />;
  const { errors } = form.formState;
  return (
    <>
      <PageHeader
        title="Sign in"
        dim={place === '/' ? undefined : 'You come back to where you were.'}
      />
      <Card>
        <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
          <TextField
            label="E-mail"
            type="email"
            autoComplete="username"
            {...form.register('email')}
            error={errors.email?.message}
          />
          <TextField
            label="Password"
            type="password"
            autoComplete="current-password"
            {...form.register('password')}
            error={errors.password?.message}
          />
          <FormErrors error={submit.failure} fields={submit.strayFields} />
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Signing in">
            Sign in
          </Button>
        </form>
      </Card>
      <p className="mt-5 flex flex-wrap gap-x-5">
        <Link to="/reset" className="text-link inline-flex min-h-11 items-center">
          Set a new password
        </Link>
        <Link to="/sign-up" className="text-link inline-flex min-h-11 items-center">
          Start a business on Furlong
        </Link>
      </p>
    </>
  );
}
