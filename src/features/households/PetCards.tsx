import { Link } from 'react-router-dom';
import type { Pet } from '#shared/api/pets.ts';
import { findCaution } from '#shared/grooming/cautions.ts';
import { explain } from '#shared/grooming/explain.ts';
import { forecastPet } from '#shared/grooming/forecastPet.ts';
import type { CautionKey } from '#shared/grooming/types.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { ButtonLink } from '#src/components/ButtonLink.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { EmptyState } from '#src/components/EmptyState.tsx';
import { writeWeight } from '#src/lib/measures.ts';
import { PetStrip } from '#src/strips/PetStrip.tsx';
import { breedWords } from '#src/strips/petWords.ts';
import { petFactsOf } from './petFactsOf.ts';

/** Every pet with its minutes as a strip; those that rest stand last and faint. */
export function PetCards({
  householdId,
  pets,
  today,
  mayEdit,
}: {
  householdId: string;
  pets: readonly Pet[];
  today: string;
  mayEdit: boolean;
}) {
  const add = mayEdit && (
    <ButtonLink
      to={`/households/${householdId}/pets/new`}
      size={pets.length > 0 ? 'small' : 'usual'}
    >
      Add a pet
    </ButtonLink>
  );
  if (pets.length === 0)
    return (
      <EmptyState title="No pet yet" action={add}>
        Its breed, weight, coat and style make the minutes of a visit.
      </EmptyState>
    );
  return (
    <Card title="Pets" aside={add}>
      <ul className="rows">
        {pets
          .toSorted((a, b) => Number(b.active) - Number(a.active))
          .map((pet) => (
            <li key={pet.id} className={`py-3.5 ${pet.active ? '' : 'opacity-70'}`}>
              <PetLines pet={pet} today={today} to={`/households/${householdId}/pets/${pet.id}`} />
            </li>
          ))}
      </ul>
    </Card>
  );
}

function PetLines({ pet, today, to }: { pet: Pet; today: string; to: string }) {
  const { weightUnit } = useSession().business;
  const forecast = tryForecast(pet, today);
  // The forecast adds what age, breed and coat bring to what was ticked.
  const cautions = forecast?.cautions ?? pet.cautions.map((key) => ({ key, stop: false }));
  const facts = [
    breedWords(pet.breedName),
    pet.weightGrams === null ? null : writeWeight(pet.weightGrams, weightUnit),
    pet.active ? pet.styleName : 'rests, not booked',
  ];
  return (
    <>
      <p>
        <Link to={to} className="text-link text-ink">
          {pet.name}
        </Link>{' '}
        <span className="text-slate">{facts.filter(Boolean).join(' · ')}</span>
      </p>
      {forecast && <p className="text-slate">{explain(forecast).summary}</p>}
      {forecast?.planChange && (
        <p className="mt-1.5 rounded-[10px] bg-[var(--honey-soft)] px-3 py-2">
          <span aria-hidden="true">◆ </span>
          {forecast.planChange.words}
        </p>
      )}
      {(cautions.length > 0 || pet.cautionNote) && (
        <div className="mt-1.5 flex flex-wrap gap-1.5">
          {cautions.map(({ key, stop }) => (
            <Chip key={key} tone={stop ? 'bad' : 'heed'}>
              {stop ? `Stop: ${shortWords(key)}` : shortWords(key)}
            </Chip>
          ))}
          {pet.cautionNote && <Chip tone="heed">{pet.cautionNote}</Chip>}
        </div>
      )}
      {forecast && (
        <div className="mt-2">
          <PetStrip
            steps={forecast.steps.map((step) => ({ ...step, petId: pet.id }))}
            widthPx={460}
            label={`Steps for ${pet.name}`}
          />
        </div>
      )}
    </>
  );
}

function shortWords(key: string): string {
  try {
    return findCaution(key as CautionKey)
      .words.split('. ')[0]!
      .replace(/\.$/, '');
  } catch {
    return key;
  }
}

function tryForecast(pet: Pet, today: string) {
  try {
    const facts = petFactsOf(pet, pet.lastVisitDate, today, pet.lastCuts);
    return typeof facts === 'string' ? null : forecastPet(facts, pet.style);
  } catch {
    // A pet saved under an older table still shows; its own page says what is wrong.
    return null;
  }
}
