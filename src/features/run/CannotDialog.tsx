import { Fragment, useState } from 'react';
import type { CannotReason } from '#shared/api/runs.ts';
import { Button } from '#src/components/Button.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { TextArea } from '#src/components/TextArea.tsx';
import { cannotReasons } from './cannotReasons.ts';
import { EmergencyVets, type EmergencyVet } from './EmergencyVets.tsx';
import type { RunStop, RunVisit } from './runView.ts';

/** Why a stop cannot be done. An unwell pet brings the vets' numbers before anything else. */
export function CannotDialog({
  stop,
  emergencyVets,
  onConfirm,
  onClose,
}: {
  stop: RunStop;
  emergencyVets: readonly EmergencyVet[];
  onConfirm: (reason: CannotReason, note: string) => void;
  onClose: () => void;
}) {
  const [reason, setReason] = useState<CannotReason | null>(null);
  const [note, setNote] = useState('');
  const visit = stop.visit;
  const offered = visit
    ? cannotReasons
    : cannotReasons.filter(({ reason: one }) => notVisits.has(one));
  return (
    <Dialog
      title={`Can't do ${visit ? visit.pets.map(({ name }) => name).join(' & ') : stop.title.toLowerCase()}`}
      onClose={onClose}
      actions={
        <Button
          kind="danger"
          size="big"
          disabled={!reason}
          onClick={() => reason && onConfirm(reason, note.trim())}
        >
          {reason ? 'Leave undone · tell the desk' : 'Pick what is in the way'}
        </Button>
      }
    >
      <fieldset>
        <legend className="sr-only">What is in the way</legend>
        <div className="grid gap-1.5">
          {offered.map((one) => (
            <Fragment key={one.reason}>
              <label className="flex min-h-12 cursor-pointer items-center gap-3 rounded-[10px] border border-fawn px-3 py-1.5 leading-snug has-checked:border-collar has-checked:bg-collar-soft has-checked:font-semibold has-focus-visible:outline-3 has-focus-visible:outline-collar">
                <input
                  type="radio"
                  name="reason"
                  className="size-5 shrink-0 accent-collar"
                  checked={reason === one.reason}
                  onChange={() => setReason(one.reason)}
                />
                {one.words}
              </label>
              {one.reason === 'unwellPet' && reason === 'unwellPet' && visit && (
                <VetFirst visit={visit} emergencyVets={emergencyVets} />
              )}
            </Fragment>
          ))}
        </div>
      </fieldset>
      <TextArea
        className="mt-3"
        label="Note for the desk"
        required={false}
        value={note}
        maxLength={2000}
        rows={2}
        onChange={(event) => setNote(event.target.value)}
      />
    </Dialog>
  );
}

/** Whom to call, right where the finger is: before the stop is closed. */
function VetFirst({
  visit,
  emergencyVets,
}: {
  visit: RunVisit;
  emergencyVets: readonly EmergencyVet[];
}) {
  return (
    <div role="alert" className="rounded-[10px] bg-rosette-soft px-4 py-3">
      <p className="font-semibold text-[#8f2826]">
        ▲ Do not start. Call the household, and a vet if the pet is in trouble.
      </p>
      {visit.pets
        .filter(({ vetPhone }) => vetPhone)
        .map((pet) => (
          <p key={pet.id}>
            {pet.name}’s vet{pet.vetName && ` ${pet.vetName}`}:{' '}
            <a className="text-link inline-flex min-h-12 items-center" href={`tel:${pet.vetPhone}`}>
              {pet.vetPhone}
            </a>
          </p>
        ))}
      <EmergencyVets vets={emergencyVets} />
    </div>
  );
}

/** What can stand in the way of a refill or a meal. */
const notVisits = new Set<CannotReason>(['gateShut', 'nowhereToPark', 'gear', 'groomerUnwell']);
