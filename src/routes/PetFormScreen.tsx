import { useQuery } from '@tanstack/react-query';
import { useLocation, useNavigate, useParams } from 'react-router-dom';
import { householdQueries } from '#src/api/households.ts';
import { petQueries, useCreatePet, useUpdatePet } from '#src/api/pets.ts';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { toast } from '#src/components/toast.ts';
import { PetForm } from '#src/features/households/PetForm.tsx';
import type { ToldByPhone } from '#src/features/households/quickPet.ts';
import { RestPet } from '#src/features/households/RestPet.tsx';
import { FailedQuery } from './FailedQuery.tsx';

/** A pet to write: a new one, or the facts of the one in the address. */
export function PetFormScreen() {
  const { householdId, petId } = useParams();
  return petId ? (
    <EditPet key={petId} householdId={householdId!} petId={petId} />
  ) : (
    <NewPet householdId={householdId!} />
  );
}

function NewPet({ householdId }: { householdId: string }) {
  const navigate = useNavigate();
  const create = useCreatePet();
  const told = useLocation().state as Partial<ToldByPhone> | null;
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
        told={told?.pet ?? null}
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

function EditPet({ householdId, petId }: { householdId: string; petId: string }) {
  const navigate = useNavigate();
  const update = useUpdatePet();
  const found = useQuery(petQueries.one(petId));
  const back = `/households/${householdId}/pets/${petId}`;
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
  const { pet } = found.data;
  return (
    <>
      <PageHeader
        title={`Change ${pet.name}`}
        back={{ to: back, words: pet.name }}
        actions={<RestPet pet={pet} />}
      />
      <PetForm
        pet={pet}
        saveWords={`Save ${pet.name}`}
        onSave={async (fields) => {
          // The style has versions of its own; a form left open must not put an old one back.
          const { styleId: _, styleNotes: _notes, ...body } = fields;
          await update.mutateAsync({ params: { petId }, body });
          toast(`${body.name} is saved.`);
          navigate(back, { state: { saved: true } });
        }}
      />
    </>
  );
}
