import type { ReactNode } from 'react';
import { GateCode } from './GateCode.tsx';
import type { RunStop } from './runView.ts';

/** Where to park, how to get in, whom to call: what is needed at the kerb. */
export function KerbCard({ stop }: { stop: RunStop }) {
  const { visit, place } = stop;
  if (!visit && !place && !stop.addressLabel) return null;
  return (
    <section aria-label="At the kerb" className="card px-4 py-3">
      <p className="leading-snug">
        <b className="text-[17px]">{stop.addressLabel || stop.title}</b>
        {visit?.siteName && <span> · {visit.siteName}</span>}
      </p>
      {visit?.siteParkingNotes && <Line word="Parking">{visit.siteParkingNotes}</Line>}
      {visit?.accessNotes && <Line word="Way in">{visit.accessNotes}</Line>}
      {visit?.handoverNotes && <Line word="Handover">{visit.handoverNotes}</Line>}
      {visit?.note && <Line word="Note">{visit.note}</Line>}
      <div className="mt-2.5 flex flex-wrap items-start gap-2">
        {visit?.hasGateCode && <GateCode key={visit.householdId} householdId={visit.householdId} />}
        {visit?.phone && (
          <Call phone={visit.phone} name={visit.contactName || visit.householdName} />
        )}
        {visit?.secondContactPhone && (
          <Call
            phone={visit.secondContactPhone}
            name={visit.secondContactName || 'second contact'}
          />
        )}
        {place?.phone && <Call phone={place.phone} name={place.name} />}
      </div>
    </section>
  );
}

function Line({ word, children }: { word: string; children: ReactNode }) {
  return (
    <p className="mt-1.5 leading-snug">
      <span className="text-slate">{word}: </span>
      {children}
    </p>
  );
}

function Call({ phone, name }: { phone: string; name: string }) {
  return (
    <a
      href={`tel:${phone}`}
      className="inline-flex min-h-12 items-center rounded-[10px] border border-[var(--edge)] bg-white px-4 font-semibold text-ink no-underline"
    >
      Call {name}
    </a>
  );
}
