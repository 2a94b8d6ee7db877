import { Card } from '#src/components/Card.tsx';
import { writeDate, writeDelta, writeSpan } from '#src/lib/words.ts';

interface PastVisit {
  visitId: string;
  date: string;
  groomerName: string;
  forecastSeconds: number;
  clockSeconds: number;
}

/** What was forecast and what the clock said, newest first. */
export function PastVisits({ past, year }: { past: readonly PastVisit[]; year: number }) {
  if (past.length === 0) return null;
  return (
    <Card title="Forecast against the clock">
      <div
        className="overflow-x-auto"
        role="region"
        aria-label="Forecast against the clock"
        tabIndex={0}
      >
        <table className="plain">
          <thead>
            <tr>
              <th className="!pl-0">Visit</th>
              <th>Groomer</th>
              <th className="num">forecast</th>
              <th className="num">clock</th>
              <th className="num !pr-0">min</th>
            </tr>
          </thead>
          <tbody>
            {past.map((visit) => (
              <tr key={visit.visitId}>
                <td className="!pl-0">{writeDate(visit.date, 'short', year)}</td>
                <td>{visit.groomerName}</td>
                <td className="num">{writeSpan(visit.forecastSeconds)}</td>
                <td className="num">{writeSpan(visit.clockSeconds)}</td>
                <td className="num !pr-0">
                  {writeDelta(visit.clockSeconds - visit.forecastSeconds)}
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </Card>
  );
}
