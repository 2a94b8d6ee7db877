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
  const [left, setLeft] = useState(false);
  const fuse = useMemo(
    () =>
      new Fuse(
        breeds.filter((breed) => breed.species === species),
        // Words in any order: "standard poodle" finds "Poodle, standard".
        { keys: ['name'], threshold: 0.3, ignoreLocation: true, useExtendedSearch: true },
      ),
    [species],
  );
  const text = typed ?? chosen?.name ?? '';
  const found =
    typed === null || typed.trim() === ''
      ? []
      : fuse.search(typed.replace(/[^\p{L}\p{N} ]/gu, ' '), { limit: 8 }).map(({ item }) => item);
  return (
    <Combobox
      label="Breed"
      hint={
        chosen ? undefined : 'A cross that is not listed: leave it empty and give weight and coat.'
      }
      error={
        left && typed?.trim()
          ? 'Pick one from the list, or empty this and give weight and coat.'
          : error
      }
      text={text}
      onText={(next) => {
        setTyped(next);
        setLeft(false);
        if (next.trim() === '') onPick(null);
      }}
      options={found.map((breed) => ({ key: breed.id, label: breed.name }))}
      onPick={({ key }) => {
        onPick(findBreed(key));
        setTyped(null);
      }}
      onBlur={() => {
        const exact = found.find(({ name }) => name.toLowerCase() === typed?.trim().toLowerCase());
        if (exact) onPick(exact);
        if (exact || !typed?.trim()) setTyped(null);
        setLeft(true);
      }}
      emptyWords="No breed like this. Leave it empty and give weight and coat."
      placeholder="Type a few letters"
    />
  );
}
