import { createSite, type Site } from '#shared/api/households.ts';
import { useCreateSite } from '#src/api/households.ts';
import { useWhere } from '#src/api/useWhere.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { PinMap } from '#src/map/PinMap.tsx';
import { useSession } from '#src/api/sessionStore.ts';
import { WhereEntry } from '#src/components/WhereEntry.tsx';
import { toast } from '#src/components/toast.ts';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { useState } from 'react';

/** A place several households share; it begins at the spot of the household being written. */
export function SiteDialog({
  spot,
  onMade,
  onClose,
}: {
  spot: { lat: number; lon: number } | null;
  onMade: (site: Site) => void;
  onClose: () => void;
}) {
  const { business } = useSession();
  const create = useCreateSite();
  const [address, setAddress] = useState('');
  const form = useZodForm(createSite.body, {
    name: '',
    lat: spot?.lat ?? (null as unknown as number),
    lon: spot?.lon ?? (null as unknown as number),
    parkingNotes: '',
    gateCode: null,
  });
  const submit = useSubmit(form, async (body) => {
    const site = await create.mutateAsync({ body });
    toast(`${site.name} is added.`);
    onMade(site);
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
    <Dialog title="Add a site" onClose={onClose}>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <TextField
          label="Name"
          hint="The block or community: “Harbour Court”."
          {...form.register('name')}
          error={errors.name?.message}
        />
        <WhereEntry
          label="Where its gate or parking is"
          hint={spot ? 'Begins at the household’s own spot.' : undefined}
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
        <TextField
          label="Gate code"
          required={false}
          autoComplete="off"
          {...form.register('gateCode', { setValueAs: emptyToNull })}
          error={errors.gateCode?.message}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Adding">
            Add the site
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}
