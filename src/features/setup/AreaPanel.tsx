import { useQuery } from '@tanstack/react-query';
import { businessQueries, useUpdateBusiness } from '#src/api/business.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { ReadOnlyNote } from './ReadOnlyNote.tsx';

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
        onSuccess: () => toast(`The vans now drive in ${areaName}.`),
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
                title={area.name}
                dim={`${area.addressCount.toLocaleString('en')} addresses`}
                aside={mine ? <Chip tone="ok">working area</Chip> : undefined}
              >
                <p className="text-slate">
                  {boundsWords(area.bounds)} · {area.attribution}
                </p>
                {!mine && mayEdit && (
                  <Button
                    size="small"
                    className="mt-3"
                    busy={update.isPending}
                    onClick={() => choose(area.name)}
                  >
                    Work in {area.name}
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
