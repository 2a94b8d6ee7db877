import { Fragment } from 'react';
import type { SummaryWords } from './summaryWords.ts';

const tones = { plain: '', good: 'font-semibold text-collar', bad: 'font-semibold text-rosette' };

/** The day in one line: "3 vans, 17 visits — 12 h 05 grooming · 2 h 31 driving · …". */
export function DaySummary({ words, dim }: { words: SummaryWords; dim?: string | null }) {
  return (
    <div className="mt-3 mb-3 flex flex-wrap items-baseline gap-x-4 gap-y-0.5">
      <h1 className="text-[25px] leading-tight tracking-tight">{words.title}</h1>
      <p className="text-slate">
        {words.parts.map((part, index) => (
          <Fragment key={part.words}>
            {index > 0 && ' · '}
            <span className={`${tones[part.tone]} whitespace-nowrap`}>
              {part.tone === 'bad' && <span aria-hidden="true">▲ </span>}
              {part.words}
            </span>
          </Fragment>
        ))}
        {dim && (
          <span className="ml-2 inline-block rounded-md bg-linen px-2 py-0.5 text-sm">{dim}</span>
        )}
      </p>
    </div>
  );
}
