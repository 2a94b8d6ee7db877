import { findBreed } from '#shared/grooming/breeds.ts';
import type { CoatType } from '#shared/grooming/types.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { useWhere } from '#src/api/useWhere.ts';
import { Card } from '#src/components/Card.tsx';
import { NumberField } from '#src/components/NumberField.tsx';
import { Segmented } from '#src/components/Segmented.tsx';
import { SelectField, type Choice } from '#src/components/SelectField.tsx';
import { WhereEntry } from '#src/components/WhereEntry.tsx';
import { PinMap } from '#src/map/PinMap.tsx';
import { fromGrams, toGrams } from '#src/lib/measures.ts';
import { BreedField } from './BreedField.tsx';
import {
  coatChoices,
  coatWords,
  mattingChoices,
  soilChoices,
  temperamentChoices,
  undercoatChoices,
} from './coatWords.ts';
import type { QuickPet } from './quickPet.ts';

/** In the order a call tells it. */
export function QuickFields({
  pet,
  styleChoices,
  onChange,
}: {
  pet: QuickPet;
  styleChoices: readonly Choice[];
  onChange: (part: Partial<QuickPet>) => void;
}) {
  const { business } = useSession();
  const { weightUnit } = business;
  const breed = pet.breedId ? findBreed(pet.breedId) : null;
  const where = useWhere(pet.where, (next) => onChange({ where: next }));
  const unit = (grams: number) => fromGrams(grams, weightUnit);
  const shownWeight =
    pet.weightGrams === null || Number.isNaN(pet.weightGrams)
      ? pet.weightGrams
      : unit(pet.weightGrams);
  return (
    <Card title="The pet">
      <div className="grid gap-4 md:grid-cols-2">
        <Segmented
          label="Species"
          choices={[
            { value: 'dog', label: 'Dog' },
            { value: 'cat', label: 'Cat' },
          ]}
          value={pet.species}
          onChange={(species) => onChange({ species })}
        />
        <BreedField
          key={pet.species}
          species={pet.species}
          breedId={pet.breedId}
          onPick={(next) => onChange({ breedId: next?.id ?? null, coatType: null })}
        />
        <NumberField
          label="Weight"
          unit={weightUnit}
          decimals={1}
          required={false}
          value={shownWeight}
          hint={
            breed
              ? `Usually ${unit(breed.minGrams)}–${unit(breed.maxGrams)} ${weightUnit}.`
              : undefined
          }
          onChange={(amount) =>
            onChange({
              weightGrams:
                amount === null || Number.isNaN(amount) ? amount : toGrams(amount, weightUnit),
            })
          }
        />
        <NumberField
          label="Age"
          unit="years"
          required={false}
          value={pet.ageYears}
          onChange={(years) =>
            onChange({
              ageYears: years === null || !(years >= 0 && years <= 40) ? null : Math.floor(years),
            })
          }
        />
        <SelectField
          label="Coat"
          empty={breed ? `As the breed: ${coatWords(breed.coatType)}` : 'Choose the coat'}
          choices={coatChoices.filter((choice) => choice.species === pet.species)}
          value={pet.coatType ?? ''}
          onChange={({ target }) =>
            onChange({ coatType: (target.value || null) as CoatType | null })
          }
        />
        <SelectField
          label="Style"
          empty="Choose a style"
          choices={styleChoices}
          value={pet.styleId}
          onChange={({ target }) => onChange({ styleId: target.value })}
        />
        <Segmented
          label="Matting"
          className="md:col-span-2"
          choices={mattingChoices}
          value={String(pet.matting) as (typeof mattingChoices)[number]['value']}
          onChange={(level) => onChange({ matting: Number(level) })}
        />
        <Segmented
          label="Undercoat"
          className="md:col-span-2"
          choices={undercoatChoices}
          value={String(pet.undercoatLoad) as (typeof undercoatChoices)[number]['value']}
          onChange={(level) => onChange({ undercoatLoad: Number(level) })}
        />
        <Segmented
          label="Dirt"
          className="md:col-span-2"
          choices={soilChoices}
          value={String(pet.soil) as (typeof soilChoices)[number]['value']}
          onChange={(level) => onChange({ soil: Number(level) })}
        />
        <Segmented
          label="Temperament"
          className="md:col-span-2"
          choices={temperamentChoices}
          value={pet.temperament}
          onChange={(temperament) => onChange({ temperament })}
        />
        <div className="md:col-span-2">
          <WhereEntry
            label="Where (if you like)"
            hint="With an address, the earliest windows show too."
            {...where}
            spot={
              pet.where.lat === null || pet.where.lon === null
                ? null
                : { lat: pet.where.lat, lon: pet.where.lon }
            }
            error={undefined}
            map={() => (
              <PinMap area={business} lat={pet.where.lat} lon={pet.where.lon} onPin={where.onPin} />
            )}
          />
        </div>
      </div>
    </Card>
  );
}
