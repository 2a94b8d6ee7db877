import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Place } from '#shared/api/places.ts';
import type { Van } from '#shared/api/vans.ts';
import { placeQueries } from '#src/api/places.ts';
import { useCan, useSession } from '#src/api/sessionStore.ts';
import { useRetireVan, vanQueries } from '#src/api/vans.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { toast } from '#src/components/toast.ts';
import { writeWeight } from '#src/lib/measures.ts';
import { ReadOnlyNote } from './ReadOnlyNote.tsx';
import { tankWords } from './tankWords.ts';
import { VanDialog } from './VanDialog.tsx';

/** The vehicles: mark, places, tanks, table. */
export function VansPanel() {
  const mayEdit = useCan('setup.edit');
  const vans = useQuery(vanQueries.list());
  const places = useQuery(placeQueries.list());
  const [open, setOpen] = useState<Van | 'new' | null>(null);
  const [going, setGoing] = useState<Van | null>(null);
  if (vans.isPending || places.isPending) return <Loading />;
  if (vans.isError) return <ErrorNote error={vans.error} onRetry={() => vans.refetch()} />;
  if (places.isError) return <ErrorNote error={places.error} onRetry={() => places.refetch()} />;
  if (vans.data.length === 0 && places.data.length === 0)
    return (
      <EmptyState title="A van needs a place to start from">
        <Link to="/setup/places" className="text-link">
          Add the depot first
        </Link>
        , then come back.
      </EmptyState>
    );
  const add = mayEdit && (
    <Button kind="go" onClick={() => setOpen('new')}>
      Add a van
    </Button>
  );
  return (
    <div>
      {!mayEdit && <ReadOnlyNote />}
      {vans.data.length === 0 && (
        <EmptyState title="No van yet" action={add}>
          Its tanks and its table decide which visits fit a run.
        </EmptyState>
      )}
      <ul className="grid gap-4 md:grid-cols-2 xl:grid-cols-3">
        {vans.data.map((van) => (
          <li key={van.id}>
            <VanCard
              van={van}
              places={places.data}
              onChange={mayEdit ? () => setOpen(van) : null}
              onRetire={mayEdit ? () => setGoing(van) : null}
            />
          </li>
        ))}
      </ul>
      {vans.data.length > 0 && <div className="mt-4">{add}</div>}
      {open && (
        <VanDialog
          van={open === 'new' ? null : open}
          places={places.data}
          takenShapes={vans.data.filter((van) => van !== open).map((van) => van.shape)}
          onClose={() => setOpen(null)}
        />
      )}
      {going && <RetireVan van={going} onClose={() => setGoing(null)} />}
    </div>
  );
}

function VanCard({
  van,
  places,
  onChange,
  onRetire,
}: {
  van: Van;
  places: readonly Place[];
  onChange: (() => void) | null;
  onRetire: (() => void) | null;
}) {
  const { weightUnit } = useSession().business;
  const nameOf = (placeId: string) =>
    places.find((place) => place.id === placeId)?.name ?? 'a place no longer here';
  const facts: [string, string][] = [
    [
      'Drives from',
      van.startPlaceId === van.endPlaceId
        ? `${nameOf(van.startPlaceId)} and back`
        : `${nameOf(van.startPlaceId)} to ${nameOf(van.endPlaceId)}`,
    ],
    ...van.tanks.map(({ kind, capacityMl }): [string, string] => [
      tankWords[kind],
      `${Math.round(capacityMl / 1000)} L`,
    ]),
    ['Heaviest pet on the table', writeWeight(van.tableLimitGrams, weightUnit)],
  ];
  return (
    <Card
      className="h-full"
      title={
        <>
          <ShapeMark shape={van.shape} className="-mt-0.5 mr-2" />
          {van.name}
        </>
      }
    >
      <dl className="rows">
        {facts.map(([term, fact]) => (
          <div key={term} className="flex justify-between gap-4 py-1.5">
            <dt className="text-slate">{term}</dt>
            <dd className="text-right">{fact}</dd>
          </div>
        ))}
      </dl>
      {onChange && onRetire && (
        <div className="mt-3 flex gap-2">
          <Button size="small" onClick={onChange}>
            Change<span className="sr-only"> {van.name}</span>
          </Button>
          <Button size="small" kind="quiet" onClick={onRetire}>
            Take out of use<span className="sr-only">: {van.name}</span>
          </Button>
        </div>
      )}
    </Card>
  );
}

function RetireVan({ van, onClose }: { van: Van; onClose: () => void }) {
  const retire = useRetireVan();
  return (
    <ConfirmDialog
      title={`Take ${van.name} out of use?`}
      confirm="Take the van out of use"
      keep="Keep it"
      busy={retire.isPending}
      error={retire.error}
      onClose={onClose}
      onConfirm={() =>
        retire.mutate(
          { params: { vanId: van.id } },
          {
            onSuccess: () => {
              toast(`${van.name} is out of use.`);
              onClose();
            },
          },
        )
      }
    >
      Its past stays in the review. Remove or move its coming shifts first.
    </ConfirmDialog>
  );
}
