import type { VisitCard } from '#shared/api/visits.ts';
import { writeDelta, writeSpan } from '#src/lib/words.ts';

/** Every step with its minutes and why it takes longer or shorter than usual. */
export function VisitSteps({ card }: { card: VisitCard }) {
  return (
    <div className="mt-1">
      {card.pets.map((pet) => {
        const steps = card.steps.filter((step) => step.petId === pet.id);
        if (steps.length === 0) return null;
        return (
          <section key={pet.id} className="mt-2">
            {card.pets.length > 1 && <h4 className="text-sm font-semibold">{pet.name}</h4>}
            <ul className="rows text-[15px]">
              {steps.map((step, index) => (
                <li key={`${step.key}-${index}`} className="py-1.5">
                  <p className="flex justify-between gap-4">
                    <span className="first-letter:uppercase">{step.label}</span>
                    <span className="shrink-0">{writeSpan(step.meanSeconds)}</span>
                  </p>
                  {weighty(step.reasons).length > 0 && (
                    <p className="text-sm text-slate">
                      {weighty(step.reasons)
                        .map((reason) => `${reason.text} ${writeDelta(reason.deltaSeconds)} min`)
                        .join(' · ')}
                    </p>
                  )}
                </li>
              ))}
            </ul>
          </section>
        );
      })}
    </div>
  );
}

/** Reasons that round to no minute explain nothing. */
function weighty<Reason extends { deltaSeconds: number }>(reasons: readonly Reason[]): Reason[] {
  return reasons.filter(({ deltaSeconds }) => Math.abs(deltaSeconds) >= 30);
}
