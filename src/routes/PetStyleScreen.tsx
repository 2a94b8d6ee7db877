import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams } from 'react-router-dom';
import { petStyleQueries } from '#src/api/petStyles.ts';
import { styleQueries } from '#src/api/styles.ts';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { PetStyleForm } from '#src/features/styles/PetStyleForm.tsx';
import { FailedQuery } from './FailedQuery.tsx';
import { useKnownPet } from './useKnownPet.ts';

/** A pet's style to edit; saving makes its next version. */
export function PetStyleScreen() {
  const { householdId, petId } = useParams() as { householdId: string; petId: string };
  const navigate = useNavigate();
  const { found, facts } = useKnownPet(petId);
  const versions = useQuery(petStyleQueries.list(petId));
  const library = useQuery(styleQueries.list());
  const back = `/households/${householdId}/pets/${petId}`;
  const failed = [found, versions, library].find((query) => query.isError);
  if (failed)
    return (
      <FailedQuery
        title="This style does not open"
        error={failed.error}
        back={{ to: back, words: 'Pet' }}
        onRetry={() => failed.refetch()}
      />
    );
  if (!found.data || !versions.data || !library.data) return <Loading lines={8} />;
  const { pet } = found.data;
  return (
    <>
      <PageHeader title={`${pet.name}’s style`} back={{ to: back, words: pet.name }} />
      <PetStyleForm
        pet={pet}
        library={library.data}
        facts={facts ?? 'No forecast yet.'}
        version={versions.data[0]!.version}
        onSaved={() => navigate(back, { state: { saved: true } })}
      />
    </>
  );
}
