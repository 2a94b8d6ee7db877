import { useState } from 'react';
import { useController, type Control } from 'react-hook-form';
import type { z } from 'zod';
import type { createPet } from '#shared/api/pets.ts';
import { region as regions } from '#shared/api/styles.ts';
import { regionWords } from '#shared/grooming/regionWords.ts';
import type { MattingLevel, Region } from '#shared/grooming/types.ts';
import { SelectField } from '#src/components/SelectField.tsx';
import { mattingChoices } from './coatWords.ts';

type Fields = z.input<typeof createPet.body>;
type Places = NonNullable<Fields['mattingByRegion']>;

/** Mats region by region, folded away until somebody knows better than the whole pet's level. */
export function MatPlaces({
  control,
}: {
  control: Control<Fields, unknown, z.output<typeof createPet.body>>;
}) {
  const { field, fieldState } = useController({ control, name: 'mattingByRegion' });
  const places: Places = field.value ?? {};
  const matted = regions.options.filter((region) => (places[region] ?? 0) > 0);
  // Only at first: it must not fold away under the hand that clears the last place.
  const [startsOpen] = useState(matted.length > 0);
  return (
    <details className="mt-2" open={startsOpen || undefined}>
      <summary className="flex min-h-11 items-center font-medium">
        <span aria-hidden="true">▸&nbsp;</span>Mats in places
        {matted.length > 0 && (
          <span className="font-normal text-slate">: {regionWords(matted)}</span>
        )}
      </summary>
      <p className="mb-2 text-sm text-slate">
        Once a place is named, it counts instead of the whole pet’s level; the others count as
        clear.
      </p>
      <div className="grid grid-cols-2 gap-3 md:grid-cols-3">
        {regions.options.map((region) => (
          <SelectField
            key={region}
            label={placeName(region)}
            choices={mattingChoices}
            value={String(places[region] ?? 0)}
            onChange={(event) => field.onChange(withPlace(places, region, event.target.value))}
          />
        ))}
      </div>
      {fieldState.error && (
        <p className="mt-1 text-sm font-medium text-rosette">{fieldState.error.message}</p>
      )}
    </details>
  );
}

/** Nothing left named is null: the whole pet's level counts again. */
function withPlace(places: Places, region: Region, level: string): Places | null {
  const rest = Object.entries(places).filter(([key, value]) => key !== region && value !== 0);
  const told = Number(level) as MattingLevel;
  const next = told === 0 ? rest : [...rest, [region, told] as const];
  return next.length > 0 ? (Object.fromEntries(next) as Places) : null;
}

function placeName(region: Region): string {
  const words = regionWords([region]);
  return words[0]!.toUpperCase() + words.slice(1);
}
