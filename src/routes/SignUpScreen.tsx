import { useMemo, useState } from 'react';
import { Controller } from 'react-hook-form';
import { Link, Navigate, useNavigate } from 'react-router-dom';
import { signUp } from '#shared/api/session.ts';
import { useSignUp } from '#src/api/session.ts';
import { readSession } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { detectPlace, listCurrencies, listTimeZones } from '#src/lib/zones.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';

/** A new business and its operator. */
export function SignUpScreen() {
  // Only at the start: the sign-in this form brings goes on to the set-up.
  const [cameSignedIn] = useState(readSession() !== null);
  const navigate = useNavigate();
  const create = useSignUp();
  const here = useMemo(() => detectPlace(), []);
  const form = useZodForm(signUp.body, {
    name: '',
    email: '',
    password: '',
    businessName: '',
    timeZone: here.timeZone,
    currency: here.currency,
    distanceUnit: here.distanceUnit,
    weightUnit: here.weightUnit,
  });
  const submit = useSubmit(form, async (body) => {
    await create.mutateAsync({ body });
    navigate('/setup/business', { replace: true });
  });
  if (cameSignedIn) return <Navigate to="/" replace />;
  const { errors } = form.formState;
  return (
    <>
      <PageHeader
        title="Start a business"
        dim="You become its operator. Invite the others later."
      />
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <Card title="You">
          <div className="grid gap-4">
            <TextField
              label="Your name"
              autoComplete="name"
              {...form.register('name')}
              error={errors.name?.message}
            />
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
              autoComplete="new-password"
              hint="10 letters or more. Three unrelated words do well."
              {...form.register('password')}
              error={errors.password?.message}
            />
          </div>
        </Card>
        <Card title="The business">
          <div className="grid gap-4">
            <TextField
              label="Business name"
              autoComplete="organization"
              {...form.register('businessName')}
              error={errors.businessName?.message}
            />
            <SelectField
              label="Time zone"
              choices={listTimeZones(here.timeZone)}
              hint="Where the vans drive. All times are written in it."
              {...form.register('timeZone')}
              error={errors.timeZone?.message}
            />
            <SelectField
              label="Currency"
              choices={listCurrencies()}
              {...form.register('currency')}
              error={errors.currency?.message}
            />
            <div className="flex flex-wrap gap-x-8 gap-y-4">
              <Controller
                control={form.control}
                name="distanceUnit"
                render={({ field }) => (
                  <Segmented
                    label="Distances"
                    choices={[
                      { value: 'km', label: 'km' },
                      { value: 'mi', label: 'mi' },
                    ]}
                    value={field.value}
                    onChange={field.onChange}
                  />
                )}
              />
              <Controller
                control={form.control}
                name="weightUnit"
                render={({ field }) => (
                  <Segmented
                    label="Weights"
                    choices={[
                      { value: 'kg', label: 'kg' },
                      { value: 'lb', label: 'lb' },
                    ]}
                    value={field.value}
                    onChange={field.onChange}
                  />
                )}
              />
            </div>
          </div>
        </Card>
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <Button type="submit" kind="go" busy={submit.busy} busyWords="Starting the business">
          Start the business
        </Button>
      </form>
      <p className="mt-5">
        <Link to="/sign-in" className="text-link inline-flex min-h-11 items-center">
          Sign in to a business you have
        </Link>
      </p>
    </>
  );
}
