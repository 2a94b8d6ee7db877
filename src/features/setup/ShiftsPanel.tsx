import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Shift } from '#shared/api/groomers.ts';
import { addDays } from '#shared/time/localDate.ts';
import { weekOf } from '#shared/time/weekOf.ts';
import { groomerQueries } from '#src/api/groomers.ts';
import { useToday } from '#src/api/session.ts';
import { useCan } from '#src/api/sessionStore.ts';
import { vanQueries } from '#src/api/vans.ts';
import { Button } from '#src/components/Button.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { IconButton } from '#src/components/IconButton.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { writeDate } from '#src/lib/words.ts';
import { CopyWeek } from './CopyWeek.tsx';
import { ShiftDialog } from './ShiftDialog.tsx';
import { ShiftGrid } from './ShiftGrid.tsx';

/** Who drives which van when, a week at a time. */
export function ShiftsPanel() {
  const today = useToday();
  const mayEdit = useCan('shifts.edit');
  const [monday, setMonday] = useState(() => weekOf(today)[0]!);
  const dates = weekOf(monday);
  const vans = useQuery(vanQueries.list());
  const groomers = useQuery(groomerQueries.list());
  const shifts = useQuery(groomerQueries.shifts(dates[0]!, dates[6]!));
  const [open, setOpen] = useState<{ date: string; vanId: string; shift: Shift | null } | null>(
    null,
  );
  const failed = [vans, groomers, shifts].find((query) => query.isError);
  if (failed) return <ErrorNote error={failed.error} onRetry={() => failed.refetch()} />;
  if (!vans.data || !groomers.data) return <Loading />;
  if (vans.data.length === 0 || groomers.data.length === 0)
    return (
      <EmptyState title="A shift needs a van and a groomer">
        <Link to="/setup/vans" className="text-link">
          Vans
        </Link>
        {' · '}
        <Link to="/setup/groomers" className="text-link">
          Groomers
        </Link>
      </EmptyState>
    );
  return (
    <div>
      <div className="mb-4 flex flex-wrap items-center gap-2.5">
        <IconButton label="Week before" onClick={() => setMonday(addDays(monday, -7))}>
          <span aria-hidden="true">‹</span>
        </IconButton>
        <h2 className="min-w-[12.5rem] text-center text-base font-semibold" aria-live="polite">
          {writeDate(dates[0]!, 'short')} – {writeDate(dates[6]!, 'short')}
        </h2>
        <IconButton label="Week after" onClick={() => setMonday(addDays(monday, 7))}>
          <span aria-hidden="true">›</span>
        </IconButton>
        <Button size="small" onClick={() => setMonday(weekOf(today)[0]!)}>
          This week
        </Button>
        {mayEdit && shifts.data && <CopyWeek key={monday} monday={monday} present={shifts.data} />}
      </div>
      {shifts.data ? (
        <ShiftGrid
          dates={dates}
          today={today}
          vans={vans.data}
          groomers={groomers.data}
          shifts={shifts.data}
          onOpen={mayEdit ? (date, vanId, shift) => setOpen({ date, vanId, shift }) : null}
        />
      ) : (
        <Loading />
      )}
      {open && (
        <ShiftDialog
          {...open}
          dates={dates}
          vanName={vans.data.find((van) => van.id === open.vanId)?.name ?? ''}
          groomers={groomers.data}
          weekShifts={shifts.data ?? []}
          onClose={() => setOpen(null)}
        />
      )}
    </div>
  );
}
