import { PetStrip } from '#src/strips/PetStrip.tsx';
import { writeSpan } from '#src/lib/words.ts';
import type { RunStep } from './nextAction.ts';
import { sentenceCase } from './sentenceCase.ts';
import type { RunVisit } from './runView.ts';

/** The strip of the visit and, opened, each step's minutes with why; pet by pet. */
export function VisitMinutes({ visit }: { visit: RunVisit }) {
  const total = visit.steps.reduce((sum, step) => sum + step.meanSeconds, 0);
  if (total === 0) return null;
  const several = visit.pets.length > 1;
  const work = visit.pets.map((pet) => ({
    pet,
    steps: visit.steps.filter(({ petId }) => petId === pet.id),
  }));
  return (
    <section aria-label="Minutes of the visit" className="card px-4 pt-3 pb-1">
      {work.map(({ pet, steps }) => (
        <div key={pet.id}>
          {several && <p className="text-[15px] font-semibold">{pet.name}</p>}
          <PetStrip steps={steps} widthPx={330} label={`${pet.name}'s steps`} />
        </div>
      ))}
      <details>
        <summary className="flex min-h-12 items-center justify-between gap-3 font-medium">
          <span>
            <span aria-hidden="true">▸ </span>Steps and why
          </span>
          <span className="text-right">
            <b>{writeSpan(total)}</b>{' '}
            <span className="block text-[15px] leading-snug text-slate">
              8 in 10: {writeSpan(visit.p10Seconds)} – {writeSpan(visit.p90Seconds)}
            </span>
          </span>
        </summary>
        {work.map(({ pet, steps }) => (
          <div key={pet.id}>
            {several && <h3 className="pt-2 text-[15px] font-semibold">{pet.name}</h3>}
            <ul className="rows pb-2">
              {steps.map((step) => (
                <StepRow key={step.key} step={step} />
              ))}
            </ul>
          </div>
        ))}
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

function StepRow({ step }: { step: RunStep }) {
  // Reasons that round to nothing explain nothing.
  const reasons = step.reasons.filter(({ deltaSeconds }) => Math.abs(deltaSeconds) >= 30);
  return (
    <li className="py-2">
      <div className="flex justify-between gap-3">
        <span>{sentenceCase(step.label)}</span>
        <b className="whitespace-nowrap">{writeSpan(step.meanSeconds)}</b>
      </div>
      {reasons.map((reason) => (
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
  );
}
