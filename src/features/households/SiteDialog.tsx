import { useState } from 'react';
import { createSite, type Site } from '#shared/api/households.ts';
import { useCreateSite, useUpdateSite } from '#src/api/households.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { useWhere } from '#src/api/useWhere.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { WhereEntry } from '#src/components/WhereEntry.tsx';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { PinMap } from '#src/map/PinMap.tsx';
import { GateCodeField } from './GateCodeField.tsx';

/** A place several households share, new (`site` null, beginning at `spot`) or to be changed. */
export function SiteDialog({
  site = null,
  spot = null,
  onSaved,
  onClose,
}: {
  site?: Site | null;
  spot?: { lat: number; lon: number } | null;
  onSaved: (site: Site) => void;
  onClose: () => void;
}) {
  const { business } = useSession();
  const create = useCreateSite();
  const update = useUpdateSite();
  const [address, setAddress] = useState('');
  // undefined leaves the code as it is, null clears it.
  const [gateCode, setGateCode] = useState<string | null | undefined>(undefined);
  const start = site ?? spot;
  const form = useZodForm(createSite.body, {
    name: site?.name ?? '',
    lat: start?.lat ?? (null as unknown as number),
    lon: start?.lon ?? (null as unknown as number),
    parkingNotes: site?.parkingNotes ?? '',
    gateCode: null,
  });
  const submit = useSubmit(form, async ({ gateCode: _unused, ...fields }) => {
    const saved = site
      ? await update.mutateAsync({ params: { siteId: site.id }, body: { ...fields, gateCode } })
      : await create.mutateAsync({ body: { ...fields, gateCode: gateCode ?? null } });
    toast(site ? `${saved.name} is saved.` : `${saved.name} is added.`);
    onSaved(saved);
  });
  const { errors } = form.formState;
  const [lat, lon] = form.watch(['lat', 'lon']);
  const where = useWhere({ addressLabel: address, lat, lon }, (next) => {
    setAddress(next.addressLabel);
    form.setValue('lat', next.lat as number, { shouldDirty: true });
    form.setValue('lon', next.lon as number, { shouldDirty: true });
    if (next.lat !== null) form.clearErrors(['lat', 'lon']);
  });
  return (
    <Dialog title={site ? `Change ${site.name}` : 'Add a site'} onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <TextField
          label="Name"
          hint="The block or community: “Harbour Court”."
          {...form.register('name')}
          error={errors.name?.message}
        />
        <WhereEntry
          label="Where its gate or parking is"
          hint={
            site
              ? 'Stays where it is unless you pick another address or move the pin.'
              : spot
                ? 'Begins at the household’s own spot.'
                : undefined
          }
          {...where}
          spot={lat === null ? null : { lat, lon }}
          error={
            errors.lat || errors.lon ? 'Pick an address from the list, or drop a pin.' : undefined
          }
          map={() => <PinMap area={business} lat={lat} lon={lon} onPin={where.onPin} />}
        />
        <TextArea
          label="Parking"
          required={false}
          hint="Van hours, height limit, guard list."
          {...form.register('parkingNotes')}
          error={errors.parkingNotes?.message}
        />
        <GateCodeField
          hasCode={site?.hasGateCode ?? false}
          value={gateCode}
          onChange={setGateCode}
          error={errors.gateCode?.message}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {site ? 'Save the site' : 'Add the site'}
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}
