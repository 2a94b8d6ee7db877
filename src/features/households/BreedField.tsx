import { useMemo, useState } from 'react';
import Fuse from 'fuse.js';
import { breeds, findBreed } from '#shared/grooming/breeds.ts';
import type { BreedFacts, Species } from '#shared/grooming/types.ts';
import { Combobox } from '#src/components/Combobox.tsx';

/** A breed by a few letters, slips of the finger allowed; empty means none of the list. */
export function BreedField({
  species,
  breedId,
  onPick,
  error,
}: {
  species: Species;
  breedId: string | null;
  onPick: (breed: BreedFacts | null) => void;
  error?: string | undefined;
}) {
  const chosen = breedId ? findBreed(breedId) : null;
  const [typed, setTyped] = useState<string | null>(null);
  const fuse = useMemo(
    () =>
      new Fuse(
        breeds.filter((breed) => breed.species === species),
        { keys: ['name'], threshold: 0.35, ignoreLocation: true },
      ),
    [species],
  );
  const text = typed ?? chosen?.name ?? '';
  const found =
    typed === null || typed.trim() === ''
      ? []
      : fuse.search(typed, { limit: 8 }).map(({ item }) => item);
  return (
    <Combobox
      label="Breed"
      hint={
        chosen ? undefined : 'A cross that is not listed: leave it empty and give weight and coat.'
      }
      error={error}
      text={text}
      onText={(next) => {
        setTyped(next);
        if (next.trim() === '') onPick(null);
      }}
      options={found.map((breed) => ({ key: breed.id, label: breed.name }))}
      onPick={({ key }) => {
        onPick(findBreed(key));
        setTyped(null);
      }}
      onBlur={() => setTyped(null)}
      emptyWords="No breed like this. Leave it empty and give weight and coat."
      placeholder="Type a few letters"
    />
  );
}
