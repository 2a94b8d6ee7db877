import { dropDatabase, makeDatabase } from '../support/freshDatabase.ts';
import type { Express } from 'express';
import request from 'supertest';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { requestPasswordReset } from '#shared/api/session.ts';
import { buildApp } from '#server/app.ts';

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
