import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router-dom';
import type { Pet } from '#shared/api/pets.ts';
import { petStyleQueries } from '#src/api/petStyles.ts';
import { useCan, useSession } from '#src/api/sessionStore.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { leanWords } from '#src/features/households/leanWords.ts';
import { PastVisits } from '#src/features/households/PastVisits.tsx';
import { PetCautions } from '#src/features/households/PetCautions.tsx';
import { PetLearned } from '#src/features/households/PetLearned.tsx';
import { PetStyleCard } from '#src/features/styles/PetStyleCard.tsx';
import { StyleVersions } from '#src/features/styles/StyleVersions.tsx';
import { writeWeight, type WeightUnit } from '#src/lib/measures.ts';
import { breedWords } from '#src/strips/petWords.ts';
import { FailedQuery } from './FailedQuery.tsx';
import { useKnownPet } from './useKnownPet.ts';

/** One pet: how it is groomed and what that takes, what the past says, what to beware of. */
export function PetScreen() {
  const { householdId, petId } = useParams() as { householdId: string; petId: string };
  const { business } = useSession();
  const mayEdit = useCan('households.edit');
  const { found, facts, today } = useKnownPet(petId);
  const versions = useQuery(petStyleQueries.list(petId));
  const household = `/households/${householdId}`;
  if (found.isPending) return <Loading lines={8} />;
  if (found.isError)
    return (
      <FailedQuery
        title="This pet does not open"
        error={found.error}
        back={{ to: household, words: 'Household' }}
        onRetry={() => found.refetch()}
      />
    );
  const { pet, past, householdName } = found.data;
  const at = `${household}/pets/${petId}`;
  return (
    <>
      <PageHeader
        title={pet.name}
        dim={<PetFactWords pet={pet} today={today} unit={business.weightUnit} />}
        back={{ to: household, words: householdName }}
        actions={mayEdit && <ButtonLink to={`${at}/edit`}>Change {pet.name}</ButtonLink>}
      />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4 lg:gap-5">
        <PetStyleCard
          pet={pet}
          version={versions.data?.[0] ?? null}
          facts={facts ?? 'No forecast yet.'}
          timeZone={business.timeZone}
          today={today}
          editTo={mayEdit ? `${at}/style` : null}
          learned={past.length > 0 ? leanWords(past) : null}
        />
        <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-4 lg:grid-cols-[minmax(0,1.25fr)_minmax(0,1fr)] lg:gap-5">
          <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
            <PetLearned petId={petId} petName={pet.name} />
            <PastVisits past={past} year={Number(today.slice(0, 4))} petName={pet.name} />
            <PetCautions pet={pet} />
          </div>
          {versions.isError ? (
            <ErrorNote
              error={versions.error}
              title="The versions of the style do not open"
              onRetry={() => versions.refetch()}
            />
          ) : versions.isPending ? (
            <Loading lines={4} />
          ) : (
            <StyleVersions
              petName={pet.name}
              versions={versions.data}
              timeZone={business.timeZone}
              today={today}
              mayEdit={mayEdit}
            />
          )}
        </div>
      </div>
    </>
  );
}

function PetFactWords({ pet, today, unit }: { pet: Pet; today: string; unit: WeightUnit }) {
  const age = pet.birthYear === null ? null : Number(today.slice(0, 4)) - pet.birthYear;
  const words = [
    breedWords(pet.breedName),
    pet.weightGrams === null ? null : writeWeight(pet.weightGrams, unit),
    age === null ? null : age < 1 ? 'under a year' : age === 1 ? '1 year' : `${age} years`,
    pet.temperament,
    `every ${pet.intervalWeeks} weeks`,
  ];
  return (
    <span className="flex flex-wrap items-center gap-x-2 gap-y-1">
      {words.filter(Boolean).join(' · ')}
      {!pet.active && <Chip tone="heed">rests: not booked any more</Chip>}
    </span>
  );
}
