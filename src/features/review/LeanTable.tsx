import { useState } from 'react';
import type { Review } from '#shared/api/review.ts';
import { Button } from '#src/components/Button.tsx';
import { leanWords } from './reviewWords.ts';

/** A lean of this much or more is worth a look. */
const notablePercent = 8;
const shownAtFirst = 6;

/** Largest leans first; the small ones wait behind a button. */
export function LeanTable({ leans }: { leans: Review['leans'] }) {
  const [all, setAll] = useState(false);
  if (leans.length === 0)
    return <p className="text-slate">Leans show once finished visits can be compared.</p>;
  const sorted = leans.toSorted(
    (a, b) => Math.abs(b.leanPermille) - Math.abs(a.leanPermille) || b.visits - a.visits,
  );
  return (
    <div
      className="-mx-2 overflow-x-auto"
      role="region"
      aria-label="Where forecasts lean"
      tabIndex={0}
    >
      <table className="plain">
        <thead>
          <tr>
            <th scope="col">Coat and style</th>
            {['visits', 'forecast', 'clock', 'lean'].map((words) => (
              <th key={words} scope="col" className={`num ${narrow(words)}`}>
                {words}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {sorted.slice(0, all ? undefined : shownAtFirst).map((lean) => {
            const far =
              Math.abs(Math.round(lean.leanPermille / 10)) >= notablePercent && lean.visits >= 3;
            return (
              <tr key={lean.coatStyle}>
                <td>{lean.coatStyle}</td>
                <td className="num">{lean.visits}</td>
                <td className={`num ${narrow('forecast')}`}>
                  {Math.round(lean.forecastSeconds / 60)}
                </td>
                <td className={`num ${narrow('clock')}`}>{Math.round(lean.clockSeconds / 60)}</td>
                <td className={`num ${far ? 'font-semibold text-rosette' : ''}`}>
                  {far && <span aria-hidden="true">▲ </span>}
                  {leanWords(lean.leanPermille)}
                </td>
              </tr>
            );
          })}
        </tbody>
      </table>
      {sorted.length > shownAtFirst && (
        <Button kind="quiet" size="small" className="mt-1" onClick={() => setAll(!all)}>
          {all ? 'Only the largest' : `All ${sorted.length}`}
        </Button>
      )}
    </div>
  );
}

/** On a phone the lean itself is enough. */
function narrow(column: string): string {
  return column === 'forecast' || column === 'clock' ? 'hidden sm:table-cell' : '';
}
