import { useEffect, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { findBreed } from '#shared/grooming/breeds.ts';
import { styles as startingStyles } from '#shared/grooming/styles.ts';
import { forecastQueries, type QuickForecastFields } from '#src/api/forecasts.ts';
import { useToday } from '#src/api/session.ts';
import { styleQueries } from '#src/api/styles.ts';
import { ForecastLine } from './ForecastLine.tsx';
import { petFactsOf } from './petFactsOf.ts';
import { QuickAnswer } from './QuickAnswer.tsx';
import { QuickFields } from './QuickFields.tsx';
import { quickStart, type QuickPet } from './quickPet.ts';
import { styleChoices } from './styleChoices.ts';
import { tryForecast } from './tryForecast.ts';

/**
 * Told on the left, answered on the right. Minutes come at once from the model in the browser; price
 * and offers follow from the server after a short pause in the telling.
 */
export function QuickForecast() {
  const today = useToday();
  const [pet, setPet] = useState(quickStart);
  const library = useQuery(styleQueries.list()).data ?? startingStyles;
  const choices = styleChoices(library, pet.species, pet.breedId, pet.coatType);
  const style = library.find(({ id }) => id === pet.styleId) ?? null;
  const told = pet.breedId !== null || pet.weightGrams !== null || pet.coatType !== null;
  const facts = petFactsOf(
    {
      ...pet,
      birthYear: pet.ageYears === null ? null : Number(today.slice(0, 4)) - pet.ageYears,
      cautions: [],
      mattingByRegion: null,
      tableLimitMinutes: null,
    },
    null,
    today,
  );
  const local = tryForecast(told ? facts : 'Tell the breed, and the minutes show here.', style);
  const asked = useSettled(typeof local === 'string' ? null : bodyOf(pet));
  const answer = useQuery(forecastQueries.quick(asked));
  const change = (part: Partial<QuickPet>) => setPet((before) => withUsual(before, part));
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-4 lg:grid-cols-[minmax(0,1fr)_minmax(0,1.1fr)] lg:gap-5">
      <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
        <QuickFields pet={pet} styleChoices={choices} onChange={change} />
        <ForecastLine facts={told ? facts : ''} style={style} />
      </div>
      <QuickAnswer
        pet={pet}
        local={local}
        answer={typeof local === 'string' ? null : (answer.data ?? null)}
        fresh={!answer.isPlaceholderData && !answer.isFetching}
        error={answer.error}
        onRetry={() => void answer.refetch()}
      />
    </div>
  );
}

/** A breed brings its usual style; another species begins anew. */
function withUsual(before: QuickPet, part: Partial<QuickPet>): QuickPet {
  const next = { ...before, ...part };
  if (part.species && part.species !== before.species)
    return { ...quickStart, species: part.species, where: before.where };
  if (part.breedId && part.breedId !== before.breedId)
    return { ...next, styleId: findBreed(part.breedId).usualStyleIds[0] ?? next.styleId };
  return next;
}

function bodyOf(pet: QuickPet): QuickForecastFields {
  const { where, ...fields } = pet;
  return { ...fields, lat: where.lat, lon: where.lon };
}

/** The value once it has stood still for a moment, so that typing asks once. */
function useSettled<Value>(value: Value, ms = 350): Value {
  const key = JSON.stringify(value);
  const [settled, setSettled] = useState({ key, value });
  useEffect(() => {
    const timer = setTimeout(() => setSettled({ key, value: JSON.parse(key) as Value }), ms);
    return () => clearTimeout(timer);
  }, [key, ms]);
  return settled.value;
}
