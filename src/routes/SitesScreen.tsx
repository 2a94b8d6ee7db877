import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { Site } from '#shared/api/households.ts';
import { householdQueries } from '#src/api/households.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { SiteDialog } from '#src/features/households/SiteDialog.tsx';
import { SiteList } from '#src/features/households/SiteList.tsx';

/** `/households/sites`: places several households share, with one gate, parking and set-up. */
export function SitesScreen() {
  const mayEdit = useCan('households.edit');
  const sites = useQuery(householdQueries.sites());
  const [open, setOpen] = useState<Site | 'new' | null>(null);
  const add = mayEdit && (
    <Button kind="go" onClick={() => setOpen('new')}>
      Add a site
    </Button>
  );
  return (
    <>
      <PageHeader
        title="Sites"
        dim="One gate, one parking, one set-up for several households"
        back={{ to: '/households', words: 'Households' }}
        actions={sites.data && sites.data.length > 0 ? add : undefined}
      />
      {sites.isError ? (
        <ErrorNote error={sites.error} onRetry={() => sites.refetch()} />
      ) : !sites.data ? (
        <Loading />
      ) : sites.data.length === 0 ? (
        <EmptyState title="No site yet" action={add}>
          A block or gated community whose households share a gate code and parking.
        </EmptyState>
      ) : (
        <SiteList sites={sites.data} onChange={mayEdit ? setOpen : null} />
      )}
      {open && (
        <SiteDialog
          site={open === 'new' ? null : open}
          onSaved={() => setOpen(null)}
          onClose={() => setOpen(null)}
        />
      )}
    </>
  );
}
