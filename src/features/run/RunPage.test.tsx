// @vitest-environment happy-dom
import { QueryClientProvider } from '@tanstack/react-query';
import { cleanup, render, screen, waitFor } from '@testing-library/react';
import userEvent from '@testing-library/user-event';
import { MemoryRouter } from 'react-router-dom';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { openGate } from '#shared/api/households.ts';
import { addRunEvents, getRun, type RunDetail, type RunEvent } from '#shared/api/runs.ts';
import type { Session } from '#shared/api/session.ts';
import { ApiError } from '#src/api/ApiError.ts';
import { queryClient } from '#src/api/queryClient.ts';
import { setSession } from '#src/api/sessionStore.ts';
import { dayStartMs, exampleRun, ids } from './exampleRun.ts';
import { RunPage } from './RunPage.tsx';

const fake = vi.hoisted(() => ({ callApi: vi.fn() }));
vi.mock('#src/api/callApi.ts', () => ({ callApi: fake.callApi }));

/** The server's side of a run: keeps events by id, as the real one does. */
let server: { events: Map<string, RunEvent>; down: boolean; refuse: string | null };

beforeEach(() => {
  vi.useFakeTimers({ now: dayStartMs + (9 * 60 + 40) * 60_000, shouldAdvanceTime: true });
  localStorage.clear();
  queryClient.clear();
  server = { events: new Map(), down: false, refuse: null };
  const stored = (): RunDetail =>
    exampleRun({
      events: [...server.events.values()],
      serverNow: new Date(Date.now()).toISOString(),
    });
  fake.callApi.mockImplementation(async (endpoint, parts) => {
    if (server.down) throw new ApiError({ code: 'offline', status: 0, message: 'No connection.' });
    if (endpoint === getRun) return stored();
    if (endpoint === openGate) return { gateCode: '4711', siteGateCode: null };
    if (endpoint === addRunEvents) {
      if (server.refuse)
        throw new ApiError({ code: 'badInput', status: 400, message: server.refuse });
      for (const event of (parts as { body: { events: RunEvent[] } }).body.events)
        server.events.set(event.id, event);
      return stored();
    }
    throw new Error(`unexpected call of ${endpoint.path}`);
  });
  // A person of their own each time, or one test's queue would reach into the next.
  setSession(session(crypto.randomUUID()));
});

afterEach(() => {
  cleanup();
  setSession(null);
  vi.useRealTimers();
});

function session(userId: string): Session {
  return {
    user: { id: userId, name: 'Ines', email: 'ines@example.org' },
    business: { id: ids.van, name: 'Saltmarsh', weightUnit: 'kg', distanceUnit: 'km' },
    roles: ['groomer'],
    abilities: ['runs.work'],
    serverNow: new Date(Date.now()).toISOString(),
    csrfToken: 'x',
  } as unknown as Session;
}

async function openRun() {
  const user = userEvent.setup({ advanceTimers: (ms) => vi.advanceTimersByTimeAsync(ms) });
  render(
    <QueryClientProvider client={queryClient}>
      <MemoryRouter initialEntries={[`/run/${ids.run}`]}>
        <RunPage runId={ids.run} aboveNav={false} />
      </MemoryRouter>
    </QueryClientProvider>,
  );
  await screen.findByRole('heading', { level: 1 });
  const press = async (name: string | RegExp) => {
    await user.click(await screen.findByRole('button', { name }));
    // Longer than the pause that swallows a second touch.
    await vi.advanceTimersByTimeAsync(800);
  };
  return { user, press };
}

const sentKinds = () => [...server.events.values()].map(({ kind }) => kind);

describe('a groomer works a run', () => {
  it('shows the stop: address, way in, cautions with words, minutes with reasons, last time', async () => {
    await openRun();
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe("Clover at the Adeyemis'");
    expect(document.body.textContent).toContain(
      'Next, 9:51 · 11 min drive · promised 9:00–11:00Clover',
    );
    expect(screen.getByText('14 Heron Lane')).toBeTruthy();
    expect(screen.getByText(/outdoor tap by the garage/)).toBeTruthy();
    const cautions = screen.getByRole('list', { name: 'Cautions' });
    expect(cautions.children[0]?.textContent).toBe(
      '▲Stop: heart murmur: open-mouth breathing means a vet',
    );
    expect(screen.getByText('mats behind the ears')).toBeTruthy();
    expect(screen.getByText(/^55 min, mats behind/, { selector: 'p' })).toBeTruthy();
    expect(screen.getByRole('link', { name: 'Open in maps' }).getAttribute('href')).toBe(
      'geo:46.01,9.01?q=46.01,9.01(14%20Heron%20Lane)',
    );
  });

  it('goes through drive, arrival, table, sections and done, and sends each tap once in order', async () => {
    const { press } = await openRun();
    await press('Start driving · text the Adeyemis');
    expect(screen.getByText(/^On the way, there about 9:5/)).toBeTruthy();
    await press('Arrived');
    await press('Clover on the table');
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Hands-on look');
    await press('Section done');
    expect(screen.getByText('✓ Hands-on look')).toBeTruthy();
    await press('Section done');
    await press('Clover is done');
    await press('Done here');
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Water at Quay Yard');
    await vi.advanceTimersByTimeAsync(5_000);
    await waitFor(() => expect(server.events.size).toBe(8));
    expect(sentKinds()).toEqual([
      'startDriving',
      'arrived',
      'petOnTable',
      'stepDone',
      'stepDone',
      'stepDone',
      'petDone',
      'stopDone',
    ]);
    expect([...server.events.values()].map(({ deviceSeq }) => deviceSeq)).toEqual(
      [...server.events.values()].map(
        (_, at) => server.events.values().next().value!.deviceSeq + at,
      ),
    );
  });

  it('needs three taps when sections are not used', async () => {
    const { press } = await openRun();
    await press(/^Start driving/);
    await press('Arrived');
    await press('Done here');
    await vi.advanceTimersByTimeAsync(5_000);
    await waitFor(() => expect(sentKinds()).toEqual(['startDriving', 'arrived', 'stopDone']));
  });

  it('works on while the network is gone, says so, and sends when it is back', async () => {
    const { press } = await openRun();
    server.down = true;
    await press(/^Start driving/);
    await press('Arrived');
    await vi.advanceTimersByTimeAsync(6_000);
    expect(screen.getByText('offline · 2 to send')).toBeTruthy();
    server.down = false;
    await vi.advanceTimersByTimeAsync(30_000);
    await waitFor(() => expect(sentKinds()).toEqual(['startDriving', 'arrived']));
    expect(screen.queryByText(/to send/)).toBeNull();
  });

  it('swallows a second touch and lets the last tap be taken back', async () => {
    const { user } = await openRun();
    const big = await screen.findByRole('button', { name: /^Start driving/ });
    await user.dblClick(big);
    await vi.advanceTimersByTimeAsync(800);
    expect(await screen.findByRole('button', { name: 'Arrived' })).toBeTruthy();
    await user.click(screen.getByRole('button', { name: 'Undo' }));
    expect(await screen.findByRole('button', { name: /^Start driving/ })).toBeTruthy();
    await vi.advanceTimersByTimeAsync(10_000);
    expect(server.events.size).toBe(0);
  });

  it("leaves a stop undone with a reason, vets' numbers first when the pet is unwell", async () => {
    const { user, press } = await openRun();
    await press("Can't do it");
    await user.click(screen.getByRole('radio', { name: 'The pet is unwell' }));
    expect(screen.getByRole('link', { name: 'Call Bay Vets, +15550100199' })).toBeTruthy();
    await user.type(screen.getByLabelText(/Note for the desk/), 'vomits');
    await press('Leave undone · tell the desk');
    await vi.advanceTimersByTimeAsync(5_000);
    await waitFor(() =>
      expect([...server.events.values()]).toMatchObject([
        { kind: 'cannotDo', reason: 'unwellPet', note: 'vomits', stopId: ids.clover },
      ]),
    );
    expect(screen.getByRole('heading', { level: 1 }).textContent).toBe('Water at Quay Yard');
  });

  it('keeps the gate code hidden until touched', async () => {
    const { press } = await openRun();
    expect(document.body.textContent).not.toContain('4711');
    await press(/^gate/);
    expect(screen.getByText('house 4711')).toBeTruthy();
  });

  it('tells why the server did not take a tap', async () => {
    const { press } = await openRun();
    server.refuse = 'stopId: this stop is not on your run.';
    await press(/^Start driving/);
    await vi.advanceTimersByTimeAsync(5_000);
    expect((await screen.findByRole('alert')).textContent).toContain('not on your run');
    await press('I told them');
    expect(screen.queryByRole('alert')).toBeNull();
  });
});
