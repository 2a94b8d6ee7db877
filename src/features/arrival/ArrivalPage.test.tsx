// @vitest-environment happy-dom
import { act, cleanup, render, screen } from '@testing-library/react';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { arrival as schema, type Arrival } from '#shared/api/arrival.ts';
import { ArrivalPage } from './ArrivalPage.tsx';
import { asArrival } from './readGivenArrival.ts';
import { boundsAround } from './boundsAround.ts';
import { possessive } from './possessive.ts';

const given: Arrival = schema.parse({
  businessName: 'Saltmarsh',
  callPhone: '+15550100100',
  petNames: 'Clover',
  groomerName: 'Ines',
  vanName: 'Plover',
  shape: 'circle',
  state: 'onTheWay',
  headline: 'Open the door 9:48–9:56',
  sentence: 'Ines is on the way.',
  promiseWords: 'You were told 9:00–11:00',
  haveReady: ['Cats in a closed carrier.'],
  home: { lat: 46, lon: 9 },
  van: null,
  steps: [
    { family: 'scissor', seconds: 840, attentionPermille: 1000 },
    { family: 'unheard of', seconds: 60, attentionPermille: 1 },
  ],
  areaName: 'pellan-bay',
  areaVersion: null,
  attribution: null,
  updatedAt: '2026-04-14T09:40:00.000Z',
});

const answer = (status: number, body: unknown) =>
  new Response(JSON.stringify(body), { status, headers: { 'content-type': 'application/json' } });
const fetched = vi.fn<typeof fetch>();

beforeEach(() => {
  vi.useFakeTimers();
  vi.stubGlobal('fetch', fetched);
  fetched.mockReset();
});
afterEach(() => {
  cleanup();
  vi.unstubAllGlobals();
  vi.useRealTimers();
});

const pass = (ms: number) => act(() => vi.advanceTimersByTimeAsync(ms));

describe('the arrival page', () => {
  it('shows what the server wrote at once and asks again every 20 s', async () => {
    fetched.mockImplementation(async () =>
      answer(200, { ...given, state: 'arrived', headline: 'Ines is with you' }),
    );
    render(<ArrivalPage token="abc" given={given} />);
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Open the door 9:48–9:56');
    expect(screen.getByText("Clover's visit today")).toBeTruthy();
    expect(screen.getByRole('img', { name: 'What will be done: scissor 14 min' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Call us' }).getAttribute('href')).toBe(
      'tel:+15550100100',
    );
    await pass(19_000);
    expect(fetched).not.toHaveBeenCalled();
    await pass(1_500);
    expect(fetched.mock.calls[0]?.[0]).toBe('/api/arrival/abc');
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Ines is with you');
    expect(screen.queryByText('Please have ready')).toBeNull();
  });

  it('keeps the last words and says so when no answer comes', async () => {
    fetched.mockRejectedValue(new TypeError('network'));
    render(<ArrivalPage token="abc" given={given} />);
    await pass(21_000);
    expect(screen.getByText(/^No connection\. This is how it stood at/)).toBeTruthy();
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Open the door 9:48–9:56');
  });

  it('says when the link has ended and stops asking', async () => {
    fetched.mockImplementation(async () => answer(410, {}));
    render(<ArrivalPage token="abc" given={null} />);
    await pass(100);
    expect(screen.getByText('This link has ended')).toBeTruthy();
    await pass(120_000);
    expect(fetched).toHaveBeenCalledTimes(1);
  });
});

it('takes only what looks like an arrival', () => {
  expect(asArrival(given)).toBe(given);
  expect(asArrival(null)).toBeNull();
  expect(asArrival({ headline: 'x' })).toBeNull();
});

it('draws bounds and possessives', () => {
  expect(
    boundsAround([
      { lat: 46, lon: 9 },
      { lat: 46.1, lon: 8.9 },
    ]).map((value) => Number(value.toFixed(3))),
  ).toEqual([8.86, 45.96, 9.04, 46.14]);
  expect(possessive('Rook and Wren')).toBe("Rook and Wren's");
  expect(possessive('Otis')).toBe("Otis'");
});
