import { writeCount } from '#src/lib/words.ts';

/** Visits further back say little about the coat and hands of today. */
const LAST = 8;

/**
 * How the clock ran against the forecast over the last visits, newest first: "Last 5 visits: 8 %
 * longer than forecast, 6 min each." Under 3 % is as forecast.
 */
export function leanWords(
  past: readonly { forecastSeconds: number; clockSeconds: number }[],
): string {
  const last = past.slice(0, LAST);
  const sum = (of: 'forecastSeconds' | 'clockSeconds') =>
    last.reduce((total, visit) => total + visit[of], 0);
  const forecast = sum('forecastSeconds');
  if (forecast <= 0) return 'No visit with a forecast yet.';
  const share = sum('clockSeconds') / forecast - 1;
  const which = last.length === 1 ? 'Last visit' : `Last ${writeCount(last.length, 'visit')}`;
  if (Math.abs(share) < 0.03) return `${which}: as forecast.`;
  const minutes = Math.round(Math.abs(forecast * share) / last.length / 60);
  const each = last.length === 1 ? `${minutes} min` : `${minutes} min each`;
  const percent = Math.round(Math.abs(share) * 100);
  return `${which}: ${percent} % ${share > 0 ? 'longer' : 'shorter'} than forecast, ${each}.`;
}
