import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useParams, useSearchParams } from 'react-router-dom';
import { isLocalDate } from '#shared/time/localDate.ts';
import { householdQueries } from '#src/api/households.ts';
import { useToday } from '#src/api/session.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { PageHeader } from '#src/components/PageHeader.tsx';
import { BookVisitDialog } from '#src/features/booking/BookVisitDialog.tsx';
import { CancelVisitDialog } from '#src/features/booking/CancelVisitDialog.tsx';
import { DoorCard } from '#src/features/households/DoorCard.tsx';
import { HouseholdVisits } from '#src/features/households/HouseholdVisits.tsx';
import { PetCards } from '#src/features/households/PetCards.tsx';
import { FailedQuery } from './FailedQuery.tsx';

/** A household: door, people, pets, visits, and booking one. */
export function HouseholdScreen() {
  const householdId = useParams().householdId!;
  const today = useToday();
  const mayEdit = useCan('households.edit');
  const mayBook = useCan('visits.edit');
  const found = useQuery(householdQueries.one(householdId));
  const sites = useQuery(householdQueries.sites());
  // The day board sends people here to book on its date.
  const [search, setSearch] = useSearchParams();
  const wanted = search.get('book') ?? '';
  const bookOn = isLocalDate(wanted) && wanted >= today ? wanted : null;
  const [booking, setBooking] = useState(bookOn !== null);
  const [cancelling, setCancelling] = useState<{ id: string; date: string } | null>(null);
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
  const { household, pets, visits } = found.data;
  const site = sites.data?.find((one) => one.id === household.siteId) ?? null;
  const bookable = pets.filter((pet) => pet.active);
  return (
    <>
      <PageHeader
        title={household.name}
        dim={[household.addressLabel, site?.name].filter(Boolean).join(' · ')}
        back={{ to: '/households', words: 'Households' }}
        actions={
          <>
            {mayEdit && <ButtonLink to={`/households/${householdId}/edit`}>Change</ButtonLink>}
            {mayBook && bookable.length > 0 && (
              <Button kind="go" onClick={() => setBooking(true)}>
                Book a visit
              </Button>
            )}
          </>
        }
      />
      <div className="grid grid-cols-1 items-start gap-4 lg:grid-cols-[minmax(0,1.3fr)_minmax(0,1fr)] lg:gap-5">
        <div className="grid grid-cols-1 gap-4">
          <PetCards householdId={householdId} pets={pets} today={today} mayEdit={mayEdit} />
          <HouseholdVisits
            visits={visits}
            today={today}
            onCancel={mayBook ? setCancelling : null}
          />
        </div>
        <DoorCard household={household} site={site} />
      </div>
      {booking && mayBook && bookable.length > 0 && (
        <BookVisitDialog
          household={household}
          pets={bookable}
          today={today}
          date={bookOn}
          onClose={() => {
            setBooking(false);
            if (wanted) setSearch({}, { replace: true });
          }}
        />
      )}
      {cancelling && (
        <CancelVisitDialog
          visitId={cancelling.id}
          date={cancelling.date}
          householdName={household.name}
          onClose={() => setCancelling(null)}
        />
      )}
    </>
  );
}
