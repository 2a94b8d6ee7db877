import type { Offer } from '#shared/api/forecasts.ts';
import { writeTime } from '#src/components/TimeField.tsx';
import { writeDate } from '#src/lib/words.ts';

/** The earliest windows, each with its van, what it costs in driving and how surely it is kept. */
export function OfferList({
  offers,
  noOfferWords,
  fresh,
}: {
  offers: readonly Offer[];
  noOfferWords: string | null;
  fresh: boolean;
}) {
  if (offers.length === 0) return <p className="mt-3">{noOfferWords ?? 'No window found.'}</p>;
  return (
    <ol className={`rows mt-2 ${fresh ? '' : 'opacity-60'}`} aria-label="Earliest windows">
      {offers.map((offer) => (
        <li
          key={`${offer.date} ${offer.vanId} ${offer.startMinutes}`}
          className="flex flex-wrap items-baseline justify-between gap-x-4 py-2.5"
        >
          <span>
            <b className="font-semibold">{writeDate(offer.date, 'short')}</b>{' '}
            {writeTime(offer.startMinutes)}–{writeTime(offer.endMinutes)}
            <span className="block text-sm text-slate">
              {offer.vanName}, {offer.groomerName} · {keptWords(offer)}
            </span>
          </span>
          <span className="font-semibold text-collar">{drivingWords(offer)}</span>
        </li>
      ))}
    </ol>
  );
}

/** "kept 94 in 100", and the least of the promises after it when that is less. */
function keptWords({ onTimePermille, othersOnTimePermille }: Offer): string {
  const kept = `kept ${inHundred(onTimePermille)} in 100`;
  if (othersOnTimePermille === null || othersOnTimePermille >= onTimePermille) return kept;
  return `${kept}, those after it ${inHundred(othersOnTimePermille)}`;
}

function drivingWords({ driveSecondsMore, rough }: Offer): string {
  const minutes = Math.round(driveSecondsMore / 60);
  const words = minutes > 0 ? `${minutes} min more driving` : 'no more driving';
  return rough ? `${words}, rough` : words;
}

/** Never a promise of certainty. */
function inHundred(permille: number): number {
  return Math.min(99, Math.round(permille / 10));
}
