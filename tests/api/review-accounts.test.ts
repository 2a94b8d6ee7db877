import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import type { Express } from 'express';
import request from 'supertest';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { inviteMember } from '#shared/api/members.ts';
import {
  getSession,
  refreshSession,
  requestPasswordReset,
  resetPassword,
  signIn,
  signUp,
  switchBusiness,
} from '#shared/api/session.ts';
import { buildApp } from '#server/app.ts';
import { listFakeLetters } from '#server/mail/listFakeLetters.ts';
import { closeMail, openMail } from '#server/mail/openMail.ts';
import { ApiClient, newBusiness } from '../support/apiClient.ts';

let app: Express;

beforeAll(async () => {
  await makeDatabase();
  app = buildApp();
});
afterAll(dropDatabase);
beforeEach(() => void openMail({ smtpUrl: null, from: 'Furlong <f@localhost>', folder: null }));

const cookieOf = (headers: Record<string, unknown>, name: string): string =>
  (headers['set-cookie'] as string[]).find((line) => line.startsWith(`${name}=`))!.split(';')[0]!;

/** The links in letters to an address, newest first, waited for until there are so many. */
async function resetTokens(to: string, count: number): Promise<string[]> {
  const letters = () => listFakeLetters()!.filter((letter) => letter.to === to);
  await expect.poll(() => letters().length).toBe(count);
  return letters().map((letter) => /\/reset\/([\w-]+)/.exec(letter.text)![1]!);
}

describe('limits', () => {
  beforeEach(() => void (process.env.FURLONG_TEST_LIMITS = '1'));
  afterEach(() => void delete process.env.FURLONG_TEST_LIMITS);

  it('sends at most five reset letters to one address, though every answer is the same', async () => {
    const ask = async (email: string) =>
      (await new ApiClient(app).call(requestPasswordReset, { body: { email } })).status;
    const statuses = [];
    for (let i = 0; i < 5; i++) statuses.push(await ask('flooded@example.org'));
    statuses.push(await ask(' Flooded@Example.org '), await ask('someone.else@example.org'));
    expect(statuses).toEqual([200, 200, 200, 200, 200, 429, 200]);
  });

  it('counts guesses made by signing up beside those made by signing in', async () => {
    const owner = newBusiness();
    await new ApiClient(app).signUp(owner);
    const guess = { ...owner, password: 'a wrong password' };
    for (let i = 0; i < 10; i++)
      expect((await new ApiClient(app).call(signUp, { body: guess })).status).toBe(409);
    const { email, password } = guess;
    expect((await new ApiClient(app).call(signIn, { body: { email, password } })).status).toBe(429);
  });

  it('ends trying one password on many addresses', async () => {
    const statuses = [];
    for (let i = 0; i < 61; i++) {
      const body = { email: `sprayed${i}@example.org`, password: 'a wrong password' };
      statuses.push((await new ApiClient(app).call(signIn, { body })).status);
    }
    expect(statuses.at(-1)).toBe(429);
  });
});

describe('letters', () => {
  it('says the same of every address while no mail can go, and loses no invitation silently', async () => {
    const owner = newBusiness();
    const client = await new ApiClient(app).signUp(owner);
    closeMail();
    for (const email of [owner.email, 'nobody@example.org'])
      expect(
        (await new ApiClient(app).call(requestPasswordReset, { body: { email } })).status,
      ).toBe(503);
    const invited = await client.call(inviteMember, {
      body: { email: 'mika@example.org', roles: ['groomer'] },
    });
    expect(invited.status).toBe(503);
  });

  it('uses up every open reset link of the person with the first', async () => {
    const owner = newBusiness();
    await new ApiClient(app).signUp(owner);
    const ask = () => new ApiClient(app).must(requestPasswordReset, { body: owner });
    await ask();
    await ask();
    const [newer, older] = await resetTokens(owner.email, 2);
    const set = (token: string) =>
      new ApiClient(app).call(resetPassword, {
        params: { token },
        body: { password: 'another good one' },
      });
    expect((await set(newer!)).status).toBe(200);
    expect((await set(older!)).status).toBe(410);
  });
});

describe('sign-ins', () => {
  it('answers the second click of a double sign-up with a reason', async () => {
    const body = newBusiness();
    const answers = await Promise.all(
      [1, 2, 3].map(() => new ApiClient(app).call(signUp, { body })),
    );
    expect(answers.map((one) => one.status).sort()).toEqual([200, 409, 409]);
  });

  it('wants the CSRF token for switching the business', async () => {
    const owner = newBusiness();
    await new ApiClient(app).signUp(owner);
    const client = await new ApiClient(app).signUp({ ...owner, businessName: 'Second' });
    const businessId = client.session!.otherBusinesses[0]!.id;
    const bare = await client.agent.post(switchBusiness.path).send({ businessId });
    expect(bare.status).toBe(403);
    await client.must(switchBusiness, { body: { businessId } });
  });

  it('takes a refresh token of two rotations ago for theft and ends the sign-in', async () => {
    const post = (cookie: string) => request(app).post(refreshSession.path).set('Cookie', cookie);
    const answer = await new ApiClient(app).call(signUp, { body: newBusiness() });
    const first = cookieOf(answer.headers, 'furlong_refresh');
    const second = cookieOf((await post(first)).headers, 'furlong_refresh');
    const third = cookieOf((await post(second)).headers, 'furlong_refresh');
    expect((await post(first)).status).toBe(401);
    expect((await post(third)).status).toBe(401);
  });

  it('takes what is no token for nobody', async () => {
    const text = (value: string) => Buffer.from(value).toString('base64url');
    const broken = `${text('{"alg":"HS256","typ":"JWT"}')}.${text('no json')}.c2ln`;
    for (const token of [broken, 'a.b.c', 'x', `${text('{"alg":"none","kid":"k1"}')}.e30.`]) {
      const call = request(app).get(getSession.path).set('Cookie', `furlong_access=${token}`);
      expect((await call).status, `${token}`).toBe(401);
      const refresh = request(app).post(refreshSession.path);
      expect((await refresh.set('Cookie', `furlong_refresh=${token}`)).status).toBe(401);
    }
  });
});
