import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { Place } from '#shared/api/places.ts';
import { placeQueries, useRemovePlace } from '#src/api/places.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { writeTime } from '#src/components/TimeField.tsx';
import { toast } from '#src/components/toast.ts';
import { PlaceDialog } from './PlaceDialog.tsx';
import { isRefill, placeKinds } from './placeKinds.ts';
import { ReadOnlyNote } from './ReadOnlyNote.tsx';

/** Where vans start, fill and empty, and which vet is open when something goes wrong. */
export function PlacesPanel() {
  const mayEdit = useCan('setup.edit');
  const places = useQuery(placeQueries.list());
  const [open, setOpen] = useState<Place | 'new' | null>(null);
  const [going, setGoing] = useState<Place | null>(null);
  if (places.isPending) return <Loading />;
  if (places.isError) return <ErrorNote error={places.error} onRetry={() => places.refetch()} />;
  const add = mayEdit && (
    <Button kind="go" onClick={() => setOpen('new')}>
      Add a place
    </Button>
  );
  return (
    <div className="max-w-4xl">
      {!mayEdit && <ReadOnlyNote />}
      {places.data.length === 0 && (
        <EmptyState title="No place yet" action={add}>
          Start with the depot: every van starts and ends somewhere. Then where fresh water comes
          from, and the emergency vet.
        </EmptyState>
      )}
      <div className="grid gap-4">
        {placeKinds
          .map((kind) => ({
            ...kind,
            places: places.data.filter((place) => place.kind === kind.value),
          }))
          .filter((kind) => kind.places.length > 0)
          .map((kind) => (
            <Card key={kind.value} title={kind.many}>
              <ul className="rows">
                {kind.places.map((place) => (
                  <li
                    key={place.id}
                    className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-2.5"
                  >
                    <PlaceLines place={place} />
                    {mayEdit && (
                      <div className="flex gap-2">
                        <Button size="small" onClick={() => setOpen(place)}>
                          Change<span className="sr-only"> {place.name}</span>
                        </Button>
                        <Button size="small" kind="quiet" onClick={() => setGoing(place)}>
                          Remove<span className="sr-only"> {place.name}</span>
                        </Button>
                      </div>
                    )}
                  </li>
                ))}
              </ul>
            </Card>
          ))}
      </div>
      {places.data.length > 0 && <div className="mt-4">{add}</div>}
      {open && <PlaceDialog place={open === 'new' ? null : open} onClose={() => setOpen(null)} />}
      {going && <RemovePlace place={going} onClose={() => setGoing(null)} />}
    </div>
  );
}

function PlaceLines({ place }: { place: Place }) {
  const allDay = place.opensMinutes === 0 && place.closesMinutes === 1440;
  const facts = [
    place.addressLabel,
    place.phone,
    place.kind === 'depot'
      ? null
      : allDay
        ? 'day and night'
        : `${writeTime(place.opensMinutes)}–${writeTime(place.closesMinutes)}`,
    isRefill(place.kind) ? `${place.lengthMinutes} min a stop` : null,
  ];
  return (
    <div className="min-w-0">
      <p className="font-semibold">{place.name}</p>
      <p className="text-slate">{facts.filter(Boolean).join(' · ')}</p>
    </div>
  );
}

function RemovePlace({ place, onClose }: { place: Place; onClose: () => void }) {
  const remove = useRemovePlace();
  return (
    <ConfirmDialog
      title={`Remove ${place.name}?`}
      confirm="Remove the place"
      keep="Keep it"
      busy={remove.isPending}
      error={remove.error}
      onClose={onClose}
      onConfirm={() =>
        remove.mutate(
          { params: { placeId: place.id } },
          {
            onSuccess: () => {
              toast(`${place.name} is removed.`);
              onClose();
            },
          },
        )
      }
    >
      Days already sent keep it. Vans that start or end here need another place first.
    </ConfirmDialog>
  );
}
