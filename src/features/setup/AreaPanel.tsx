import { lazy, Suspense } from 'react';
import { useQuery } from '@tanstack/react-query';
import { businessQueries, useUpdateBusiness } from '#src/api/business.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { CatchBoundary } from '#src/components/CatchBoundary.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { ReadOnlyNote } from './ReadOnlyNote.tsx';

const AreaMap = lazy(async () => ({
  default: (await import('#src/map/AreaMap.tsx')).AreaMap,
}));

/** Which of the server's maps the vans drive on. */
export function AreaPanel() {
  const mayEdit = useCan('business.edit');
  const areas = useQuery(businessQueries.areas());
  const business = useQuery(businessQueries.one());
  const update = useUpdateBusiness();
  if (areas.isPending || business.isPending) return <Loading />;
  if (areas.isError) return <ErrorNote error={areas.error} onRetry={() => areas.refetch()} />;
  if (business.isError)
    return <ErrorNote error={business.error} onRetry={() => business.refetch()} />;
  if (areas.data.length === 0)
    return (
      <EmptyState title="No map is on this server yet">
        Ask whoever runs the server to import an area. Until then driving is estimated from straight
        lines and marked rough.
      </EmptyState>
    );
  const choose = (areaName: string) =>
    update.mutate(
      { body: { areaName } },
      {
        onSuccess: () => toast(`The vans now drive in ${areaWords(areaName)}.`),
        onError: (error) => toast(errorWords(error), 'bad'),
      },
    );
  return (
    <>
      {!mayEdit && <ReadOnlyNote />}
      <ul className="grid max-w-3xl gap-4">
        {areas.data.map((area) => {
          const mine = area.name === business.data.areaName;
          return (
            <li key={area.name}>
              <Card
                title={areaWords(area.name)}
                dim={`${area.addressCount.toLocaleString('en')} addresses`}
                aside={mine ? <Chip tone="ok">working area</Chip> : undefined}
              >
                <p className="text-slate">{boundsWords(area.bounds)}</p>
                {mine && (
                  <CatchBoundary instead={<p className="mt-2">The map could not be loaded.</p>}>
                    <Suspense fallback={<Loading words="Loading the map" />}>
                      <AreaMap
                        areaName={area.name}
                        version={area.version}
                        bounds={area.bounds}
                        attribution={area.attribution}
                        label={`Map of ${areaWords(area.name)}`}
                        className="mt-3 h-80 overflow-hidden rounded-card border border-fawn"
                      />
                    </Suspense>
                  </CatchBoundary>
                )}
                {!mine && mayEdit && (
                  <Button
                    size="small"
                    className="mt-3"
                    busy={update.isPending}
                    onClick={() => choose(area.name)}
                  >
                    Work in {areaWords(area.name)}
                  </Button>
                )}
              </Card>
            </li>
          );
        })}
      </ul>
    </>
  );
}

function boundsWords([west, south, east, north]: [number, number, number, number]): string {
  return `${south.toFixed(2)}° to ${north.toFixed(2)}° latitude, ${west.toFixed(2)}° to ${east.toFixed(2)}° longitude`;
}

/** 'pellan-bay' → 'Pellan Bay': areas are named for folders. */
function areaWords(name: string): string {
  return name
    .split(/[-_ ]+/)
    .map((part) => part.charAt(0).toUpperCase() + part.slice(1))
    .join(' ');
}
