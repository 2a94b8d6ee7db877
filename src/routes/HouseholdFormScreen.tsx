import { useQuery } from '@tanstack/react-query';
import { useLocation, useNavigate, useParams } from 'react-router-dom';
import { householdQueries, useCreateHousehold, useUpdateHousehold } from '#src/api/households.ts';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { toast } from '#src/components/toast.ts';
import { HouseholdForm } from '#src/features/households/HouseholdForm.tsx';
import type { ToldByPhone } from '#src/features/households/quickPet.ts';
import { FailedQuery } from './FailedQuery.tsx';

/** A household to write: a new one, or the one in the address. */
export function HouseholdFormScreen() {
  const { householdId } = useParams();
  return householdId ? <EditHousehold householdId={householdId} /> : <NewHousehold />;
}

function NewHousehold() {
  const navigate = useNavigate();
  const create = useCreateHousehold();
  // The forecast hands on the address and the pet it was told.
  const told = useLocation().state as Partial<ToldByPhone> | null;
  return (
    <>
      <PageHeader title="Add a household" back={{ to: '/households', words: 'Households' }} />
      <HouseholdForm
        household={null}
        where={told?.where ?? null}
        saveWords="Add the household"
        onSave={async (body) => {
          const made = await create.mutateAsync({ body });
          toast(`${made.name} is added. Now its pets.`);
          const next = `/households/${made.id}${told?.pet ? '/pets/new' : ''}`;
          navigate(next, { state: { saved: true, pet: told?.pet }, replace: true });
        }}
      />
    </>
  );
}

function EditHousehold({ householdId }: { householdId: string }) {
  const navigate = useNavigate();
  const update = useUpdateHousehold();
  const found = useQuery(householdQueries.one(householdId));
  if (found.isPending) return <Loading lines={8} />;
  if (found.isError)
    return (
      <FailedQuery
        title="This household does not open"
        error={found.error}
        back={{ to: '/households', words: 'Households' }}
        onRetry={() => found.refetch()}
      />
    );
  const { household } = found.data;
  const back = `/households/${householdId}`;
  return (
    <>
      <PageHeader title={`Change ${household.name}`} back={{ to: back, words: household.name }} />
      <HouseholdForm
        household={household}
        saveWords="Save the household"
        onSave={async (body) => {
          await update.mutateAsync({ params: { householdId }, body });
          toast(`${body.name} is saved.`);
          navigate(back, { state: { saved: true } });
        }}
      />
    </>
  );
}
