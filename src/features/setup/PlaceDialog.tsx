import { createPlace, type Place } from '#shared/api/places.ts';
import { useCreatePlace, useUpdatePlace } from '#src/api/places.ts';
import { useWhere } from '#src/api/useWhere.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { FormNumber } from '#src/components/FormNumber.tsx';
import { FormTime } from '#src/components/FormTime.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { PinMap } from '#src/map/PinMap.tsx';
import { useSession } from '#src/api/sessionStore.ts';
import { WhereEntry } from '#src/components/WhereEntry.tsx';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { isRefill, placeKinds } from './placeKinds.ts';

export function PlaceDialog({ place, onClose }: { place: Place | null; onClose: () => void }) {
  const { business } = useSession();
  const create = useCreatePlace();
  const update = useUpdatePlace();
  const form = useZodForm(createPlace.body, {
    kind: place?.kind ?? 'depot',
    name: place?.name ?? '',
    addressLabel: place?.addressLabel ?? '',
    lat: place?.lat ?? (null as unknown as number),
    lon: place?.lon ?? (null as unknown as number),
    phone: place?.phone ?? null,
    opensMinutes: place?.opensMinutes ?? 0,
    closesMinutes: place?.closesMinutes ?? 1440,
    lengthMinutes: place?.lengthMinutes ?? 12,
  });
  const submit = useSubmit(form, async (body) => {
    if (place) await update.mutateAsync({ params: { placeId: place.id }, body });
    else await create.mutateAsync({ body });
    toast(`${body.name} is saved.`);
    onClose();
  });
  const { errors } = form.formState;
  const [kind, addressLabel = '', lat, lon] = form.watch(['kind', 'addressLabel', 'lat', 'lon']);
  const where = useWhere({ addressLabel, lat, lon }, (next) => {
    form.setValue('addressLabel', next.addressLabel, { shouldDirty: true });
    form.setValue('lat', next.lat as number, { shouldDirty: true });
    form.setValue('lon', next.lon as number, { shouldDirty: true });
    if (next.lat !== null) form.clearErrors(['lat', 'lon']);
  });
  return (
    <Dialog title={place ? place.name : 'Add a place'} onClose={onClose} wide>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <div className="grid gap-4 md:grid-cols-2">
          <SelectField
            label="What it is"
            choices={placeKinds}
            {...form.register('kind')}
            error={errors.kind?.message}
          />
          <TextField label="Name" {...form.register('name')} error={errors.name?.message} />
        </div>
        <WhereEntry
          label="Address"
          {...where}
          spot={lat === null ? null : { lat, lon }}
          error={
            errors.addressLabel?.message ??
            (errors.lat || errors.lon ? 'Pick an address from the list, or drop a pin.' : undefined)
          }
          map={() => <PinMap area={business} lat={lat} lon={lon} onPin={where.onPin} />}
        />
        {kind !== 'depot' && (
          <div className="grid gap-4 md:grid-cols-3">
            <FormTime
              control={form.control}
              name="opensMinutes"
              label="Opens"
              hint="0:00 to 24:00 means day and night."
            />
            <FormTime control={form.control} name="closesMinutes" label="Closes" />
            {isRefill(kind) && (
              <FormNumber
                control={form.control}
                name="lengthMinutes"
                label="A stop takes"
                unit="min"
              />
            )}
          </div>
        )}
        <TextField
          label="Phone"
          type="tel"
          required={kind === 'emergencyVet' ? undefined : false}
          hint={
            kind === 'emergencyVet'
              ? 'One tap away in the van. Check it and the hours now and then.'
              : undefined
          }
          {...form.register('phone', { setValueAs: emptyToNull })}
          error={errors.phone?.message}
        />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {place ? 'Save the place' : 'Add the place'}
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}
