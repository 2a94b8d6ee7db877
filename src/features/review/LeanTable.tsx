import type { Review } from '#shared/api/review.ts';
import { leanWords } from './reviewWords.ts';

/** A lean of this much or more is worth a look. */
const notablePercent = 8;

export function LeanTable({ leans }: { leans: Review['leans'] }) {
  if (leans.length === 0)
    return <p className="text-slate">Leans show once finished visits can be compared.</p>;
  const sorted = leans.toSorted(
    (a, b) => Math.abs(b.leanPermille) - Math.abs(a.leanPermille) || b.visits - a.visits,
  );
  return (
    <div className="-mx-2 overflow-x-auto">
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
          {sorted.map((lean) => {
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
    </div>
  );
}

/** On a phone the lean itself is enough. */
function narrow(column: string): string {
  return column === 'forecast' || column === 'clock' ? 'hidden sm:table-cell' : '';
}
