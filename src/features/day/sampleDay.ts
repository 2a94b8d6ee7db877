import type { Day } from '#shared/api/days.ts';
import type { VisitCard } from '#shared/api/visits.ts';
import type { DayProblem, Plan, VisitFact } from '#shared/schedule/types.ts';
import { straightLineLeg } from '#shared/travel/straightLineLeg.ts';

/** A made-up day of three vans for this room's tests: no I/O, no clock, the same every time. */
export function sampleDay(change: { nowSeconds?: number | null; promiseless?: boolean } = {}): Day {
  const problem = sampleProblem(change.nowSeconds ?? null);
  return {
    date: problem.date,
    problem,
    plan: samplePlan(problem),
    runs: problem.vans.map((van, index) => ({
      runId: uuid(900 + index),
      vanId: van.vanId,
      vanName: van.vanName,
      shape: (['square', 'circle', 'triangle'] as const)[index % 3]!,
      groomerId: van.groomerId,
      groomerName: van.groomerName,
      version: 3 + index,
      sentVersion: index === 2 ? null : 3,
      sentAt: index === 2 ? null : '2026-04-14T05:12:00.000Z',
      changedSinceSent: index === 1,
    })),
    visits: problem.visits.map(cardOf),
    undo: { changeId: '01890000-0000-7000-8000-00000000c001', words: 'Hazel to Otter, after Pip' },
    redo: null,
    openProposalId: null,
    log: [
      {
        id: uuid(950),
        at: '2026-04-14T05:02:00.000Z',
        who: 'Runa',
        words: 'Hazel to Otter, after Pip',
      },
    ],
  };
}

/** A valid id from a small number. */
export function uuid(number: number): string {
  return `01900000-0000-7000-8000-${String(number).padStart(12, '0')}`;
}

const hour = 3600;

interface Row {
  van: number | null;
  label: string;
  breed: string;
  style: string;
  minutes: number;
  scissor: number;
  promise: [number, number] | null;
}

const rows: Row[] = [
  row(0, 'Pip', 'West Highland white terrier', 'Pet trim', 96, 0.3, [8, 10]),
  row(0, 'Hazel', 'Shih Tzu', 'Teddy', 70, 0.3, [10, 12]),
  row(0, 'Juniper', 'Golden retriever', 'Bath and deshed', 80, 0, [12, 14]),
  row(0, 'Rook & Wren', 'Schnauzer, miniature', 'Terrier jacket', 118, 0.25, [13.5, 15.5]),
  row(1, 'Moss', 'Bichon frise', 'Scissored', 78, 0.4, [8, 10]),
  row(1, 'Clover', 'Maine Coon', 'Comb-out', 48, 0.1, [9, 11]),
  row(1, 'Sorrel', 'Lhasa apso', 'Teddy', 75, 0.3, [10.5, 12.5]),
  row(1, 'Teasel', 'Airedale terrier', 'Terrier jacket', 100, 0.25, [13, 15]),
  row(1, 'Bramble', 'Cavalier King Charles spaniel', 'Feather tidy', 62, 0.2, [15, 17]),
  row(2, 'Fern', 'Labradoodle', 'Teddy', 134, 0.32, [8, 10]),
  row(2, 'Otis', 'Pug', 'Bath and brush', 42, 0, [10.5, 12.5]),
  row(2, 'Sedge', 'Springer spaniel', 'Spaniel outline', 82, 0.2, [12, 13]),
  row(2, 'Lark', 'Maltese', 'Teddy', 68, 0.35, [14, 16]),
  row(null, 'Biscuit', 'Poodle, standard', 'Lamb trim', 155, 0.45, null),
  row(null, 'Nettle & Fig', 'Border terrier', 'Bath and nails', 66, 0, [9, 11]),
];

function row(
  van: number | null,
  label: string,
  breed: string,
  style: string,
  minutes: number,
  scissor: number,
  promise: [number, number] | null,
): Row {
  return { van, label, breed, style, minutes, scissor, promise };
}

function sampleProblem(nowSeconds: number | null): DayProblem {
  const spots = [[0, 0] as const, ...rows.map((_, index) => spotOf(index)), [0.004, 0.01] as const];
  const points = spots.map(([lat, lon], index) => ({
    id: `point-${index}`,
    lat: 43.5 + lat,
    lon: -8.2 + lon,
    rough: false,
  }));
  const legs = points.flatMap((from) => points.map((to) => straightLineLeg(from, to)));
  return {
    v: 1,
    date: '2026-04-14',
    dayStartUtc: '2026-04-14T00:00:00.000Z',
    timeZone: 'UTC',
    dayLengthSeconds: 24 * hour,
    points,
    drive: {
      baseSeconds: legs.map((leg) => leg.seconds),
      metres: legs.map((leg) => leg.metres),
      bands: [{ fromSeconds: 0, permille: 1000 }],
      cvPermille: 180,
    },
    vans: ['Otter', 'Plover', 'Curlew'].map((vanName, index) => ({
      vanId: uuid(100 + index),
      vanName,
      groomerId: uuid(200 + index),
      groomerName: ['Mika', 'Ines', 'Tobi'][index]!,
      startSeconds: 7.75 * hour,
      endSeconds: 17 * hour,
      mostOvertimeSeconds: hour,
      mostDriveSeconds: null,
      loadSeconds: 600,
      washDownSeconds: 600,
      startPoint: 0,
      endPoint: 0,
      skills: ['cats', 'large'],
      tableLimitGrams: 60_000,
      tanks: [{ kind: 'fresh' as const, capacityMl: 260_000, usedAtStartMl: 0 }],
      meal: {
        lengthSeconds: 1800,
        earliestStartSeconds: 11.5 * hour,
        latestStartSeconds: 14 * hour,
        dueAfterSeconds: 6 * hour,
      },
    })),
    visits: rows.map(factOf),
    refills: [
      {
        id: uuid(300),
        name: 'Quay Yard',
        point: points.length - 1,
        kinds: ['fresh'],
        lengthSeconds: 720,
        opensSeconds: 6 * hour,
        closesSeconds: 20 * hour,
      },
    ],
    weights: {
      lateFactor: 6,
      waitFactorPermille: 300,
      overtimeFactor: 2,
      otherGroomerSeconds: 600,
      disturbSeconds: 300,
    },
    nowSeconds,
    facts: [],
    sent: null,
  };
}

function samplePlan(problem: DayProblem): Plan {
  return {
    runs: problem.vans.map((van, index) => ({
      vanId: van.vanId,
      stops: problem.visits
        .filter((_, at) => rows[at]!.van === index)
        .flatMap((visit, at) => {
          const stop = { kind: 'visit' as const, id: visit.id, visitId: visit.id };
          return at === 2 ? [stop, { kind: 'meal' as const, id: `meal-${index}` }] : [stop];
        }),
    })),
    notPlaced: problem.visits.filter((_, at) => rows[at]!.van === null).map((visit) => visit.id),
  };
}

function spotOf(index: number): readonly [number, number] {
  const van = rows[index]!.van ?? 1;
  const angle = van * 2.1 + (index % 5) * 0.35;
  const reach = 0.012 + 0.006 * (index % 4);
  return [reach * Math.cos(angle), 1.4 * reach * Math.sin(angle)];
}

function factOf(data: Row, index: number): VisitFact {
  const steps = stepsOf(data, index);
  return {
    id: uuid(index + 1),
    householdId: uuid(400 + index),
    label: data.label,
    point: index + 1,
    siteId: null,
    work: {
      meanSeconds: steps.reduce((sum, step) => sum + step.meanSeconds, 0),
      varianceSeconds2: steps.reduce((sum, step) => sum + step.varianceSeconds2, 0),
    },
    workByGroomer: {},
    setUpSeconds: 240,
    cleanDownSeconds: 300,
    allowed: [],
    promise: data.promise && {
      startSeconds: data.promise[0] * hour,
      endSeconds: data.promise[1] * hour,
      version: 1,
    },
    tankUse: [{ kind: 'fresh', ml: 300 * data.minutes + 12_000 }],
    needs: [],
    heaviestGrams: 12_000,
    preferredGroomerIds: [],
    barredGroomerIds: [],
    valueSeconds: 4 * hour,
    pin: null,
  };
}

function stepsOf(data: Row, index: number): VisitCard['steps'] {
  const rest = 1 - data.scissor;
  const mix = [
    ['checkIn', 'prep', 'check-in', 0.06 * rest, 300],
    ['nails', 'prep', 'nails', 0.11 * rest, 350],
    ['bath', 'wash', 'bath', 0.27 * rest, 450],
    ['dry', 'dry', 'dry', 0.25 * rest, 420],
    ['clip', 'clip', 'clip body', 0.21 * rest, 650],
    ['scissor', 'scissor', 'scissor legs, head, tail', data.scissor, 1000],
    ['wrap', 'wrap', 'wrap-up', 0.1 * rest, 300],
  ] as const;
  const pets = data.label.split(' & ');
  return pets.flatMap((_, pet) =>
    mix
      .filter(([, , , share]) => share > 0)
      .map(([key, family, label, share, attentionPermille]) => {
        const meanSeconds = Math.round((share * data.minutes * 60) / pets.length);
        return {
          petId: uuid(500 + 10 * index + pet),
          key,
          family,
          label,
          medianSeconds: meanSeconds,
          meanSeconds,
          varianceSeconds2: Math.round((0.25 * meanSeconds) ** 2),
          attentionPermille,
          reasons: key === 'dry' ? [{ text: 'thick undercoat', deltaSeconds: 240 }] : [],
        };
      }),
  );
}

function cardOf(fact: VisitFact, index: number): VisitCard {
  const data = rows[index]!;
  const seconds = fact.work.meanSeconds;
  const point = spotOf(index);
  return {
    id: fact.id,
    date: '2026-04-14',
    status: 'booked',
    householdId: fact.householdId,
    householdName: `The ${['Adeyemis', 'Brandts', 'Okafors', 'Lindqvists'][index % 4]!}`,
    addressLabel: `${index + 3} Heron Lane`,
    siteName: null,
    lat: 43.5 + point[0],
    lon: -8.2 + point[1],
    phone: '+15550100',
    textsConsent: true,
    note: index === 1 ? 'Ring twice, the bell sticks.' : '',
    promise: data.promise && {
      startMinutes: data.promise[0] * 60,
      endMinutes: data.promise[1] * 60,
      version: 1,
    },
    pets: data.label.split(' & ').map((name, pet) => ({
      id: uuid(500 + 10 * index + pet),
      name,
      species: data.breed === 'Maine Coon' ? 'cat' : 'dog',
      breedName: data.breed,
      weightGrams: 9_000 + 700 * index,
      styleName: data.style,
      styleNotes: '',
      temperament: 'calm',
      cautions:
        index === 5
          ? [{ key: 'bites', words: 'Bites when the back legs are held', stop: false }]
          : [],
      cautionNote: '',
      vetName: 'Harbour Vets',
      vetPhone: '+15550199',
    })),
    steps: stepsOf(data, index),
    p10Seconds: Math.round(seconds * 0.8),
    p90Seconds: Math.round(seconds * 1.25),
  };
}
