import { PetStrip } from '#src/strips/PetStrip.tsx';
import { writeSpan } from '#src/lib/words.ts';
import { sentenceCase } from './sentenceCase.ts';
import type { RunVisit } from './runView.ts';

/** The strip of the visit and, opened, each step's minutes with why. */
export function VisitMinutes({ visit }: { visit: RunVisit }) {
  const total = visit.steps.reduce((sum, step) => sum + step.meanSeconds, 0);
  if (total === 0) return null;
  const names = new Map(visit.pets.map((pet) => [pet.id, pet.name]));
  return (
    <section aria-label="Minutes of the visit" className="card px-4 pt-3 pb-1">
      <PetStrip steps={visit.steps} petNames={names} widthPx={330} />
      <details>
        <summary className="flex min-h-12 items-center justify-between gap-3 font-medium">
          <span>
            <span aria-hidden="true">▸ </span>Steps and why
          </span>
          <span>
            <b>{writeSpan(total)}</b>{' '}
            <span className="text-slate">
              ({Math.round(visit.p10Seconds / 60)}–{writeSpan(visit.p90Seconds)})
            </span>
          </span>
        </summary>
        <ul className="rows pb-2">
          {visit.steps.map((step, index) => (
            <li key={index} className="py-2">
              <div className="flex justify-between gap-3">
                <span>
                  {visit.pets.length > 1 && (
                    <span className="text-slate">{names.get(step.petId)} · </span>
                  )}
                  {sentenceCase(step.label)}
                </span>
                <b className="whitespace-nowrap">{writeSpan(step.meanSeconds)}</b>
              </div>
              {step.reasons.map((reason) => (
                <p
                  key={reason.text}
                  className="flex justify-between gap-3 text-[15px] leading-snug text-slate"
                >
                  <span>{reason.text}</span>
                  <span className="whitespace-nowrap">
                    {reason.deltaSeconds < 0 ? '−' : '+'}
                    {writeSpan(Math.abs(reason.deltaSeconds))}
                  </span>
                </p>
              ))}
            </li>
          ))}
        </ul>
      </details>
      {visit.lastTime && (
        <p className="border-t border-linen py-2.5 text-[15px]">
          <span className="text-slate">Last time </span>
          {writeSpan(visit.lastTime.clockSeconds)}
          {visit.lastTime.note && `, ${visit.lastTime.note}`}
        </p>
      )}
    </section>
  );
}
