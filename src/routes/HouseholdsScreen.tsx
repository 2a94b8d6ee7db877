import { useCallback } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router-dom';
import { householdQueries } from '#src/api/households.ts';
import { useToday } from '#src/api/session.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { Pager } from '#src/components/Pager.tsx';
import { SearchBox } from '#src/components/SearchBox.tsx';
import { HouseholdList } from '#src/features/households/HouseholdList.tsx';
import { writeCount } from '#src/lib/words.ts';

/** Every household, found by name, pet, street or phone; the address keeps the search. */
export function HouseholdsScreen() {
  const [params, setParams] = useSearchParams();
  const text = params.get('text') ?? '';
  const page = Math.max(1, Math.floor(Number(params.get('page'))) || 1);
  const mayEdit = useCan('households.edit');
  const year = Number(useToday().slice(0, 4));
  const found = useQuery(householdQueries.list(text, page));
  const search = useCallback(
    (next: string) => setParams(next ? { text: next } : {}, { replace: true }),
    [setParams],
  );
  const goTo = (next: number) => {
    setParams({ ...(text ? { text } : {}), page: String(next) });
    window.scrollTo({ top: 0 });
  };
  const add = mayEdit && (
    <ButtonLink to="/households/new" kind="go">
      Add a household
    </ButtonLink>
  );
  const actions = (
    <>
      <ButtonLink to="/households/sites">Sites</ButtonLink>
      {add}
    </>
  );
  return (
    <>
      <PageHeader
        title="Households"
        dim={
          found.data &&
          writeCount(found.data.total, text ? 'match' : 'household', text ? 'matches' : undefined)
        }
        actions={actions}
      />
      <SearchBox
        label="Search by name, pet, street or phone"
        value={text}
        onSearch={search}
        className="mb-4 max-w-lg"
      />
      {found.isError ? (
        <ErrorNote error={found.error} onRetry={() => found.refetch()} />
      ) : !found.data ? (
        <Loading lines={8} />
      ) : found.data.households.length === 0 ? (
        text ? (
          <EmptyState title={`Nothing matches “${text}”`}>
            Try fewer letters, the pet&apos;s name, or the last digits of the phone.
          </EmptyState>
        ) : (
          <EmptyState title="No household yet" action={add}>
            A household is an address with people and pets: where the van parks.
          </EmptyState>
        )
      ) : (
        <div
          aria-busy={found.isPlaceholderData}
          className={found.isPlaceholderData ? 'opacity-60' : ''}
        >
          <HouseholdList households={found.data.households} year={year} />
          <Pager
            page={found.data.page}
            pageSize={found.data.pageSize}
            total={found.data.total}
            onPage={goTo}
          />
        </div>
      )}
    </>
  );
}
