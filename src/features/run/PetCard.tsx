import { useSession } from '#src/api/sessionStore.ts';
import { writeWeight } from '#src/lib/measures.ts';
import { breedWords } from '#src/strips/petWords.ts';
import { Cautions } from './Cautions.tsx';
import type { RunPet } from './nextAction.ts';

/** One pet: cautions before all else, then who it is and how it is groomed. */
export function PetCard({ pet, minutesWords }: { pet: RunPet; minutesWords: string }) {
  const unit = useSession().business.weightUnit;
  return (
    <section aria-label={pet.name} className="card px-4 py-3">
      <h2 className="text-[17px] leading-snug font-bold">
        {pet.name}{' '}
        <span className="font-normal text-slate">
          {breedWords(pet.breedName)}, {writeWeight(pet.weightGrams, unit)}
          {pet.temperament && pet.temperament !== 'calm' ? `, ${pet.temperament}` : ''}
        </span>
      </h2>
      <Cautions pet={pet} />
      <p className="mt-2 flex items-baseline justify-between gap-3 border-t border-linen pt-2">
        <span>
          {pet.styleName}
          {pet.styleNotes && <span className="text-slate"> · {pet.styleNotes}</span>}
        </span>
        <b className="whitespace-nowrap">{minutesWords}</b>
      </p>
      {pet.vetPhone && (
        <p className="mt-1 border-t border-linen pt-1 text-[15px]">
          <span className="text-slate">Vet: {pet.vetName || 'their own'} </span>
          <a className="text-link inline-flex min-h-12 items-center" href={`tel:${pet.vetPhone}`}>
            call {pet.vetPhone}
          </a>
        </p>
      )}
    </section>
  );
}
