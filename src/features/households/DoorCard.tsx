import type { Household, Site } from '#shared/api/households.ts';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { GateCode } from './GateCode.tsx';

/** Who to ask for, how to get in, who may hand over. */
export function DoorCard({ household, site }: { household: Household; site: Site | null }) {
  const people: [string, string | null][] = [
    [household.contactName, household.phone],
    [household.secondContactName, household.secondContactPhone],
  ];
  const notes: [string, string][] = [
    ['Access', household.accessNotes],
    ['Handing over', household.handoverNotes],
    [`Parking at ${site?.name ?? 'the site'}`, site?.parkingNotes ?? ''],
  ];
  return (
    <div className="grid gap-4">
      <Card title="People">
        <ul className="rows">
          {people
            .filter(([name, phone]) => name || phone)
            .map(([name, phone], index) => (
              <li key={index} className="flex flex-wrap justify-between gap-x-4 py-2">
                <span>{name || 'second contact'}</span>
                {phone ? (
                  <a href={`tel:${phone}`} className="text-link">
                    {phone}
                  </a>
                ) : (
                  <span className="text-slate">no phone</span>
                )}
              </li>
            ))}
        </ul>
        <div className="mt-2">
          {household.textsConsent && household.phone ? (
            <Chip tone="ok">agreed to texts</Chip>
          ) : (
            <Chip tone="heed">no texts: {household.phone ? 'not agreed' : 'no phone'}</Chip>
          )}
        </div>
      </Card>
      <Card title="At the door">
        <dl className="grid gap-3">
          {notes
            .filter(([, words]) => words)
            .map(([term, words]) => (
              <div key={term}>
                <dt className="text-sm text-slate">{term}</dt>
                <dd className="whitespace-pre-line">{words}</dd>
              </div>
            ))}
        </dl>
        {notes.every(([, words]) => !words) && <p className="text-slate">Nothing noted yet.</p>}
        {(household.hasGateCode || site?.hasGateCode) && (
          <div className="mt-3 border-t border-linen pt-3">
            <GateCode householdId={household.id} />
          </div>
        )}
      </Card>
    </div>
  );
}
