import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import type { Express } from 'express';
import request from 'supertest';
import { afterAll, beforeAll, expect, it, vi } from 'vitest';
import { requestPasswordReset } from '#shared/api/session.ts';
import { buildApp } from '#server/app.ts';
import { ArrivalLink } from '#server/models/ArrivalLink.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { createGroomer, listGroomers } from '#shared/api/groomers.ts';
import { ApiClient } from '../support/apiClient.ts';

let app: Express;

beforeAll(async () => {
  await makeDatabase();
  app = buildApp();
});
afterAll(dropDatabase);

it('answers to the names of this machine only, so that no letter links elsewhere', async () => {
  const ask = (host: string) =>
    request(app)
      .post(requestPasswordReset.path)
      .set('Host', host)
      .send({ email: 'odile@example.org' });
  for (const host of ['evil.example', 'localhost.evil.example', '127.0.0.1@evil.example', '%'])
    expect((await ask(host)).body.error.code, `${host}`).toBe('badOrigin');
  for (const path of ['/', '/a/0123456789abcdef012345', '/api/fake/letters', '/hooks/sms/inbound'])
    expect((await request(app).get(path).set('Host', 'evil.example')).status, `${path}`).toBe(403);
  for (const host of ['localhost:4173', '127.0.0.1', '[::1]:4173'])
    expect((await request(app).get('/api/health').set('Host', host)).status, `${host}`).toBe(200);
});

it('tells a pet owner in a page, whatever went wrong, and keeps the page to itself', async () => {
  const ask = () => request(app).get('/a/AAAAAAAAAAAAAAAAAAAAAA');
  const unknown = await ask();
  expect(unknown.status).toBe(404);
  expect(unknown.headers).toMatchObject({
    'cache-control': 'no-store',
    'referrer-policy': 'no-referrer',
    'x-robots-tag': 'noindex',
  });
  const broken = vi.spyOn(ArrivalLink, 'findOne').mockRejectedValue(new Error('a secret'));
  const answer = await ask();
  broken.mockRestore();
  expect(answer.status).toBe(500);
  expect(answer.type).toBe('text/html');
  expect(answer.text).toContain('Something broke on our side');
  expect(answer.text).not.toContain('a secret');
});

it('saves nothing when the answer breaks its contract, as the error says', async () => {
  const client = await new ApiClient(app).signUp();
  const create = Groomer.create.bind(Groomer);
  const broken = vi.spyOn(Groomer, 'create').mockImplementation((async (input: never) => {
    const groomer = (await create(input)) as Groomer;
    groomer.name = null as never;
    return groomer;
  }) as never);
  const answer = await client.call(createGroomer, { body: { name: 'Mika', skills: [] } });
  broken.mockRestore();
  expect(answer.error).toMatchObject({ code: 'broken' });
  expect(answer.error.message).toContain('Nothing was saved');
  expect(await client.must(listGroomers)).toEqual([]);
});
