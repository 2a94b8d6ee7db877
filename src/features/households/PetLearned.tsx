import { useQuery } from '@tanstack/react-query';
import { learningQueries } from '#src/api/learning.ts';
import { Card } from '#src/components/Card.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { writeCount, writeSpan } from '#src/lib/words.ts';

/** What finished visits make of the forecast, in the words bookings get, and each groomer's pace. */
export function PetLearned({ petId, petName }: { petId: string; petName: string }) {
  const { data, error, isPending, refetch } = useQuery(learningQueries.pet(petId));
  if (isPending) return <Loading lines={3} />;
  if (error)
    return (
      <ErrorNote
        error={error}
        title="What was learned does not open"
        onRetry={() => void refetch()}
      />
    );
  if (data === null)
    return (
      <Card title="Learned">
        <p className="text-slate">
          Nothing learned yet: bookings use the plain forecast. Furlong learns every night from
          finished visits.
        </p>
      </Card>
    );
  return (
    <Card title="Learned" dim={`from ${writeCount(data.petVisits, 'visit')} of ${petName}`}>
      <p>
        Booked at <strong>{writeSpan(data.medianSeconds)}</strong>{' '}
        <span className="text-slate">
          · 8 in 10 between {writeSpan(data.p10Seconds)} and {writeSpan(data.p90Seconds)}
        </span>
      </p>
      <ul className="mt-1 text-slate">
        {data.words.map((words) => (
          <li key={words}>{words}</li>
        ))}
      </ul>
      {data.byGroomer.length > 0 && (
        <table className="plain mt-2">
          <caption className="sr-only">How long {petName} takes, by groomer</caption>
          <thead>
            <tr>
              <th scope="col" className="!pl-0">
                Groomer
              </th>
              <th scope="col" className="num !pr-0">
                {petName} takes
              </th>
            </tr>
          </thead>
          <tbody>
            {data.byGroomer.map(({ groomerName, medianSeconds, words }) => (
              <tr key={groomerName}>
                <td className="!pl-0">
                  {groomerName}
                  <span className="block text-sm text-slate">{words}</span>
                </td>
                <td className="num !pr-0 whitespace-nowrap">{writeSpan(medianSeconds)}</td>
              </tr>
            ))}
          </tbody>
        </table>
      )}
    </Card>
  );
}
