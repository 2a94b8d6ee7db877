import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { createHousehold, type Household, type Site } from '#shared/api/households.ts';
import { householdQueries } from '#src/api/households.ts';
import { useWhere, type Where } from '#src/api/useWhere.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { CheckboxField } from '#src/components/CheckboxField.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { UnsavedGuard } from '#src/components/UnsavedGuard.tsx';
import { PinMap } from '#src/map/PinMap.tsx';
import { useSession } from '#src/api/sessionStore.ts';
import { WhereEntry } from '#src/components/WhereEntry.tsx';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { GateCodeField } from './GateCodeField.tsx';
import { householdStart } from './householdStart.ts';
import { SiteDialog } from './SiteDialog.tsx';

export type HouseholdFields = z.output<typeof createHousehold.body>;

/** Who opens the door, where the van parks, what to know at the kerb. */
export function HouseholdForm({
  household,
  where: startWhere = null,
  onSave,
  saveWords,
}: {
  household: Household | null;
  /** Where a new one is, when that was told before. */
  where?: Where | null;
  onSave: (fields: HouseholdFields) => Promise<void>;
  saveWords: string;
}) {
  const { business } = useSession();
  const form = useZodForm(createHousehold.body, householdStart(household, startWhere));
  const submit = useSubmit(form, onSave);
  const sites = useQuery(householdQueries.sites());
  const [makingSite, setMakingSite] = useState(false);
  const { errors, isDirty } = form.formState;
  const [addressLabel, lat, lon, phone, siteId] = form.watch([
    'addressLabel',
    'lat',
    'lon',
    'phone',
    'siteId',
  ]);
  const where = useWhere({ addressLabel, lat, lon }, (next) => {
    form.setValue('addressLabel', next.addressLabel, { shouldDirty: true });
    form.setValue('lat', next.lat as number, { shouldDirty: true });
    form.setValue('lon', next.lon as number, { shouldDirty: true });
    if (next.lat !== null) form.clearErrors(['lat', 'lon', 'addressLabel']);
  });
  const takeSite = (site: Site) => {
    form.setValue('siteId', site.id, { shouldDirty: true });
    setMakingSite(false);
  };
  return (
    <>
      <form onSubmit={submit.onSubmit} noValidate className="grid max-w-3xl gap-4">
        <Card title="Who">
          <div className="grid gap-4 md:grid-cols-2">
            <TextField
              label="Household"
              hint="As you say it: “Adeyemi”, “Okafor, Quarry Rise”."
              {...form.register('name')}
              error={errors.name?.message}
            />
            <TextField
              label="Who opens the door"
              {...form.register('contactName')}
              error={errors.contactName?.message}
            />
            <div>
              <TextField
                label="Phone"
                type="tel"
                required={false}
                hint="With + and the country code: +14155552671."
                {...form.register('phone', { setValueAs: emptyToNull })}
                error={errors.phone?.message}
              />
              <CheckboxField
                label="Agreed to get texts"
                hint={
                  phone
                    ? 'Tick only when they said so. Without it nothing is sent.'
                    : 'Needs a phone first.'
                }
                disabled={!phone}
                {...form.register('textsConsent')}
                error={errors.textsConsent?.message}
              />
            </div>
            <div className="grid content-start gap-4">
              <TextField
                label="Second contact"
                required={false}
                {...form.register('secondContactName')}
                error={errors.secondContactName?.message}
              />
              <TextField
                label="Their phone"
                type="tel"
                required={false}
                {...form.register('secondContactPhone', { setValueAs: emptyToNull })}
                error={errors.secondContactPhone?.message}
              />
            </div>
          </div>
        </Card>
        <Card title="Where the van parks">
          <div className="grid gap-4">
            <WhereEntry
              label="Address"
              {...where}
              spot={lat === null ? null : { lat, lon }}
              error={
                errors.addressLabel?.message ??
                (errors.lat || errors.lon
                  ? 'Pick an address from the list, or drop a pin.'
                  : undefined)
              }
              map={() => <PinMap area={business} lat={lat} lon={lon} onPin={where.onPin} />}
            />
            <div className="grid items-end gap-3 md:grid-cols-[1fr_auto]">
              <SelectField
                label="Site"
                required={false}
                empty="On its own"
                choices={(sites.data ?? []).map((site) => ({ value: site.id, label: site.name }))}
                {...form.register('siteId', { setValueAs: emptyToNull })}
                // The sites arrive after the form: without this the choice would read empty.
                value={siteId ?? ''}
                error={errors.siteId?.message}
              />
              <Button onClick={() => setMakingSite(true)}>Add a site</Button>
            </div>
            <p className="-mt-2 text-sm text-slate">
              A site is one gate, one parking and one set-up for several households.
            </p>
          </div>
        </Card>
        <Card title="At the door">
          <div className="grid gap-4">
            <TextArea
              label="Access"
              required={false}
              hint="Drive, tap, low branches, bell. The groomer reads it at the kerb."
              {...form.register('accessNotes')}
              error={errors.accessNotes?.message}
            />
            <TextArea
              label="Handing over"
              required={false}
              hint="Who hands over and receives; may the pet go back to an empty house?"
              {...form.register('handoverNotes')}
              error={errors.handoverNotes?.message}
            />
            <GateCodeField
              hasCode={household?.hasGateCode ?? false}
              value={form.watch('gateCode')}
              onChange={(gateCode) => form.setValue('gateCode', gateCode, { shouldDirty: true })}
              error={errors.gateCode?.message}
            />
          </div>
        </Card>
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div>
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {saveWords}
          </Button>
        </div>
        <UnsavedGuard when={isDirty} />
      </form>
      {makingSite && (
        <SiteDialog
          spot={lat === null ? null : { lat, lon }}
          onSaved={takeSite}
          onClose={() => setMakingSite(false)}
        />
      )}
    </>
  );
}
