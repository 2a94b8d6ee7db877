import { useQuery } from '@tanstack/react-query';
import { addDays } from '#shared/time/localDate.ts';
import { businessQueries } from '#src/api/business.ts';
import { groomerQueries } from '#src/api/groomers.ts';
import { householdQueries } from '#src/api/households.ts';
import { placeQueries } from '#src/api/places.ts';
import { useToday } from '#src/api/session.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { vanQueries } from '#src/api/vans.ts';

export interface SetupStep {
  key: 'area' | 'depot' | 'van' | 'groomer' | 'shift' | 'household' | 'self';
  /** What to do, as the button and the list say it. */
  words: string;
  why: string;
  to: string;
  done: boolean;
  /** A day works without it. */
  optional: boolean;
}

/** What a business needs before a first day can be planned, in order; null until it is known. */
export function useSetupSteps(): SetupStep[] | null {
  const today = useToday();
  const worksInVan = useSession().groomerId !== null;
  const business = useQuery(businessQueries.one());
  const areas = useQuery(businessQueries.areas());
  const places = useQuery(placeQueries.list());
  const vans = useQuery(vanQueries.list());
  const groomers = useQuery(groomerQueries.list());
  const shifts = useQuery(groomerQueries.shifts(today, addDays(today, 28)));
  const households = useQuery(householdQueries.list('', 1));
  if (
    !business.data ||
    !areas.data ||
    !places.data ||
    !vans.data ||
    !groomers.data ||
    !shifts.data ||
    !households.data
  )
    return null;
  return [
    {
      key: 'area',
      words: 'Choose the area',
      why: 'Roads, addresses and the map come from it.',
      to: '/setup/area',
      done: areas.data.some(({ name }) => name === business.data.areaName),
      // Without an imported map the days still work, on rough distances.
      optional: areas.data.length === 0,
    },
    {
      key: 'depot',
      words: 'Add the depot',
      why: 'Every van starts and ends somewhere. Water and the emergency vet go there too.',
      to: '/setup/places',
      done: places.data.length > 0,
      optional: false,
    },
    {
      key: 'van',
      words: 'Add a van',
      why: 'Its tanks and its table decide which visits fit.',
      to: '/setup/vans',
      done: vans.data.length > 0,
      optional: false,
    },
    {
      key: 'groomer',
      words: 'Add a groomer',
      why: 'Whoever works in the van, yourself too.',
      to: '/setup/groomers',
      done: groomers.data.length > 0,
      optional: false,
    },
    // Somebody must be a groomer before a sign-in can be theirs.
    ...(!worksInVan && groomers.data.some(({ userId }) => userId === null)
      ? [
          {
            key: 'self' as const,
            words: 'Take the groomer role',
            why: 'If you work in the van yourself: under Change roles. Your run then shows on your phone.',
            to: '/setup/people',
            done: false,
            optional: true,
          },
        ]
      : []),
    {
      key: 'shift',
      words: 'Give the groomer hours',
      why: 'A van goes out on the days somebody has hours in it.',
      to: '/setup/shifts',
      done: shifts.data.length > 0,
      optional: false,
    },
    {
      key: 'household',
      words: 'Add the first household',
      why: 'With its pets; then book a visit and it lands on the day.',
      to: '/households/new',
      done: households.data.total > 0,
      optional: false,
    },
  ];
}
