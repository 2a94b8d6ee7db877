import { stringify } from 'csv-stringify/sync';
import type { getReview } from './getReview.ts';

/** RFC 4180: one row per van and day, minutes and metres as whole numbers. */
export function reviewCsv(review: Pick<Awaited<ReturnType<typeof getReview>>, 'vanDays'>): string {
  const minutes = (seconds: number) => Math.round(seconds / 60);
  return stringify(
    review.vanDays.map((row) => ({
      date: row.date,
      // A name that begins like a formula must stay text in a spreadsheet.
      van: /^[=+\-@\t]/.test(row.vanName) ? `'${row.vanName}` : row.vanName,
      visits: row.visits,
      groomMinutes: minutes(row.groomSeconds),
      scissorMinutes: minutes(row.scissorSeconds),
      driveMinutes: minutes(row.driveSeconds),
      waitMinutes: minutes(row.waitSeconds),
      driveMetres: row.driveMetres,
      promises: row.promises,
      promisesKept: row.promisesKept,
    })),
    {
      header: true,
      record_delimiter: 'windows',
      columns: [
        'date',
        'van',
        'visits',
        'groomMinutes',
        'scissorMinutes',
        'driveMinutes',
        'waitMinutes',
        'driveMetres',
        'promises',
        'promisesKept',
      ],
    },
  );
}
