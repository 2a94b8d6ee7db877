import { useQuery } from '@tanstack/react-query';
import { updateBusiness, type Business } from '#shared/api/business.ts';
import { businessQueries, useUpdateBusiness } from '#src/api/business.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { FormNumber } from '#src/components/FormNumber.tsx';
import { FormSegmented } from '#src/components/FormSegmented.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { UnsavedGuard } from '#src/components/UnsavedGuard.tsx';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { listCurrencies, listTimeZones } from '#src/lib/zones.ts';
import { ReadOnlyNote } from './ReadOnlyNote.tsx';

/** Name, zone, money, measures, phones, and the minutes every stop starts and ends with. */
export function BusinessPanel() {
  const business = useQuery(businessQueries.one());
  if (business.isPending) return <Loading lines={6} />;
  if (business.isError)
    return <ErrorNote error={business.error} onRetry={() => business.refetch()} />;
  return <BusinessForm business={business.data} />;
}

/** Money is stored in hundredths of the currency. */
const hundredths = {
  show: (cents: number) => cents / 100,
  store: (amount: number) => Math.round(amount * 100),
};

const schema = updateBusiness.body.omit({ areaName: true }).required();

function BusinessForm({ business }: { business: Business }) {
  const mayEdit = useCan('business.edit');
  const update = useUpdateBusiness();
  const { areaName: _, ...editable } = business;
  const form = useZodForm(schema, editable);
  const submit = useSubmit(form, async (body) => {
    await update.mutateAsync({ body });
    form.reset(body);
    toast('The business is saved.');
  });
  const { errors, isDirty } = form.formState;
  return (
    <form onSubmit={submit.onSubmit} noValidate className="max-w-3xl">
      {!mayEdit && <ReadOnlyNote />}
      <fieldset disabled={!mayEdit} className="grid gap-4">
        <Card title="The business">
          <div className="grid gap-4 md:grid-cols-2">
            <TextField
              label="Name"
              hint="Households read it in every text."
              {...form.register('name')}
              error={errors.name?.message}
            />
            <SelectField
              label="Time zone"
              choices={listTimeZones(business.timeZone)}
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
              <FormSegmented
                control={form.control}
                name="distanceUnit"
                label="Distances"
                choices={[
                  { value: 'km', label: 'km' },
                  { value: 'mi', label: 'mi' },
                ]}
              />
              <FormSegmented
                control={form.control}
                name="weightUnit"
                label="Weights"
                choices={[
                  { value: 'kg', label: 'kg' },
                  { value: 'lb', label: 'lb' },
                ]}
              />
            </div>
          </div>
        </Card>
        <Card title="Phones">
          <div className="grid gap-4 md:grid-cols-2">
            <TextField
              label="Texts come from"
              type="tel"
              required={false}
              hint="The number at the carrier. Without it nothing is sent."
              {...form.register('senderPhone', { setValueAs: emptyToNull })}
              error={errors.senderPhone?.message}
            />
            <TextField
              label="Households call"
              type="tel"
              required={false}
              hint="The desk. Shown on the arrival page."
              {...form.register('deskPhone', { setValueAs: emptyToNull })}
              error={errors.deskPhone?.message}
            />
          </div>
        </Card>
        <Card title="At every stop">
          <div className="grid gap-4 md:grid-cols-2">
            <FormNumber
              control={form.control}
              name="setUpMinutes"
              label="Set up before the first pet"
              unit="min"
              hint="Park, level, power, water, knock."
            />
            <FormNumber
              control={form.control}
              name="cleanDownMinutes"
              label="Clean down after the last"
              unit="min"
              hint="Hand back, payment, sweep, unhook."
            />
          </div>
        </Card>
        <Card title="Prices" dim="for forecasts over the phone">
          <div className="grid gap-4 md:grid-cols-2">
            <FormNumber
              control={form.control}
              name="priceCentsPerHour"
              label="An hour on the pet"
              unit={form.watch('currency')}
              decimals={2}
              hint="0 until it is set: then no price is shown."
              shownAs={hundredths}
            />
            <FormNumber
              control={form.control}
              name="calloutCents"
              label="Call-out"
              unit={form.watch('currency')}
              decimals={2}
              hint="Once for every visit."
              shownAs={hundredths}
            />
          </div>
        </Card>
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        {mayEdit && (
          <div>
            <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
              Save the business
            </Button>
          </div>
        )}
      </fieldset>
      <UnsavedGuard when={isDirty} />
    </form>
  );
}
