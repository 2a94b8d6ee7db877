import type { RunDetail } from '#shared/api/runs.ts';

export type EmergencyVet = RunDetail['emergencyVets'][number];

/** From Setup, kept on the phone with the run so that they are there without network. */
export function EmergencyVets({ vets }: { vets: readonly EmergencyVet[] }) {
  if (vets.length === 0) return null;
  return (
    <ul aria-label="Emergency vets" className="rows">
      {vets.map((vet) => (
        <li key={vet.id} className="flex items-center justify-between gap-3 py-1.5 leading-snug">
          <span>
            {vet.name}
            {vet.hoursWords && <span className="block text-[15px]">{vet.hoursWords}</span>}
          </span>
          {vet.phone && (
            <a
              className="inline-flex min-h-12 shrink-0 items-center rounded-[10px] border border-[var(--edge)] bg-white px-4 font-semibold text-ink no-underline"
              href={`tel:${vet.phone}`}
              aria-label={`Call ${vet.name}, ${vet.phone}`}
            >
              Call
            </a>
          )}
        </li>
      ))}
    </ul>
  );
}
