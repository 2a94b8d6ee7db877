import { useState } from 'react';
import { Link } from 'react-router-dom';
import type { VisitCard } from '#shared/api/visits.ts';
import type { DayProblem, StopTimes, VisitFact } from '#shared/schedule/types.ts';
import { Button } from '#src/components/Button.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { Dialog } from '#src/components/Dialog.tsx';
import { writeWeight, type WeightUnit } from '#src/lib/measures.ts';
import { writeSpan } from '#src/lib/words.ts';
import { PetStrip } from '#src/strips/PetStrip.tsx';
import { breedWords } from '#src/strips/petWords.ts';
import { CancelVisit } from './CancelVisit.tsx';
import { EditVisit } from './EditVisit.tsx';
import { VisitSteps } from './VisitSteps.tsx';
import { VisitTimes } from './VisitTimes.tsx';

/** One visit in full: who, when, the pets with their cautions, the minutes and why; and what to do. */
export function VisitDialog({
  problem,
  fact,
  card,
  stop,
  vanName,
  pinned,
  unit,
  canMove,
  canEdit,
  stays,
  pinning,
  onMove,
  onPin,
  onClose,
  onCancelled,
}: {
  problem: DayProblem;
  fact: VisitFact;
  card: VisitCard;
  stop: StopTimes | null;
  /** null: on no van. */
  vanName: string | null;
  pinned: boolean;
  unit: WeightUnit;
  canMove: boolean;
  canEdit: boolean;
  /** Why it cannot be moved, or null. */
  stays: string | null;
  pinning: boolean;
  onMove: () => void;
  onPin: (pin: boolean) => void;
  onClose: () => void;
  onCancelled: () => void;
}) {
  const [part, setPart] = useState<'look' | 'edit' | 'cancel'>('look');
  if (part === 'edit')
    return <EditVisit card={card} onBack={() => setPart('look')} onClose={onClose} />;
  if (part === 'cancel')
    return (
      <CancelVisit
        card={card}
        label={fact.label}
        onBack={() => setPart('look')}
        onCancelled={onCancelled}
      />
    );
  const movable = canMove && stays === null;
  const editable = canEdit && card.status === 'booked';
  return (
    <Dialog
      title={fact.label}
      wide
      onClose={onClose}
      actions={
        (movable || editable) && (
          <>
            {movable && (
              <Button kind="go" onClick={onMove}>
                Move …
              </Button>
            )}
            {movable && vanName && (
              <Button onClick={() => onPin(!pinned)} busy={pinning}>
                {pinned ? `Free from ${vanName}` : `Pin to ${vanName}`}
              </Button>
            )}
            {editable && (
              <>
                <Button onClick={() => setPart('edit')}>Change promise or note</Button>
                {stays === null && (
                  <Button kind="danger" onClick={() => setPart('cancel')}>
                    Cancel the visit
                  </Button>
                )}
              </>
            )}
          </>
        )
      }
    >
      <p className="-mt-1 text-slate">
        <Link className="text-link" to={`/households/${card.householdId}`}>
          {card.householdName}
        </Link>{' '}
        · {card.addressLabel}
        {card.siteName && ` · ${card.siteName}`}
      </p>
      <p className="text-slate">
        {card.phone ? (
          <>
            <a className="text-link" href={`tel:${card.phone}`}>
              {card.phone}
            </a>{' '}
            · {card.textsConsent ? 'agreed to texts' : 'no texts: call'}
          </>
        ) : (
          'No phone noted'
        )}
      </p>
      <VisitTimes problem={problem} fact={fact} stop={stop} vanName={vanName} pinned={pinned} />
      {stays && <p className="mt-1 text-slate">{stays}</p>}
      {card.note && (
        <p className="mt-2 rounded-[10px] bg-linen px-3 py-2 text-[15px] whitespace-pre-line">
          {card.note}
        </p>
      )}
      <ul className="rows mt-3">
        {card.pets.map((pet) => (
          <Pet key={pet.id} pet={pet} unit={unit} />
        ))}
      </ul>
      <h3 className="mt-3 flex items-baseline justify-between font-semibold">
        <span>Groom minutes</span>
        <span>
          {writeSpan(fact.work.meanSeconds)}{' '}
          <span className="font-medium text-slate">
            · 8 in 10 between {writeSpan(card.p10Seconds)} and {writeSpan(card.p90Seconds)}
          </span>
        </span>
      </h3>
      <div className="mt-2">
        <PetStrip
          steps={card.steps}
          widthPx={680}
          label={`Steps of ${fact.label}`}
          petNames={new Map(card.pets.map((pet) => [pet.id, pet.name]))}
        />
      </div>
      <VisitSteps card={card} />
    </Dialog>
  );
}

function Pet({ pet, unit }: { pet: VisitCard['pets'][number]; unit: WeightUnit }) {
  return (
    <li className="py-2.5">
      <p>
        <b>{pet.name}</b>{' '}
        <span className="text-slate">
          {breedWords(pet.breedName)}, {writeWeight(pet.weightGrams, unit)} · {pet.styleName}
          {pet.temperament !== 'calm' && ` · ${pet.temperament}`}
        </span>
      </p>
      {pet.styleNotes && <p className="text-[15px] text-slate">{pet.styleNotes}</p>}
      {(pet.cautions.length > 0 || pet.cautionNote !== '') && (
        <div className="mt-1.5 flex flex-wrap gap-1.5">
          {pet.cautions.map((caution) => (
            <Chip key={caution.key} tone={caution.stop ? 'bad' : 'heed'}>
              {caution.words}
            </Chip>
          ))}
          {pet.cautionNote && <Chip tone="heed">{pet.cautionNote}</Chip>}
        </div>
      )}
      {(pet.cautions.length > 0 || pet.cautionNote !== '') && pet.vetName && (
        <p className="mt-1 text-sm text-slate">
          In doubt ask the vet: {pet.vetName}
          {pet.vetPhone && (
            <>
              ,{' '}
              <a className="text-link" href={`tel:${pet.vetPhone}`}>
                {pet.vetPhone}
              </a>
            </>
          )}
        </p>
      )}
    </li>
  );
}
