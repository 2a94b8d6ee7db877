import type { Review } from '#shared/api/review.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { ShapeMark } from '#src/components/ShapeMark.tsx';
import { writeDistance } from '#src/lib/measures.ts';
import { groomPerDrive, hoursWords, keptWords } from './reviewWords.ts';

/** The week by van. Vans, never people, stand side by side here. */
export function VanTable({ vans }: { vans: Review['vans'] }) {
  const unit = useSession().business.distanceUnit;
  return (
    <div className="-mx-2 overflow-x-auto" role="region" aria-label="Van by van" tabIndex={0}>
      <table className="plain">
        <thead>
          <tr>
            <th scope="col">Van</th>
            {[
              'visits',
              'grooming',
              'driving',
              'waiting',
              'distance',
              'per hour driven',
              'as promised',
            ].map((words) => (
              <th key={words} scope="col" className="num">
                {words}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {vans.map((van) => (
            <tr key={van.vanId}>
              <th
                scope="row"
                className="border-t border-linen !text-base !font-semibold whitespace-nowrap !text-ink"
              >
                <ShapeMark shape={van.shape} /> {van.vanName}
              </th>
              <td className="num">{van.visits}</td>
              <td className="num">{hoursWords(van.groomSeconds)}</td>
              <td className="num">{hoursWords(van.driveSeconds)}</td>
              <td className="num">{hoursWords(van.waitSeconds)}</td>
              <td className="num">{writeDistance(van.driveMetres, unit)}</td>
              <td className="num">{groomPerDrive(van) ?? '–'} h</td>
              <td className="num">{keptWords(van) ?? 'none promised'}</td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
