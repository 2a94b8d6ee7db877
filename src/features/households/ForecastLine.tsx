import { summaryWords } from '#shared/grooming/explain.ts';
import type { PetFacts, Style } from '#shared/grooming/types.ts';
import { tryForecast } from './tryForecast.ts';

/** On a phone the whole forecast stands below the form; its sum keeps up here. */
export function ForecastLine({ facts, style }: { facts: PetFacts | string; style: Style | null }) {
  const forecast = tryForecast(facts, style);
  if (typeof forecast === 'string') return null;
  return (
    <a
      href="#what-it-takes"
      className="sticky bottom-[4.25rem] z-20 block rounded-card border border-fawn bg-linen px-4 py-3 text-ink no-underline md:bottom-3 lg:hidden"
    >
      <span className="font-semibold">What it takes</span> {summaryWords(forecast)}
    </a>
  );
}
