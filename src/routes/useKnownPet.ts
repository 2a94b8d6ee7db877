import { useQuery } from '@tanstack/react-query';
import { petQueries } from '#src/api/pets.ts';
import { useToday } from '#src/api/session.ts';
import { petFactsOf } from '#src/features/households/petFactsOf.ts';

/** A pet's answer and the facts its forecast is made from; both null until it is read. */
export function useKnownPet(petId: string) {
  const today = useToday();
  const found = useQuery(petQueries.one(petId));
  const pet = found.data?.pet;
  const facts = pet ? petFactsOf(pet, pet.lastVisitDate, today, pet.lastCuts) : null;
  return { found, facts, today };
}
