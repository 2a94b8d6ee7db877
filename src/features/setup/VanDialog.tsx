import { z } from 'zod';
import type { Place } from '#shared/api/places.ts';
import { createVan, vanShape, type Van } from '#shared/api/vans.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { useCreateVan, useUpdateVan } from '#src/api/vans.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { FormNumber } from '#src/components/FormNumber.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { toast } from '#src/components/toast.ts';
import { fromGrams, toGrams } from '#src/lib/measures.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { ShapePicker } from './ShapePicker.tsx';

const litres = z
  .int('must be whole litres')
  .min(1, 'must be 1 litre or more')
  .max(2000, 'must be 2,000 litres or fewer')
  .nullable();
const schema = createVan.body
  .omit({ tanks: true })
  .extend({ freshLitres: litres, greyLitres: litres });

const water = [
  ['freshLitres', 'fresh'],
  ['greyLitres', 'grey'],
] as const;

export function VanDialog({
  van,
  places,
  takenShapes,
  onClose,
}: {
  van: Van | null;
  places: readonly Place[];
  takenShapes: readonly Van['shape'][];
  onClose: () => void;
}) {
  const { weightUnit } = useSession().business;
  const create = useCreateVan();
  const update = useUpdateVan();
  const litresOf = (kind: 'fresh' | 'grey', usual: number) => {
    if (!van) return usual;
    const tank = van.tanks.find((one) => one.kind === kind);
    return tank ? Math.round(tank.capacityMl / 1000) : null;
  };
  const depot = places.find((place) => place.kind === 'depot') ?? places[0];
  const form = useZodForm(schema, {
    name: van?.name ?? '',
    shape: van?.shape ?? vanShape.options.find((one) => !takenShapes.includes(one)) ?? 'square',
    startPlaceId: van?.startPlaceId ?? depot?.id ?? '',
    endPlaceId: van?.endPlaceId ?? depot?.id ?? '',
    freshLitres: litresOf('fresh', 260),
    greyLitres: litresOf('grey', 260),
    tableLimitGrams: van?.tableLimitGrams ?? 60_000,
  });
  const submit = useSubmit(form, async ({ freshLitres, greyLitres, ...fields }) => {
    const given = { freshLitres, greyLitres };
    // Tanks this form does not show keep their size.
    const others = van?.tanks.filter((tank) => !['fresh', 'grey'].includes(tank.kind)) ?? [];
    const tanks = water.flatMap(([field, kind]) => {
      const size = given[field];
      return size === null ? [] : [{ kind, capacityMl: size * 1000 }];
    });
    const body = { ...fields, tanks: [...tanks, ...others] };
    if (van) await update.mutateAsync({ params: { vanId: van.id }, body });
    else await create.mutateAsync({ body });
    toast(`${body.name} is saved.`);
    onClose();
  });
  const { errors } = form.formState;
  const choices = places.map((place) => ({ value: place.id, label: place.name }));
  return (
    <Dialog title={van ? van.name : 'Add a van'} onClose={onClose} wide>
      <form onSubmit={submit.onSubmit} noValidate className="grid gap-4">
        <TextField
          label="Name"
          hint="Short and easy to call: Otter, Plover."
          {...form.register('name')}
          error={errors.name?.message}
        />
        <ShapePicker
          value={form.watch('shape')}
          taken={takenShapes}
          onChange={(shape) => form.setValue('shape', shape, { shouldDirty: true })}
        />
        <div className="grid gap-4 md:grid-cols-2">
          <SelectField
            label="Starts at"
            empty="Choose a place"
            choices={choices}
            {...form.register('startPlaceId')}
            error={errors.startPlaceId && 'Choose where the van starts.'}
          />
          <SelectField
            label="Ends at"
            empty="Choose a place"
            choices={choices}
            {...form.register('endPlaceId')}
            error={errors.endPlaceId && 'Choose where the van ends.'}
          />
        </div>
        <div className="grid gap-4 md:grid-cols-3">
          <FormNumber
            control={form.control}
            name="freshLitres"
            label="Fresh water"
            unit="L"
            hint="Empty when it is not counted."
          />
          <FormNumber control={form.control} name="greyLitres" label="Grey water" unit="L" />
          <FormNumber
            control={form.control}
            name="tableLimitGrams"
            label="Heaviest pet"
            unit={weightUnit}
            decimals={1}
            hint="On table and lift."
            shownAs={{
              show: (grams) => fromGrams(grams, weightUnit),
              store: (amount) => toGrams(amount, weightUnit),
            }}
          />
        </div>
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div className="flex flex-wrap gap-2.5">
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {van ? 'Save the van' : 'Add the van'}
          </Button>
          <Button onClick={onClose}>Leave it</Button>
        </div>
      </form>
    </Dialog>
  );
}
