import type { RunDetail } from '#shared/api/runs.ts';

export type EmergencyVet = RunDetail['emergencyVets'][number];

/** From Setup, kept on the phone with the run so that they are there without network. */
export function EmergencyVets({ vets }: { vets: readonly EmergencyVet[] }) {
  if (vets.length === 0) return null;
  return (
    <ul aria-label="Emergency vets">
      {vets.map((vet) => (
        <li key={vet.id} className="leading-snug">
          {vet.name}
          {vet.hoursWords && <span className="text-slate"> · {vet.hoursWords}</span>}
          {vet.phone && (
            <>
              {' '}
              <a className="text-link inline-flex min-h-12 items-center" href={`tel:${vet.phone}`}>
                call {vet.phone}
              </a>
            </>
          )}
        </li>
      ))}
    </ul>
  );
}
