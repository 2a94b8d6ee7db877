import type { z } from 'zod';
import { Link } from 'react-router-dom';
import type { listHouseholds } from '#shared/api/households.ts';
import { writeDate } from '#src/lib/words.ts';
import { breedWords } from '#src/strips/petWords.ts';

type Row = z.output<typeof listHouseholds.response>['households'][number];

/** A table at the desk, cards on a phone. */
export function HouseholdList({ households, year }: { households: readonly Row[]; year: number }) {
  const dateOf = (date: string | null) => (date ? writeDate(date, 'short', year) : '—');
  return (
    <>
      <div className="card hidden overflow-hidden md:block">
        <table className="plain">
          <thead>
            <tr>
              <th className="!pl-5">Household</th>
              <th>Pets</th>
              <th>Address</th>
              <th className="num">Last visit</th>
              <th className="num !pr-5">Next visit</th>
            </tr>
          </thead>
          <tbody>
            {households.map((row) => (
              <tr key={row.id} className="relative hover:bg-cream">
                <td className="!pl-5">
                  <Link
                    to={`/households/${row.id}`}
                    className="font-semibold text-ink no-underline after:absolute after:inset-0 hover:underline"
                  >
                    {row.name}
                  </Link>
                </td>
                <td>
                  <PetNames row={row} />
                </td>
                <td>
                  {row.addressLabel}
                  {row.siteName && <span className="text-slate"> · {row.siteName}</span>}
                </td>
                <td className="num text-slate">{dateOf(row.lastVisitDate)}</td>
                <td className={`num !pr-5 ${row.nextVisitDate ? '' : 'text-slate'}`}>
                  {dateOf(row.nextVisitDate)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      <ul className="grid gap-2.5 md:hidden">
        {households.map((row) => (
          <li key={row.id}>
            <Link
              to={`/households/${row.id}`}
              className="card block px-4 py-3 text-ink no-underline"
            >
              <span className="flex justify-between gap-3">
                <span className="font-semibold">{row.name}</span>
                <span className="shrink-0 text-[15px] text-slate">
                  {row.nextVisitDate ? dateOf(row.nextVisitDate) : 'nothing booked'}
                </span>
              </span>
              <span className="block">
                <PetNames row={row} />
              </span>
              <span className="block text-[15px] text-slate">
                {row.addressLabel}
                {row.siteName && ` · ${row.siteName}`}
              </span>
            </Link>
          </li>
        ))}
      </ul>
    </>
  );
}

function PetNames({ row }: { row: Row }) {
  if (row.pets.length === 0) return <span className="text-slate">no pet yet</span>;
  return row.pets.map((pet, index) => (
    <span key={pet.id}>
      {index > 0 && ', '}
      {pet.name} <span className="text-slate">{breedWords(pet.breedName)}</span>
    </span>
  ));
}
