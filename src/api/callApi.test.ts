// @vitest-environment happy-dom
import { afterEach, beforeEach, expect, test, vi } from 'vitest';
import { getBusiness, updateBusiness } from '#shared/api/business.ts';
import type { Session } from '#shared/api/session.ts';
import { ApiError } from './ApiError.ts';
import { callApi } from './callApi.ts';
import { readSession, setSession } from './sessionStore.ts';

const business = {
  name: 'Saltmarsh Mobile Grooming',
  timeZone: 'Europe/Lisbon',
  currency: 'EUR',
  distanceUnit: 'km',
  weightUnit: 'kg',
  areaName: 'Pellan Bay',
  senderPhone: null,
  deskPhone: null,
  setUpMinutes: 6,
  cleanDownMinutes: 8,
  priceCentsPerHour: 0,
  calloutCents: 0,
};

const session = (csrfToken: string): Session => ({
  user: {
    id: '0190a000-0000-7000-8000-000000000001',
    name: 'Odile',
    email: 'odile@example.org',
  },
  business: {
    id: '0190a000-0000-7000-8000-000000000002',
    name: business.name,
    timeZone: business.timeZone,
    currency: business.currency,
    distanceUnit: 'km',
    weightUnit: 'kg',
    areaName: business.areaName,
    areaVersion: null,
    areaBounds: null,
    attribution: null,
  },
  roles: ['operator'],
  groomerId: null,
  abilities: [],
  otherBusinesses: [],
  csrfToken,
  accessEndsAt: '2026-04-14T10:00:00Z',
  serverNow: '2026-04-14T09:00:00Z',
  fakesActive: false,
});

interface Seen {
  call: string;
  csrf: string | null;
  body: unknown;
}
let seen: Seen[] = [];

/** Answers in order of `answers[call]`; the last one stays. */
function serve(answers: Record<string, [number, unknown][]>): void {
  vi.stubGlobal('fetch', async (url: string, init: RequestInit) => {
    const call = `${init.method} ${url}`;
    const headers = new Headers(init.headers);
    seen.push({
      call,
      csrf: headers.get('X-Furlong-Csrf'),
      body: init.body ? JSON.parse(String(init.body)) : null,
    });
    const queue = answers[call];
    if (!queue) throw new TypeError(`nothing serves ${call}`);
    const [status, body] = queue.length > 1 ? queue.shift()! : queue[0]!;
    return Response.json(body, { status });
  });
}

const refusal = (code: string, more: object = {}) => ({
  error: { code, message: `said ${code}`, requestId: 'r-1', ...more },
});

beforeEach(() => {
  seen = [];
  localStorage.clear();
  setSession(null);
});
afterEach(() => vi.unstubAllGlobals());

test('a change carries the token of the sign-in, a read does not', async () => {
  setSession(session('one'));
  serve({
    'GET /api/business': [[200, business]],
    'PATCH /api/business': [[200, { ...business, setUpMinutes: 9 }]],
  });
  await callApi(getBusiness, {});
  const changed = await callApi(updateBusiness, { body: { setUpMinutes: 9 } });
  expect(changed.setUpMinutes).toBe(9);
  expect(seen).toEqual([
    { call: 'GET /api/business', csrf: null, body: null },
    { call: 'PATCH /api/business', csrf: 'one', body: { setUpMinutes: 9 } },
  ]);
});

test('expired access is renewed once for calls made together, and each is made again', async () => {
  setSession(session('one'));
  serve({
    'PATCH /api/business': [
      [401, refusal('signInNeeded')],
      [401, refusal('signInNeeded')],
      [200, business],
    ],
    'POST /api/session/refresh': [[200, session('two')]],
  });
  const both = await Promise.all([
    callApi(updateBusiness, { body: { setUpMinutes: 9 } }),
    callApi(updateBusiness, { body: { cleanDownMinutes: 4 } }),
  ]);
  expect(both).toHaveLength(2);
  expect(seen.filter(({ call }) => call.endsWith('/refresh'))).toHaveLength(1);
  expect(seen.slice(-2).map(({ csrf }) => csrf)).toEqual(['two', 'two']);
});

test('when the sign-in has ended it is forgotten and the call fails', async () => {
  setSession(session('one'));
  serve({
    'GET /api/business': [[401, refusal('signInNeeded')]],
    'POST /api/session/refresh': [[401, refusal('signInNeeded')]],
  });
  await expect(callApi(getBusiness, {})).rejects.toMatchObject({ code: 'signInNeeded' });
  expect(readSession()).toBeNull();
});

test('without network the sign-in stays and the error says what to do', async () => {
  setSession(session('one'));
  serve({});
  await expect(callApi(getBusiness, {})).rejects.toMatchObject({
    code: 'offline',
    status: 0,
    message: 'No connection to Furlong. Check the network, then try again.',
  });
  expect(readSession()?.user.name).toBe('Odile');
});

test('a refusal keeps its fields and its whole body', async () => {
  setSession(session('one'));
  const body = { ...refusal('versionMoved', { fields: { name: 'is taken' } }), day: { v: 4 } };
  serve({ 'PATCH /api/business': [[409, body]] });
  const error = await callApi(updateBusiness, { body: { name: 'X' } }).catch((one) => one);
  expect(error).toBeInstanceOf(ApiError);
  expect(error).toMatchObject({
    code: 'versionMoved',
    status: 409,
    message: 'said versionMoved',
    fields: { name: 'is taken' },
    body: { day: { v: 4 } },
    requestId: 'r-1',
  });
});

test('a stale token is read anew and the call made once more', async () => {
  setSession(session('one'));
  serve({
    'PATCH /api/business': [
      [403, refusal('badOrigin')],
      [200, business],
    ],
    'GET /api/session': [[200, session('two')]],
  });
  await callApi(updateBusiness, { body: { setUpMinutes: 9 } });
  expect(seen.map(({ csrf }) => csrf)).toEqual(['one', null, 'two']);
});

test('an answer outside the contract is an error, not data', async () => {
  serve({ 'GET /api/business': [[200, { ...business, setUpMinutes: 'six' }]] });
  await expect(callApi(getBusiness, {})).rejects.toMatchObject({ code: 'badAnswer' });
});

test('a page of a proxy in between becomes words to act on', async () => {
  vi.stubGlobal('fetch', async () => new Response('<h1>Bad gateway</h1>', { status: 502 }));
  await expect(callApi(getBusiness, {})).rejects.toMatchObject({
    code: 'notReady',
    message: 'The server is not ready yet. Try again in a moment.',
  });
});
