import type { Groomer, Shift } from '#shared/api/groomers.ts';
import type { Van } from '#shared/api/vans.ts';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { writeTime } from '#src/components/TimeField.tsx';
import { writeDate } from '#src/lib/words.ts';

interface ShiftGridProps {
  dates: readonly string[];
  today: string;
  vans: readonly Van[];
  groomers: readonly Groomer[];
  shifts: readonly Shift[];
  /** null: look only. */
  onOpen: ((date: string, vanId: string, shift: Shift | null) => void) | null;
}

/** Vans by days. On a phone the days stand below each other, each with its vans. */
export function ShiftGrid(props: ShiftGridProps) {
  return (
    <>
      <div className="card hidden overflow-x-auto md:block">
        <table className="w-full table-fixed border-collapse">
          <thead>
            <tr>
              <th className="w-32 px-4 py-2.5 text-left text-[13px] font-medium text-slate">Van</th>
              {props.dates.map((date) => (
                <th
                  key={date}
                  scope="col"
                  aria-current={date === props.today ? 'date' : undefined}
                  className={`px-2 py-2.5 text-left text-[13px] ${
                    date === props.today ? 'font-bold text-ink' : 'font-medium text-slate'
                  }`}
                >
                  {writeDate(date, 'short')}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {props.vans.map((van) => (
              <tr key={van.id} className="border-t border-linen">
                <th scope="row" className="px-4 py-2 text-left font-semibold">
                  <ShapeMark shape={van.shape} className="mr-2" />
                  {van.name}
                </th>
                {props.dates.map((date) => (
                  <td key={date} className="p-1 align-top">
                    <ShiftCell {...props} van={van} date={date} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <ul className="grid gap-3 md:hidden">
        {props.dates.map((date) => (
          <li key={date} className="card px-4 py-3">
            <h3 className="mb-1 text-[15px] font-semibold">
              {writeDate(date)}
              {date === props.today && <span className="font-normal text-slate"> · today</span>}
            </h3>
            {props.vans.map((van) => (
              <div key={van.id} className="flex items-center gap-3 py-1">
                <span className="w-24 shrink-0 truncate">
                  <ShapeMark shape={van.shape} className="mr-2" />
                  {van.name}
                </span>
                <ShiftCell {...props} van={van} date={date} />
              </div>
            ))}
          </li>
        ))}
      </ul>
    </>
  );
}

function ShiftCell({
  van,
  date,
  groomers,
  shifts,
  onOpen,
}: ShiftGridProps & { van: Van; date: string }) {
  const shift = shifts.find((one) => one.vanId === van.id && one.date === date) ?? null;
  const groomer = groomers.find((one) => one.id === shift?.groomerId)?.name ?? 'someone';
  const words = shift ? (
    <>
      <span className="block font-semibold">{groomer}</span>
      <span className="block text-sm">
        {writeTime(shift.startMinutes)}–{writeTime(shift.endMinutes)}
      </span>
      {shift.meal && <span className="block text-[13px]">meal {shift.meal.lengthMinutes} min</span>}
    </>
  ) : (
    <span className="text-slate">{onOpen ? '+ hours' : 'free'}</span>
  );
  const look = `block min-h-11 w-full rounded-[10px] px-2.5 py-1.5 text-left ${
    shift ? 'bg-collar-soft' : 'border border-dashed border-fawn'
  }`;
  if (!onOpen) return <div className={look}>{words}</div>;
  return (
    <button
      type="button"
      className={`${look} ${shift ? 'hover:bg-[#c6dcd5]' : 'hover:bg-linen'}`}
      onClick={() => onOpen(date, van.id, shift)}
    >
      <span className="sr-only">
        {van.name}, {writeDate(date)}:{' '}
      </span>
      {words}
      <span className="sr-only">{shift ? '. Change the shift' : '. Add a shift'}</span>
    </button>
  );
}
