import { useQuery } from '@tanstack/react-query';
import type { z } from 'zod';
import { createPet, type Pet } from '#shared/api/pets.ts';
import { cautions } from '#shared/grooming/cautions.ts';
import { findBreed } from '#shared/grooming/breeds.ts';
import { styles as startingStyles } from '#shared/grooming/styles.ts';
import type { BreedFacts, CoatType } from '#shared/grooming/types.ts';
import { useToday } from '#src/api/session.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { styleQueries } from '#src/api/styles.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { FormChecks } from '#src/components/FormChecks.tsx';
import { FormErrors } from '#src/components/FormErrors.tsx';
import { FormNumber } from '#src/components/FormNumber.tsx';
import { FormSegmented } from '#src/components/FormSegmented.tsx';
import { SelectField } from '#src/components/SelectField.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { TextField } from '#src/components/TextField.tsx';
import { UnsavedGuard } from '#src/components/UnsavedGuard.tsx';
import { emptyToNull } from '#src/lib/emptyToNull.ts';
import { fromGrams, toGrams } from '#src/lib/measures.ts';
import { useSubmit } from '#src/lib/useSubmit.ts';
import { useZodForm } from '#src/lib/useZodForm.ts';
import { BreedField } from './BreedField.tsx';
import {
  coatChoices,
  coatWords,
  mattingChoices,
  soilChoices,
  temperamentChoices,
  undercoatChoices,
} from './coatWords.ts';
import { FormLevel } from './FormLevel.tsx';
import { ForecastLine } from './ForecastLine.tsx';
import { ForecastPanel } from './ForecastPanel.tsx';
import { MatPlaces } from './MatPlaces.tsx';
import { petFactsOf } from './petFactsOf.ts';
import { petStart } from './petStart.ts';
import type { ToldByPhone } from './quickPet.ts';
import { styleChoices } from './styleChoices.ts';

export type PetFields = z.output<typeof createPet.body>;

/**
 * Everything about a pet beside what it will take, which follows every change. A new pet begins with
 * a style; later its style has a page of its own, so a known pet's form leaves it alone.
 */
export function PetForm({
  pet,
  told = null,
  onSave,
  saveWords,
}: {
  pet: Pet | null;
  /** What a call told of a new one. */
  told?: ToldByPhone['pet'] | null;
  onSave: (fields: PetFields) => Promise<void>;
  saveWords: string;
}) {
  const today = useToday();
  const { weightUnit } = useSession().business;
  const form = useZodForm(createPet.body, petStart(pet, told, Number(today.slice(0, 4))));
  const submit = useSubmit(form, onSave);
  const { errors, isDirty } = form.formState;
  const values = form.watch();
  const species = values.species;
  const breed = values.breedId ? findBreed(values.breedId) : null;
  const coat = (values.coatType ?? null) as CoatType | null;
  const library = useQuery(styleQueries.list()).data ?? startingStyles;
  const style = pet?.style ?? library.find(({ id }) => id === values.styleId) ?? null;
  const unit = (grams: number) => fromGrams(grams, weightUnit);

  const setBreed = (next: BreedFacts | null) => {
    form.setValue('breedId', next?.id ?? null, { shouldDirty: true, shouldValidate: true });
    form.setValue('coatType', null, { shouldDirty: true });
    const usual = next?.usualStyleIds[0];
    if (usual && !pet) form.setValue('styleId', usual, { shouldDirty: true, shouldValidate: true });
  };
  const clearForSpecies = () => {
    form.setValue('breedId', null, { shouldDirty: true });
    form.setValue('coatType', null, { shouldDirty: true });
    form.setValue('styleId', '', { shouldDirty: true });
  };

  const facts = petFactsOf(
    { ...(values as PetFields), coatType: coat },
    pet?.lastVisitDate ?? null,
    today,
    pet?.lastCuts ?? null,
  );
  return (
    <form
      onSubmit={submit.onSubmit}
      noValidate
      className="grid items-start gap-4 lg:grid-cols-[minmax(0,1.15fr)_minmax(0,1fr)] lg:gap-5"
    >
      <div className="grid gap-4">
        <Card title="The pet">
          <div className="grid gap-4 md:grid-cols-2">
            <TextField label="Name" {...form.register('name')} error={errors.name?.message} />
            {!pet && (
              <FormSegmented
                control={form.control}
                name="species"
                label="Species"
                choices={[
                  { value: 'dog', label: 'Dog' },
                  { value: 'cat', label: 'Cat' },
                ]}
                onPick={clearForSpecies}
              />
            )}
            <BreedField
              key={species}
              species={species}
              breedId={values.breedId}
              onPick={setBreed}
              error={errors.breedId?.message}
            />
            <FormNumber
              control={form.control}
              name="weightGrams"
              label="Weight"
              unit={weightUnit}
              decimals={1}
              required={breed ? false : undefined}
              hint={
                breed
                  ? `Usually ${unit(breed.minGrams)}–${unit(breed.maxGrams)} ${weightUnit}. Weigh when you can.`
                  : undefined
              }
              shownAs={{ show: unit, store: (amount) => toGrams(amount, weightUnit) }}
            />
            <FormNumber
              control={form.control}
              name="birthYear"
              label="Born in"
              required={false}
              hint="The year is enough."
            />
            <FormSegmented
              control={form.control}
              name="temperament"
              label="Temperament"
              choices={temperamentChoices}
            />
            <FormNumber
              control={form.control}
              name="tableLimitMinutes"
              label="Most minutes on the table"
              unit="min"
              required={false}
              hint="Empty: by age and health."
            />
          </div>
        </Card>
        <Card title={pet ? 'Coat' : 'Coat and style'}>
          <div className="grid gap-4 md:grid-cols-2">
            <SelectField
              label="Coat"
              empty={breed ? `As the breed: ${coatWords(breed.coatType)}` : 'Choose the coat'}
              choices={coatChoices.filter((choice) => choice.species === species)}
              {...form.register('coatType', { setValueAs: emptyToNull })}
              error={errors.coatType?.message}
            />
            {!pet && (
              <SelectField
                label="Style"
                empty="Choose a style"
                choices={styleChoices(library, species, values.breedId, coat)}
                hint="The cut plan can be changed for this pet afterwards."
                {...form.register('styleId')}
                error={errors.styleId && 'Choose a style.'}
              />
            )}
            <div className="md:col-span-2">
              <FormLevel
                control={form.control}
                name="matting"
                label="Matting"
                choices={mattingChoices}
              />
              <MatPlaces control={form.control} />
            </div>
            <div className="md:col-span-2">
              <FormLevel
                control={form.control}
                name="undercoatLoad"
                label="Undercoat"
                choices={undercoatChoices}
              />
            </div>
            <FormLevel control={form.control} name="soil" label="Dirt" choices={soilChoices} />
            <FormNumber
              control={form.control}
              name="intervalWeeks"
              label="Comes every"
              unit="weeks"
            />
            {!pet && (
              <TextArea
                label="Style notes"
                required={false}
                rows={2}
                className="md:col-span-2"
                hint="“Ears long, feet round, no perfume.”"
                {...form.register('styleNotes')}
                error={errors.styleNotes?.message}
              />
            )}
          </div>
        </Card>
        <ForecastLine facts={facts} style={style} />
        <Card title="Cautions" dim="shown wherever the pet is handled">
          <FormChecks
            control={form.control}
            name="cautions"
            legend="What the groomer must know"
            choices={notedCautions}
            listClassName="grid gap-x-6 md:grid-cols-2"
          />
          <TextArea
            label="More to know"
            required={false}
            rows={2}
            className="mt-3"
            {...form.register('cautionNote')}
            error={errors.cautionNote?.message}
          />
          <div className="mt-4 grid gap-4 md:grid-cols-2">
            <TextField
              label="The pet's vet"
              required={false}
              {...form.register('vetName')}
              error={errors.vetName?.message}
            />
            <TextField
              label="Vet's phone"
              type="tel"
              required={false}
              {...form.register('vetPhone', { setValueAs: emptyToNull })}
              error={errors.vetPhone?.message}
            />
          </div>
        </Card>
      </div>
      <div id="what-it-takes" className="grid scroll-mt-4 gap-4 lg:sticky lg:top-4">
        <ForecastPanel facts={facts} style={style} petName={values.name} />
        <FormErrors error={submit.failure} fields={submit.strayFields} />
        <div>
          <Button type="submit" kind="go" busy={submit.busy} busyWords="Saving">
            {saveWords}
          </Button>
        </div>
      </div>
      <UnsavedGuard when={isDirty} />
    </form>
  );
}

/** Cautions a person notes on a pet; the others follow from facts or from the day. */
const notedCautions = cautions
  .filter((caution) => caution.trigger.kind === 'noted')
  .map(({ key, words }) => {
    const [first, ...rest] = words.split('. ');
    const hint = rest.join('. ');
    return { value: key, label: first!.replace(/\.$/, ''), ...(hint ? { hint } : {}) };
  });
