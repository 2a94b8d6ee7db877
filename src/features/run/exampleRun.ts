import { run as runSchema, type RunDetail } from '#shared/api/runs.ts';

/** An invented two-visit run for tests: Clover the cat, then Rook & Wren. Midnight is 0:00 UTC. */
export const ids = {
  run: '01890000-0000-7000-8000-000000000001',
  van: '01890000-0000-7000-8000-000000000002',
  clover: '01890000-0000-7000-8000-000000000011',
  terriers: '01890000-0000-7000-8000-000000000012',
  cloverPet: '01890000-0000-7000-8000-000000000021',
  rook: '01890000-0000-7000-8000-000000000022',
  wren: '01890000-0000-7000-8000-000000000023',
  quay: '01890000-0000-7000-8000-000000000031',
  household: '01890000-0000-7000-8000-000000000041',
};

const hour = 3600;
export const dayStartMs = Date.UTC(2026, 3, 14);

/** A fresh copy, checked against the contract, changed by `over`. */
export function exampleRun(over: Partial<RunDetail> = {}): RunDetail {
  return runSchema.parse({
    runId: ids.run,
    date: '2026-04-14',
    vanId: ids.van,
    vanName: 'Plover',
    shape: 'circle',
    groomerName: 'Ines',
    version: 1,
    sentAt: '2026-04-14T06:40:00.000Z',
    problem: problem(),
    plan: {
      runs: [
        {
          vanId: ids.van,
          stops: [
            { kind: 'visit', id: ids.clover, visitId: ids.clover },
            { kind: 'refill', id: 'refill-1', placeId: ids.quay },
            { kind: 'visit', id: ids.terriers, visitId: ids.terriers },
          ],
        },
      ],
      notPlaced: [],
    },
    visits: [clover(), terriers()],
    places: [{ id: ids.quay, name: 'Quay Yard', addressLabel: '2 Quay Road', phone: null }],
    emergencyVets: [
      { id: ids.quay, name: 'Bay Vets', phone: '+15550100199', hoursWords: 'day and night' },
    ],
    events: [],
    serverNow: '2026-04-14T09:40:00.000Z',
    ...over,
  });
}

function problem() {
  const visit = {
    siteId: null,
    workByGroomer: {},
    setUpSeconds: 300,
    cleanDownSeconds: 300,
    allowed: [],
    needs: [],
    preferredGroomerIds: [],
    barredGroomerIds: [],
    valueSeconds: 7200,
    pin: null,
    tankUse: [{ kind: 'fresh', ml: 40_000 }],
  };
  return {
    v: 1,
    date: '2026-04-14',
    dayStartUtc: '2026-04-14T00:00:00.000Z',
    timeZone: 'UTC',
    dayLengthSeconds: 86_400,
    points: ['depot', 'clover', 'quay', 'terriers'].map((id, at) => ({
      id,
      lat: 46 + at / 100,
      lon: 9 + at / 100,
      rough: false,
    })),
    drive: {
      // 11 minutes between any two places.
      baseSeconds: Array.from({ length: 16 }, (_, at) => (at % 5 === 0 ? 0 : 660)),
      metres: Array.from({ length: 16 }, (_, at) => (at % 5 === 0 ? 0 : 5400)),
      bands: [{ fromSeconds: 0, permille: 1000 }],
      cvPermille: 150,
    },
    vans: [
      {
        vanId: ids.van,
        vanName: 'Plover',
        groomerId: 'ines',
        groomerName: 'Ines',
        startSeconds: 8 * hour,
        endSeconds: 17 * hour,
        mostOvertimeSeconds: 1800,
        mostDriveSeconds: null,
        loadSeconds: 600,
        washDownSeconds: 900,
        startPoint: 0,
        endPoint: 0,
        skills: ['cats'],
        tableLimitGrams: 60_000,
        tanks: [{ kind: 'fresh', capacityMl: 260_000, usedAtStartMl: 0 }],
        meal: null,
      },
    ],
    visits: [
      {
        ...visit,
        id: ids.clover,
        householdId: ids.household,
        label: 'Clover',
        point: 1,
        work: { meanSeconds: 48 * 60, varianceSeconds2: 90_000 },
        promise: { startSeconds: 9 * hour, endSeconds: 11 * hour, version: 1 },
        heaviestGrams: 5100,
      },
      {
        ...visit,
        id: ids.terriers,
        householdId: ids.household,
        label: 'Rook & Wren',
        point: 3,
        work: { meanSeconds: 70 * 60, varianceSeconds2: 200_000 },
        promise: { startSeconds: 11 * hour, endSeconds: 13 * hour, version: 1 },
        heaviestGrams: 8200,
      },
    ],
    refills: [
      {
        id: ids.quay,
        name: 'Quay Yard',
        point: 2,
        kinds: ['fresh', 'grey'],
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
    nowSeconds: null,
    facts: [],
    sent: null,
  };
}

function step(petId: string, key: string, family: string, label: string, minutes: number) {
  return {
    petId,
    key,
    family,
    label,
    medianSeconds: minutes * 60,
    meanSeconds: minutes * 60,
    varianceSeconds2: 3600,
    attentionPermille: family === 'scissor' ? 1000 : 400,
    reasons: key === 'brush' ? [{ text: 'mats behind the ears', deltaSeconds: 240 }] : [],
  };
}

const card = {
  date: '2026-04-14',
  status: 'booked',
  householdId: ids.household,
  siteName: null,
  note: '',
  handoverNotes: '',
  siteParkingNotes: '',
  hasGateCode: false,
  secondContactName: '',
  secondContactPhone: null,
  lastTime: null,
};

const pet = {
  styleNotes: '',
  temperament: 'calm',
  cautions: [],
  cautionNote: '',
  vetName: '',
  vetPhone: null,
};

function clover() {
  return {
    ...card,
    id: ids.clover,
    householdName: 'Adeyemi',
    contactName: 'Ada Adeyemi',
    addressLabel: '14 Heron Lane',
    lat: 46.01,
    lon: 9.01,
    phone: '+15550100141',
    textsConsent: true,
    accessNotes: 'drive on the left side, outdoor tap by the garage',
    siteParkingNotes: 'loading bay till 11',
    hasGateCode: true,
    promise: { startMinutes: 540, endMinutes: 660, version: 1 },
    pets: [
      {
        ...pet,
        id: ids.cloverPet,
        name: 'Clover',
        species: 'cat',
        breedName: 'longhair cat',
        weightGrams: 5100,
        styleName: 'Comb-out and sanitary clip',
        vetName: 'Bay Vets',
        vetPhone: '+15550100199',
        cautions: [
          { key: 'bites', words: 'bites when the back legs are held', stop: false },
          { key: 'heart', words: 'heart murmur: open-mouth breathing means a vet', stop: true },
        ],
      },
    ],
    steps: [
      step(ids.cloverPet, 'checkIn', 'prep', 'hands-on look', 8),
      step(ids.cloverPet, 'brush', 'dry', 'comb-out', 26),
      step(ids.cloverPet, 'clip', 'clip', 'sanitary clip', 14),
    ],
    p10Seconds: 40 * 60,
    p90Seconds: 58 * 60,
    lastTime: { date: '2026-03-03', clockSeconds: 55 * 60, note: 'mats behind the ears' },
  };
}

function terriers() {
  return {
    ...card,
    id: ids.terriers,
    householdName: 'Castellan',
    contactName: 'Rui Castellan',
    addressLabel: '3 Quarry Rise',
    lat: 46.03,
    lon: 9.03,
    phone: '+15550100142',
    textsConsent: false,
    accessNotes: '',
    promise: { startMinutes: 660, endMinutes: 780, version: 1 },
    pets: ['Rook', 'Wren'].map((name) => ({
      ...pet,
      id: name === 'Rook' ? ids.rook : ids.wren,
      name,
      species: 'dog',
      breedName: 'border terrier',
      weightGrams: name === 'Rook' ? 8200 : 7000,
      styleName: 'Tidy',
    })),
    steps: [
      step(ids.rook, 'bath', 'wash', 'bath', 15),
      step(ids.rook, 'scissor', 'scissor', 'scissor', 20),
    ],
    p10Seconds: 58 * 60,
    p90Seconds: 84 * 60,
  };
}
