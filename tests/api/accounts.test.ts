import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import type { Express } from 'express';
import request from 'supertest';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { updateBusiness } from '#shared/api/business.ts';
import {
  acceptInvitation,
  getInvitation,
  inviteMember,
  listMembers,
  removeMember,
  updateMember,
} from '#shared/api/members.ts';
import {
  getSession,
  refreshSession,
  requestPasswordReset,
  resetPassword,
  signIn,
  signOut,
  signUp,
  switchBusiness,
} from '#shared/api/session.ts';
import { listHouseholds } from '#shared/api/households.ts';
import { clock } from '#server/clock.ts';
import { buildApp } from '#server/app.ts';
import { listFakeLetters } from '#server/mail/listFakeLetters.ts';
import { openMail } from '#server/mail/openMail.ts';
import { Session as SessionRow } from '#server/models/Session.ts';
import { ApiClient, newBusiness } from '../support/apiClient.ts';

let app: Express;

beforeAll(async () => {
  await makeDatabase();
  openMail({ smtpUrl: null, from: 'Furlong <furlong@localhost>', folder: null });
  app = buildApp();
});
afterAll(dropDatabase);

/** The last letter to an address, waited for: letters leave after the answer. */
async function linkIn(to: string, path: RegExp): Promise<string> {
  await expect.poll(() => listFakeLetters()?.some((letter) => letter.to === to)).toBe(true);
  const letter = listFakeLetters()!
    .filter((one) => one.to === to)
    .at(-1)!;
  return path.exec(letter.text)![1]!;
}

const cookieOf = (headers: Record<string, unknown>, name: string): string =>
  (headers['set-cookie'] as string[]).find((line) => line.startsWith(`${name}=`))!.split(';')[0]!;

describe('sign-up and sign-in', () => {
  it('makes a business with its operator, signed in by httpOnly SameSite=Strict cookies', async () => {
    const client = new ApiClient(app);
    const answer = await client.call(signUp, { body: newBusiness() });
    expect(answer.status).toBe(200);
    expect(answer.body.roles).toEqual(['operator', 'dispatcher']);
    expect(answer.body.abilities).toContain('members.edit');
    for (const line of answer.headers['set-cookie'] as unknown as string[])
      expect(line).toMatch(/HttpOnly.*SameSite=Strict/);
  });

  it('names every wrong field at once and saves nothing', async () => {
    const answer = await new ApiClient(app).call(signUp, {
      body: { ...newBusiness(), email: 'no', password: 'short', timeZone: 'Mars/Base' },
    });
    expect(answer.status).toBe(400);
    expect(Object.keys(answer.error.fields!).sort()).toEqual(['email', 'password', 'timeZone']);
  });

  it('refuses a password over 72 bytes, which bcrypt would cut', async () => {
    const answer = await new ApiClient(app).call(signUp, {
      body: { ...newBusiness(), password: 'é'.repeat(37) },
    });
    expect(answer.error.fields).toEqual({ password: 'must be 72 bytes or fewer' });
  });

  it('says the same for an unknown address and a wrong password', async () => {
    const owner = newBusiness();
    await new ApiClient(app).signUp(owner);
    const wrong = await new ApiClient(app).call(signIn, {
      body: { email: owner.email, password: 'wrong password' },
    });
    const unknown = await new ApiClient(app).call(signIn, {
      body: { email: 'nobody@example.org', password: 'wrong password' },
    });
    expect([wrong.status, unknown.status]).toEqual([401, 401]);
    expect(wrong.error.message).toBe(unknown.error.message);
  });

  it('lets one person hold two businesses and switch; a token names one', async () => {
    const owner = newBusiness();
    await new ApiClient(app).signUp(owner);
    const client = await new ApiClient(app).signUp({ ...owner, businessName: 'Second' });
    const other = client.session!.otherBusinesses[0]!;
    client.session = await client.must(switchBusiness, { body: { businessId: other.id } });
    expect(client.session.business.id).toBe(other.id);
    const stranger = await new ApiClient(app).signUp();
    expect((await stranger.call(switchBusiness, { body: { businessId: other.id } })).status).toBe(
      404,
    );
  });

  it('slows down guessing after ten tries', async () => {
    process.env.FURLONG_TEST_LIMITS = '1';
    try {
      const body = { email: 'guess@example.org', password: 'wrong password' };
      const statuses = [];
      for (let i = 0; i < 12; i++)
        statuses.push((await new ApiClient(app).call(signIn, { body })).status);
      expect(statuses).toEqual([...Array(10).fill(401), 429, 429]);
    } finally {
      delete process.env.FURLONG_TEST_LIMITS;
    }
  });
});

describe('the session', () => {
  it('needs the CSRF token for a change and refuses other origins', async () => {
    const client = await new ApiClient(app).signUp();
    const send = () => client.agent.patch(updateBusiness.path).send({ name: 'New name' });
    expect((await send()).status).toBe(403);
    expect((await send().set('X-Furlong-Csrf', 'x'.repeat(32))).status).toBe(403);
    const token = client.session!.csrfToken;
    expect(
      (await send().set('X-Furlong-Csrf', token).set('Origin', 'https://evil.example')).status,
    ).toBe(403);
    expect((await send().set('X-Furlong-Csrf', token)).status).toBe(200);
  });

  it('ends at once on sign-out, even for the access token', async () => {
    const client = new ApiClient(app);
    const answer = await client.call(signUp, { body: newBusiness() });
    client.session = answer.body;
    const access = cookieOf(answer.headers, 'furlong_access');
    await client.must(signOut);
    expect((await request(app).get(getSession.path).set('Cookie', access)).status).toBe(401);
  });

  it('rotates the refresh token; the one before lives until its successor is used', async () => {
    const client = new ApiClient(app);
    const first = cookieOf(
      (await client.call(signUp, { body: newBusiness() })).headers,
      'furlong_refresh',
    );
    const post = (cookie: string) => request(app).post(refreshSession.path).set('Cookie', cookie);
    const lost = await post(first);
    expect(lost.status).toBe(200);
    // The answer was lost on the road: the phone still has the first token and may use it again.
    const again = await post(first);
    expect(again.status).toBe(200);
    const second = cookieOf(again.headers, 'furlong_refresh');
    // The new access token is used, which retires the first refresh token...
    const access = cookieOf(again.headers, 'furlong_access');
    expect((await request(app).get(getSession.path).set('Cookie', access)).status).toBe(200);
    // ...but for 60 s a second tab of the same device may still be late with it.
    const late = await post(first);
    expect(late.status).toBe(200);
    expect(
      (late.headers['set-cookie'] as unknown as string[]).some((line) =>
        line.startsWith('furlong_refresh'),
      ),
    ).toBe(false);
    // Outside of that it is theft: the sign-in ends, the newest token with it.
    clock.offsetMs += 61_000;
    try {
      expect((await post(first)).status).toBe(401);
      expect((await post(second)).status).toBe(401);
    } finally {
      clock.offsetMs -= 61_000;
    }
  });

  it('stores no refresh token, only its hash', async () => {
    const client = new ApiClient(app);
    const cookie = cookieOf(
      (await client.call(signUp, { body: newBusiness() })).headers,
      'furlong_refresh',
    );
    const rows = await SessionRow.findAll({
      where: { businessId: (await client.must(getSession)).business.id },
    });
    expect(JSON.stringify(rows)).not.toContain(cookie.split('=')[1]!);
  });

  it('runs out after 15 minutes without a refresh', async () => {
    const client = await new ApiClient(app).signUp();
    clock.offsetMs += 16 * 60_000;
    try {
      expect((await client.call(getSession)).status).toBe(401);
    } finally {
      clock.offsetMs -= 16 * 60_000;
    }
  });
});

describe('letters', () => {
  it('resets a password once and ends every sign-in', async () => {
    const owner = newBusiness();
    const client = await new ApiClient(app).signUp(owner);
    expect(
      (
        await new ApiClient(app).call(requestPasswordReset, {
          body: { email: 'nobody@example.org' },
        })
      ).status,
    ).toBe(200);
    await new ApiClient(app).must(requestPasswordReset, { body: { email: owner.email } });
    const token = await linkIn(owner.email, /\/reset\/([\w-]+)/);
    const body = { password: 'another good one' };
    await new ApiClient(app).must(resetPassword, { params: { token }, body });
    expect((await new ApiClient(app).call(resetPassword, { params: { token }, body })).status).toBe(
      410,
    );
    expect((await client.call(getSession)).status).toBe(401);
    await new ApiClient(app).signIn(owner.email, body.password);
  });

  it('invites a groomer, who joins with a groomer row and groomer abilities only', async () => {
    const owner = await new ApiClient(app).signUp();
    const email = `mika${Date.now()}@example.org`;
    await owner.must(inviteMember, { body: { email, roles: ['groomer'] } });
    const token = await linkIn(email, /\/join\/([\w-]+)/);
    const guest = new ApiClient(app);
    expect(await guest.must(getInvitation, { params: { token } })).toMatchObject({
      email,
      roles: ['groomer'],
      knownPerson: false,
    });
    const [one, two] = await Promise.all([
      guest.call(acceptInvitation, {
        params: { token },
        body: { name: 'Mika', password: 'comb and scissors' },
      }),
      new ApiClient(app).call(acceptInvitation, {
        params: { token },
        body: { name: 'Mika', password: 'comb and scissors' },
      }),
    ]);
    expect([one.status, two.status].sort()).toEqual([200, 410]);
    const mika = await new ApiClient(app).signIn(email, 'comb and scissors');
    expect(mika.session!.groomerId).not.toBeNull();
    expect(mika.session!.abilities).toEqual(['households.openGate', 'runs.work']);
    expect((await mika.call(listHouseholds)).status).toBe(403);
    expect((await owner.must(listMembers)).members.map((member) => member.email)).toContain(email);
  });

  it('gives a one-van owner all three roles with one sign-in', async () => {
    const owner = await new ApiClient(app).signUp();
    await owner.must(updateMember, {
      params: { userId: owner.session!.user.id },
      body: { roles: ['operator', 'dispatcher', 'groomer'] },
    });
    const session = await owner.renew();
    expect(session.roles).toEqual(['operator', 'dispatcher', 'groomer']);
    expect(session.groomerId).not.toBeNull();
  });

  it('keeps the last operator', async () => {
    const owner = await new ApiClient(app).signUp();
    const params = { userId: owner.session!.user.id };
    expect((await owner.call(updateMember, { params, body: { roles: ['groomer'] } })).status).toBe(
      400,
    );
    expect((await owner.call(removeMember, { params })).status).toBe(400);
  });
});
