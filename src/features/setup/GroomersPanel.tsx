import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { Groomer } from '#shared/api/groomers.ts';
import { groomerQueries } from '#src/api/groomers.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { GroomerDialog } from './GroomerDialog.tsx';
import { ReadOnlyNote } from './ReadOnlyNote.tsx';

/** Who grooms, and what each may be given. */
export function GroomersPanel() {
  const mayEdit = useCan('setup.edit');
  const groomers = useQuery(groomerQueries.list());
  const [open, setOpen] = useState<Groomer | 'new' | null>(null);
  if (groomers.isPending) return <Loading />;
  if (groomers.isError)
    return <ErrorNote error={groomers.error} onRetry={() => groomers.refetch()} />;
  const add = mayEdit && (
    <Button kind="go" onClick={() => setOpen('new')}>
      Add a groomer
    </Button>
  );
  return (
    <div className="max-w-3xl">
      {!mayEdit && <ReadOnlyNote />}
      {groomers.data.length === 0 ? (
        <EmptyState title="No groomer yet" action={add}>
          Add whoever works in a van, yourself too.
        </EmptyState>
      ) : (
        <>
          <Card>
            <ul className="rows">
              {groomers.data.map((groomer) => (
                <li
                  key={groomer.id}
                  className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-2.5"
                >
                  <div>
                    <span className="font-semibold">{groomer.name}</span>{' '}
                    <span className="text-slate">
                      {groomer.active ? (groomer.userId ? 'signs in' : 'no sign-in yet') : 'away'}
                    </span>
                    <div className="mt-1 flex flex-wrap gap-1.5">
                      {groomer.skills.map((skill) => (
                        <Chip key={skill}>{skill}</Chip>
                      ))}
                    </div>
                  </div>
                  {mayEdit && (
                    <Button size="small" onClick={() => setOpen(groomer)}>
                      Change<span className="sr-only"> {groomer.name}</span>
                    </Button>
                  )}
                </li>
              ))}
            </ul>
          </Card>
          <div className="mt-4">{add}</div>
        </>
      )}
      {open && (
        <GroomerDialog groomer={open === 'new' ? null : open} onClose={() => setOpen(null)} />
      )}
    </div>
  );
}
