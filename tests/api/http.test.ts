import { app, useApp } from '../support/useApp.ts';
import { existsSync } from 'node:fs';
import request from 'supertest';
import { afterEach, beforeAll, describe, expect, it, vi } from 'vitest';
import { errorBody } from '#shared/api/errors.ts';
import { createPlace } from '#shared/api/places.ts';
import { signIn } from '#shared/api/session.ts';
import { env, fakesActive, readEnv } from '#server/env.ts';
import { Place } from '#server/models/Place.ts';
import { ApiClient } from '../support/apiClient.ts';

useApp();
afterEach(() => vi.restoreAllMocks());

let client: ApiClient;
beforeAll(async () => {
  client = await new ApiClient(app).signUp();
});

/** "400 badInput" of a refusal in the one shape all have, which no cache keeps; else what is wrong. */
function refusalOf({ status, body, headers }: request.Response): string {
  const parsed = errorBody.strict().safeParse(body);
  if (!parsed.success) return `${status}, not in the shape: ${parsed.error.message}`;
  if (headers['cache-control'] !== 'no-store') return `${status}, may be cached`;
  return `${status} ${parsed.data.error.code}`;
}

const post = () =>
  client.agent.post(createPlace.path).set('X-Furlong-Csrf', client.session!.csrfToken);

describe('calls nobody can read', () => {
  it('bad JSON, JSON that is no object, and bodies of other kinds are 400', async () => {
    for (const body of ['{', '{"a":}', '"text"', '7', 'null', '\u0000'])
      expect(refusalOf(await post().type('json').send(body))).toBe('400 badInput');
    for (const body of ['[]', '{}'])
      expect(refusalOf(await post().type('json').send(body))).toBe('400 badInput');
    expect(refusalOf(await post().type('text/plain').send('kind=depot'))).toBe('400 badInput');
    expect(refusalOf(await post().type('form').send('kind=depot'))).toBe('400 badInput');
    expect(
      refusalOf(await post().set('Content-Type', 'application/json; charset=klingon').send('{}')),
    ).toBe('400 badInput');
    expect(refusalOf(await post().type('json').set('Content-Encoding', 'snappy').send('{}'))).toBe(
      '400 badInput',
    );
  });

  it('2 MB are 413, signed in or not', async () => {
    const body = JSON.stringify({ name: 'x'.repeat(2 * 1024 * 1024) });
    expect(refusalOf(await post().type('json').send(body))).toBe('413 tooLarge');
    expect(refusalOf(await request(app).post(signIn.path).type('json').send(body))).toBe(
      '413 tooLarge',
    );
  });

  it('odd escapes, doubled queries and broken cookies are refused, never a fault of ours', async () => {
    expect(refusalOf(await client.agent.get('/api/days/%E0%A4%A'))).toBe('400 badInput');
    const page = await request(app).get('/a/%E0%A4%A');
    expect([page.status, page.type]).toEqual([400, 'text/html']);
    expect(refusalOf(await client.agent.get('/api/households?page=abc'))).toBe('400 badInput');
    expect(refusalOf(await client.agent.get('/api/households?page=1&page=2'))).toBe('400 badInput');
    expect(refusalOf(await client.agent.get('/api/households?page=0'))).toBe('400 badInput');
    for (const cookie of [
      'furlong_access=j:{"a":1}',
      'furlong_access=%E0%A4%A',
      'furlong_access=a.b.c',
    ])
      expect(refusalOf(await request(app).get('/api/session').set('Cookie', cookie))).toBe(
        '401 signInNeeded',
      );
    const deep = `${'{"a":'.repeat(5000)}1${'}'.repeat(5000)}`;
    expect(refusalOf(await post().type('json').send(deep))).toBe('400 badInput');
  });

  it('names every wrong field, and no prototype can be slipped in', async () => {
    const answer = await post().type('json').send('{"__proto__":{"kind":"depot"},"lat":91}');
    expect(refusalOf(answer)).toBe('400 badInput');
    expect(Object.keys((answer.body as { error: { fields: object } }).error.fields).sort()).toEqual(
      ['kind', 'lat', 'lon', 'name'],
    );
  });
});

describe('paths', () => {
  it('unknown ones under /api are JSON 404 for every method, HEAD has no body', async () => {
    for (const method of ['get', 'post', 'put', 'patch', 'delete'] as const)
      expect(refusalOf(await client.agent[method]('/api/nothing'))).toBe('404 notFound');
    expect(refusalOf(await client.agent.get('/api'))).toBe('404 notFound');
    // The path exists, the method does not.
    expect(refusalOf(await client.agent.delete('/api/health'))).toBe('404 notFound');
    const head = await request(app).head('/api/health');
    expect([head.status, head.text]).toEqual([200, undefined]);
    expect((await request(app).head('/api/session')).status).toBe(401);
  });

  it('OPTIONS gives no other origin leave', async () => {
    const answer = await request(app)
      .options('/api/sign-in')
      .set('Origin', 'https://evil.example')
      .set('Access-Control-Request-Method', 'POST');
    expect(answer.status).toBeLessThan(500);
    for (const name of Object.keys(answer.headers)) expect(name).not.toMatch(/^access-control/);
  });

  it('everything else is the client’s page; missing files are 404, not pages and not faults', async () => {
    const page = await request(app).get('/days/2026-04-14');
    if (existsSync(`${env.rootFolder}/dist/index.html`)) {
      expect(page.status).toBe(200);
      expect(page.headers['content-type']).toContain('text/html');
      expect(page.headers['cache-control']).toBe('no-cache');
    } else expect(refusalOf(page)).toBe('503 notReady');
    expect(refusalOf(await request(app).get('/assets/nothing-1a2b.js'))).toBe('404 notFound');
    expect(refusalOf(await request(app).get('/assets/..%2f..%2fpackage.json'))).toBe(
      '404 notFound',
    );
    expect((await request(app).post('/assets/x.js')).status).toBe(405);
    expect(refusalOf(await request(app).get('/src/arrival.html'))).toBe('404 notFound');
    const outside = await request(app).get('/..%2fpackage.json');
    expect(outside.text).not.toContain('"dependencies"');
  });
});

describe('headers', () => {
  it('keep scripts, frames and types to our own, on pages, answers and errors', async () => {
    for (const path of ['/', '/api/health', '/api/nothing', '/a/AAAAAAAAAAAAAAAAAAAAAA']) {
      const { headers } = await request(app).get(path);
      const csp = headers['content-security-policy']!;
      for (const rule of [
        "default-src 'self'",
        "script-src 'self'",
        "connect-src 'self'",
        "object-src 'none'",
        "frame-ancestors 'none'",
        "base-uri 'self'",
      ])
        expect(csp.split(';')).toContain(rule);
      expect(csp).not.toContain('unsafe-eval');
      expect(csp).not.toMatch(/script-src[^;]*unsafe-inline/);
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['x-frame-options']).toBeDefined();
      expect(headers['x-powered-by']).toBeUndefined();
      expect(headers['referrer-policy']).toMatch(/^(same-origin|no-referrer)$/);
      // Plain http on loopback: a promise of https would lock people out.
      expect(headers['strict-transport-security']).toBeUndefined();
    }
  });
});

describe('a fault of ours', () => {
  it('is a bland 500 with a request id and none of the detail', async () => {
    vi.spyOn(Place, 'create').mockRejectedValue(
      new Error('ER_SECRET: password of root is hunter2 at /srv/furlong/server/x.ts'),
    );
    const answer = await post().send({ kind: 'depot', name: 'Yard', lat: 41, lon: -36 });
    expect(refusalOf(answer)).toBe('500 broken');
    expect(answer.text).not.toMatch(/SECRET|hunter2|\/srv|stack|at /);
    const { requestId } = (answer.body as { error: { requestId: string } }).error;
    expect(requestId).toMatch(/^[0-9a-f-]{36}$/);
    const other = await client.agent.get('/api/nothing');
    expect((other.body as { error: { requestId: string } }).error.requestId).not.toBe(requestId);
  });
});

describe('the fakes', () => {
  it('are active only when wanted, on loopback and not in production', () => {
    const active = (source: Record<string, string>) =>
      fakesActive(readEnv({ FURLONG_FAKES: '1', ...source } as never));
    const PUBLIC_URL = 'https://vans.example.org';
    expect(active({})).toBe(true);
    expect(active({ HOST: 'localhost' })).toBe(true);
    expect(active({ HOST: '::1' })).toBe(true);
    expect(active({ FURLONG_FAKES: '0' })).toBe(false);
    expect(active({ HOST: '0.0.0.0', PUBLIC_URL })).toBe(false);
    expect(active({ HOST: '192.168.1.9', PUBLIC_URL })).toBe(false);
    // On loopback behind a proxy: the whole world reaches it.
    expect(active({ PUBLIC_URL })).toBe(false);
    expect(active({ NODE_ENV: 'production' })).toBe(false);
    expect(fakesActive(readEnv({}))).toBe(false);
  });

  it('are 404 like any unknown page when they are not', async () => {
    const mutable = env as { fakesWanted: boolean; isLoopback: boolean; isProduction: boolean };
    const was = { ...mutable };
    for (const change of [{ fakesWanted: false }, { isLoopback: false }, { isProduction: true }])
      try {
        Object.assign(mutable, change);
        for (const path of ['/api/fake/phones', '/api/fake/letters'])
          expect(refusalOf(await request(app).get(path))).toBe('404 notFound');
        expect(
          refusalOf(await request(app).post('/api/fake/phones/reply').send({ nonsense: true })),
        ).toBe('404 notFound');
        const session = await client.renew();
        expect(session.fakesActive).toBe(false);
      } finally {
        Object.assign(mutable, was);
      }
    expect((await client.renew()).fakesActive).toBe(true);
  });
});
