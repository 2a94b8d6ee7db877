import { useRef } from 'react';
import { Link } from 'react-router-dom';
import { addDays } from '#shared/time/localDate.ts';
import { writeDate } from '#src/lib/words.ts';
import { useTitle } from '#src/lib/useTitle.ts';
import { buttonLook } from '#src/components/buttonLook.ts';

/** Which day it is, and the days around it. */
export function DayNav({
  date,
  today,
  onDate,
}: {
  date: string;
  today: string;
  onDate: (date: string) => void;
}) {
  const words = writeDate(date, 'long', Number(today.slice(0, 4)));
  const picker = useRef<HTMLInputElement>(null);
  useTitle(words);
  return (
    <nav aria-label="Day" className="flex items-center gap-2">
      <RoundLink to={`/day/${addDays(date, -1)}`} label="Day before">
        ‹
      </RoundLink>
      <span className="relative">
        <button
          type="button"
          className="min-h-11 rounded-lg px-1.5 font-semibold whitespace-nowrap hover:bg-linen md:min-h-9.5"
          aria-label={`${words}. Choose another day`}
          onClick={() => {
            picker.current?.showPicker?.();
            picker.current?.focus();
          }}
        >
          {words}
        </button>
        <input
          ref={picker}
          type="date"
          tabIndex={-1}
          aria-hidden="true"
          className="pointer-events-none absolute inset-x-0 bottom-0 h-px w-full opacity-0"
          value={date}
          onChange={(event) => {
            if (event.target.value) onDate(event.target.value);
          }}
        />
      </span>
      <RoundLink to={`/day/${addDays(date, 1)}`} label="Day after">
        ›
      </RoundLink>
      {date !== today && (
        <Link to="/day" className={`${buttonLook('plain', 'small')} rounded-full no-underline`}>
          Today
        </Link>
      )}
    </nav>
  );
}

function RoundLink({ to, label, children }: { to: string; label: string; children: string }) {
  return (
    <Link
      to={to}
      aria-label={label}
      title={label}
      className="inline-grid size-11 shrink-0 place-items-center rounded-full border border-fawn bg-white text-lg leading-none text-ink no-underline hover:bg-linen md:size-9.5"
    >
      <span aria-hidden="true" className="-mt-0.5">
        {children}
      </span>
    </Link>
  );
}
