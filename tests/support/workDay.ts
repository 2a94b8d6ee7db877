import type { Express } from 'express';
import type { z } from 'zod';
import { updateBusiness } from '#shared/api/business.ts';
import { getDay, moveVisit, sendRuns } from '#shared/api/days.ts';
import { addRunEvents, type RunEvent } from '#shared/api/runs.ts';
import { inBusiness } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { Membership, type RoleName } from '#server/models/Membership.ts';
import { OutboxText } from '#server/models/OutboxText.ts';
import { User } from '#server/models/User.ts';
import { hashPassword } from '#server/services/accounts/passwords.ts';
import { ApiClient } from './apiClient.ts';
import { buildBusiness } from './buildBusiness.ts';
import { bookPet, versionsOf } from './boardDay.ts';
import { instantAt, setClock } from './setClock.ts';
import { tomorrow } from './tomorrow.ts';

const password = 'scissors and comb';

interface Booking {
  petName: string;
  promise?: { startMinutes: number; endMinutes: number };
  textsConsent?: boolean;
  phone?: string | null;
  lat?: number;
}

/**
 * A day sent to van Otter at 6:00 with the bookings in order, ready to be worked. The server's
 * clock stands on that day; `at` moves it and signs the dispatcher in again.
 */
export async function workDay(
  app: Express,
  bookings: Booking[],
  business: z.input<(typeof updateBusiness)['body']> = {},
) {
  const date = tomorrow();
  setClock(date, '6:00');
  const built = await buildBusiness(app, date);
  const { client, vans, groomers } = built;
  if (Object.keys(business).length > 0) await client.must(updateBusiness, { body: business });
  const email = client.session!.user.email;
  const businessId = client.session!.business.id;
  const otter = vans[0]!.id;
  const visits: Record<string, Awaited<ReturnType<typeof bookPet>>> = {};
  const read = () => client.must(getDay, { params: { date } });
  for (const [index, { petName, ...options }] of bookings.entries()) {
    const booked = await bookPet(client, date, petName, { lat: 41.01 + index / 100, ...options });
    visits[petName] = booked;
    await client.must(moveVisit, {
      params: { date },
      body: {
        move: { kind: 'placeVisit', visitId: booked.visit.id, vanId: otter, index: 500 },
        runVersions: versionsOf(await read()),
      },
    });
  }
  const send = async () =>
    client.must(sendRuns, {
      params: { date },
      body: { vanIds: [otter], runVersions: versionsOf(await read()) },
    });
  const { runId } = (await send()).runs.find((run) => run.vanId === otter)!;
  const at = async (wall: string) => {
    const now = setClock(date, wall);
    await client.signIn(email, password);
    return now;
  };
  const phone = phoneOf(date);
  return {
    ...built,
    businessId,
    date,
    otter,
    visits,
    runId,
    groomerId: groomers[0]!.id,
    read,
    send,
    at,
    phone,
    stopOf: (petName: string) => visits[petName]!.visit.id,
    /** Sends taps as they are. */
    post: (events: unknown[], as = client) =>
      as.call(addRunEvents, { params: { runId }, body: { events } as never }),
    texts: () => inBusiness(businessId, () => OutboxText.findAll({ order: ['createdAt', 'id'] })),
    /** A person with only these roles, signed in at the clock's present time. */
    member: (roles: RoleName[], groomerId: string | null = null) =>
      memberOf(app, businessId, roles, groomerId),
  };
}

/** A phone that numbers its taps; `wall` is the true time, `offsetMs` how far its clock is behind. */
export function phoneOf(date: string) {
  const deviceId = newId();
  let deviceSeq = -1;
  return (
    kind: RunEvent['kind'],
    stopId: string,
    wall: string,
    fields: Record<string, unknown> = {},
    offsetMs = 0,
  ) => {
    deviceSeq += 1;
    const instant = instantAt(date, wall);
    return {
      id: newId(),
      v: 1,
      deviceId,
      deviceSeq,
      deviceAt: new Date(instant.getTime() - offsetMs).toISOString(),
      offsetMs,
      runVersion: 1,
      stopId,
      kind,
      ...fields,
    };
  };
}

async function memberOf(
  app: Express,
  businessId: string,
  roles: RoleName[],
  groomerId: string | null,
): Promise<ApiClient> {
  const email = `${newId()}@example.org`;
  const createdAt = new Date();
  const user = await User.create({
    name: 'Runa',
    email,
    passwordHash: await hashPassword(password),
    createdAt,
  });
  await inBusiness(businessId, () =>
    Membership.create({ userId: user.id, roles, groomerId, createdAt }),
  );
  return new ApiClient(app).signIn(email, password);
}
