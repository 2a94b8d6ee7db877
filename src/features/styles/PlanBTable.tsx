import { planBOf } from '#shared/grooming/planB.ts';
import { regionWords } from '#shared/grooming/regionWords.ts';
import type { PlanBWord, Region, Service, Style } from '#shared/grooming/types.ts';
import { serviceWords } from './serviceWords.ts';

const words: readonly { word: PlanBWord; head: string; said: string }[] = [
  { word: 'must', head: 'must', said: 'must be done' },
  { word: 'ifAllowed', head: 'if the pet allows', said: 'if the pet allows' },
  { word: 'leave', head: 'leave', said: 'may be left' },
];

/** What stays of the style when the pet has had enough, one row for all it works on. */
export function PlanBTable({
  style,
  onPick,
}: {
  style: Style;
  onPick: (part: 'services' | 'regions', key: Region | Service, word: PlanBWord) => void;
}) {
  const planB = planBOf(style);
  const rows = [
    ...Object.entries(planB.services).map(([key, word]) => ({
      part: 'services' as const,
      key: key as Service,
      name: serviceWords[key as Service],
      word,
    })),
    ...Object.entries(planB.regions).map(([key, word]) => ({
      part: 'regions' as const,
      key: key as Region,
      name: regionWords([key as Region]),
      word,
    })),
  ];
  if (rows.length === 0)
    return <p className="text-slate">Nothing to do yet: choose services or cuts first.</p>;
  return (
    <table className="w-full border-collapse">
      <thead>
        <tr className="text-sm text-slate">
          <th className="py-1 text-left font-medium">Part</th>
          {words.map(({ word, head }) => (
            <th key={word} className="w-20 px-1 py-1 text-center font-medium">
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => (
          <tr key={`${row.part}/${row.key}`} className="border-t border-linen">
            <th scope="row" className="py-0.5 text-left font-normal">
              {row.name}
            </th>
            {words.map(({ word, said }) => (
              <td key={word} className="text-center">
                <label className="inline-grid min-h-10 min-w-11 cursor-pointer place-items-center">
                  <input
                    type="radio"
                    name={`plan-b-${row.part}-${row.key}`}
                    className="size-5 accent-collar"
                    checked={row.word === word}
                    aria-label={`${row.name}: ${said}`}
                    onChange={() => onPick(row.part, row.key, word)}
                  />
                </label>
              </td>
            ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
