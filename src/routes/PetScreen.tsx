import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import type { Pet } from '#shared/api/pets.ts';
import { householdQueries } from '#src/api/households.ts';
import { petQueries, useCreatePet, useUpdatePet } from '#src/api/pets.ts';
import { useToday } from '#src/api/session.ts';
import { Chip } from '#src/components/Chip.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { toast } from '#src/components/toast.ts';
import { PastVisits } from '#src/features/households/PastVisits.tsx';
import { PetForm } from '#src/features/households/PetForm.tsx';
import { RestPet } from '#src/features/households/RestPet.tsx';
import { breedWords } from '#src/strips/petWords.ts';
import { FailedQuery } from './FailedQuery.tsx';

/** One pet: its facts, its style, what it takes. Without a pet in the address, a new one. */
export function PetScreen() {
  const { householdId, petId } = useParams();
  return petId ? (
    <KnownPet key={petId} householdId={householdId!} petId={petId} />
  ) : (
    <NewPet householdId={householdId!} />
  );
}

function NewPet({ householdId }: { householdId: string }) {
  const navigate = useNavigate();
  const create = useCreatePet();
  const household = useQuery(householdQueries.one(householdId));
  const back = `/households/${householdId}`;
  return (
    <>
      <PageHeader
        title="Add a pet"
        back={{ to: back, words: household.data?.household.name ?? 'Household' }}
      />
      <PetForm
        pet={null}
        saveWords="Add the pet"
        onSave={async (body) => {
          await create.mutateAsync({ params: { householdId }, body });
          toast(`${body.name} is added.`);
          navigate(back, { state: { saved: true } });
        }}
      />
    </>
  );
}

function KnownPet({ householdId, petId }: { householdId: string; petId: string }) {
  const navigate = useNavigate();
  const today = useToday();
  const update = useUpdatePet();
  const found = useQuery(petQueries.one(petId));
  if (found.isPending) return <Loading lines={8} />;
  if (found.isError)
    return (
      <FailedQuery
        title="This pet does not open"
        error={found.error}
        back={{ to: `/households/${householdId}`, words: 'Household' }}
        onRetry={() => found.refetch()}
      />
    );
  const { pet, past, householdName } = found.data;
  const back = `/households/${householdId}`;
  return (
    <>
      <PageHeader
        title={pet.name}
        dim={
          <span className="flex flex-wrap items-center gap-x-2 gap-y-1">
            {factWords(pet, today)}
            {!pet.active && <Chip tone="heed">rests: not booked any more</Chip>}
          </span>
        }
        back={{ to: back, words: householdName }}
        actions={<RestPet pet={pet} />}
      />
      <PetForm
        pet={pet}
        saveWords={`Save ${pet.name}`}
        onSave={async (body) => {
          await update.mutateAsync({ params: { petId }, body });
          toast(`${body.name} is saved.`);
          navigate(back, { state: { saved: true } });
        }}
        below={<PastVisits past={past} year={Number(today.slice(0, 4))} />}
      />
    </>
  );
}

function factWords(pet: Pet, today: string): string {
  const age = pet.birthYear === null ? null : Number(today.slice(0, 4)) - pet.birthYear;
  return [
    breedWords(pet.breedName),
    pet.styleName,
    age === null ? null : age < 1 ? 'under a year' : age === 1 ? '1 year' : `${age} years`,
    `every ${pet.intervalWeeks} weeks`,
  ]
    .filter(Boolean)
    .join(' · ');
}
