// @vitest-environment happy-dom
import { QueryClient, QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor, within } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, expect, it, vi } from 'vitest';
import type { Day } from '#shared/api/days.ts';
import { applyMove } from '#shared/schedule/applyMove.ts';
import type { Move } from '#shared/schedule/types.ts';
import { setSession } from '#src/api/sessionStore.ts';
import { DayBoard } from './DayBoard.tsx';
import { placeOf } from './moveWords.ts';
import { sampleDay, uuid } from './sampleDay.ts';
import { useDay } from './useDay.ts';

vi.mock('./DayMap.tsx', () => ({ DayMap: () => null }));

let day: Day;
let sent: { path: string; body: { move: Move; runVersions: Record<string, number> } }[];
/** Answers the next move with 409 and the day as someone else left it. */
let movedOn: Day | null;

beforeEach(() => {
  day = sampleDay();
  sent = [];
  movedOn = null;
  setSession(sessionOf(['days.read', 'visits.move', 'visits.edit', 'days.send']));
  vi.stubGlobal('fetch', answer);
});
afterEach(() => {
  cleanup();
  setSession(null);
  vi.unstubAllGlobals();
});

it('moves a visit to another van by keys alone and keeps it', async () => {
  const user = userEvent.setup();
  await open();
  (await visit('Juniper')).focus();
  await user.keyboard('{Enter}{ArrowDown}');
  expect((await visit('Juniper')).getAttribute('aria-label')).toContain('Plover');
  expect(document.activeElement).toBe(await visit('Juniper'));
  expect(sent).toHaveLength(0);
  await user.keyboard('{Enter}');
  const card = screen.getByRole('region', { name: 'What the move changes' });
  expect(within(card).getByText('If Juniper moves to Plover, after Sorrel')).toBeTruthy();
  expect(within(card).getByText('Juniper, promised 12:00–14:00')).toBeTruthy();
  await waitFor(() => expect(document.activeElement?.textContent).toBe('Keep the move'));
  await user.keyboard('{Enter}');
  await waitFor(() => expect(sent).toHaveLength(1));
  expect(sent[0]!.body.move).toEqual({
    kind: 'placeVisit',
    visitId: idOf('Juniper'),
    vanId: uuid(101),
    index: 3,
  });
  // The versions of exactly the two runs it touches: Otter's and Plover's.
  expect(sent[0]!.body.runVersions).toEqual({ [uuid(100)]: 3, [uuid(101)]: 4 });
  await waitFor(() => expect(screen.queryByText('Keep the move')).toBeNull());
  expect(placeOf(day.plan, idOf('Juniper'))).toEqual({ vanId: uuid(101), index: 3 });
});

it('puts a carried visit back with Escape and sends nothing', async () => {
  const user = userEvent.setup();
  await open();
  (await visit('Juniper')).focus();
  await user.keyboard(' {ArrowLeft}{ArrowUp}{ArrowDown}{Escape}');
  expect(screen.queryByRole('region', { name: 'What the move changes' })).toBeNull();
  expect((await visit('Juniper')).getAttribute('aria-label')).toContain('Otter');
  expect(sent).toHaveLength(0);
});

it('does not pick up a visit that has begun', async () => {
  const user = userEvent.setup();
  day.problem.facts.push({
    stopId: idOf('Pip'),
    vanId: uuid(100),
    drivingSinceSeconds: 28_500,
    arrivedSeconds: 28_900,
    workingSinceSeconds: null,
    leftSeconds: null,
    failedReason: null,
  });
  day.problem.nowSeconds = 29_000;
  await open();
  (await visit('Pip')).focus();
  await user.keyboard('{Enter}');
  expect(screen.getByText('Pip has begun and stays where it is.')).toBeTruthy();
  expect(screen.queryByRole('region', { name: 'What the move changes' })).toBeNull();
});

it('says so when the run moved on, and tries the move on the day as it is now', async () => {
  const user = userEvent.setup();
  await open();
  const elsewhere = applyMove(day.problem, day.plan, {
    kind: 'placeVisit',
    visitId: idOf('Teasel'),
    vanId: uuid(102),
    index: 4,
  });
  movedOn = { ...day, plan: elsewhere.plan, runs: day.runs.map((run) => ({ ...run, version: 9 })) };
  (await visit('Juniper')).focus();
  await user.keyboard('{Enter}{ArrowDown}{Enter}');
  await waitFor(() => expect(document.activeElement?.textContent).toBe('Keep the move'));
  await user.keyboard('{Enter}');
  expect(await screen.findByText(/Someone changed this run a moment ago/)).toBeTruthy();
  expect((await visit('Teasel')).getAttribute('aria-label')).toContain('Curlew');
  expect((await visit('Juniper')).getAttribute('aria-label')).toContain('Plover');
  await user.click(screen.getAllByRole('button', { name: 'Keep the move' })[0]!);
  await waitFor(() => expect(sent).toHaveLength(2));
  expect(Object.values(sent[1]!.body.runVersions)).toEqual([9, 9]);
});

it('shows a groomer without the ability the day, not the ways to change it', async () => {
  setSession(sessionOf(['days.read']));
  await open();
  expect(await visit('Juniper')).toBeTruthy();
  expect(screen.queryByText('Send to vans')).toBeNull();
  expect(screen.queryByText('Undo')).toBeNull();
});

function Board() {
  const { query, onDay } = useDay(day.date);
  return query.data ? (
    <DayBoard day={query.data} past={false} nav={null} onDay={onDay} readAgain={query.refetch} />
  ) : null;
}

async function open() {
  render(
    <QueryClientProvider client={new QueryClient()}>
      <MemoryRouter>
        <Board />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  await visit('Juniper');
}

async function visit(label: string): Promise<HTMLElement> {
  return screen.findByRole('button', { name: new RegExp(`^${label},`) });
}

function idOf(label: string): string {
  return day.problem.visits.find((one) => one.label === label)!.id;
}

async function answer(input: string, init?: { method?: string; body?: string }) {
  const json = (body: unknown, status = 200) =>
    new Response(JSON.stringify(body), {
      status,
      headers: { 'content-type': 'application/json' },
    });
  if (init?.method !== 'POST') return json(day);
  const body = JSON.parse(init.body ?? '{}');
  sent.push({ path: input, body });
  if (movedOn) {
    day = movedOn;
    movedOn = null;
    const error = { code: 'versionMoved', message: 'The run moved on.', requestId: 'r' };
    return json({ error, day }, 409);
  }
  day = { ...day, plan: applyMove(day.problem, day.plan, body.move).plan };
  return json(day);
}

function sessionOf(abilities: string[]): Parameters<typeof setSession>[0] {
  return {
    user: { id: uuid(1), name: 'Runa', email: 'runa@example.org' },
    business: {
      id: uuid(2),
      name: 'Saltmarsh Mobile Grooming',
      timeZone: 'UTC',
      currency: 'EUR',
      distanceUnit: 'km',
      weightUnit: 'kg',
      areaName: 'Pellan Bay',
      areaVersion: null,
      areaBounds: null,
      attribution: null,
    },
    roles: ['dispatcher'],
    groomerId: null,
    abilities,
    otherBusinesses: [],
    csrfToken: 'token',
    accessEndsAt: '2030-01-01T00:00:00.000Z',
    serverNow: '2026-04-13T18:00:00.000Z',
    fakesActive: true,
  };
}
