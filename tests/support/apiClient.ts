import type { Express } from 'express';
import request from 'supertest';
import type { z } from 'zod';
import type { Endpoint } from '#shared/api/endpoint.ts';
import { getSession, signIn, signUp, type Session } from '#shared/api/session.ts';

interface Input<E extends Endpoint> {
  params?: Record<string, string>;
  query?: Record<string, string | number>;
  body?: z.input<E['body']> | Record<string, unknown>;
}

export interface Answer<E extends Endpoint> {
  status: number;
  /** The parsed response on 200; the error's body otherwise. */
  body: z.output<E['response']>;
  error: { code: string; message: string; fields?: Record<string, string> };
  headers: Record<string, string>;
  text: string;
}

/** A person at a browser: keeps cookies and sends the CSRF token like the client does. */
export class ApiClient {
  readonly agent: ReturnType<typeof request.agent>;
  session: Session | null = null;

  constructor(app: Express) {
    this.agent = request.agent(app);
  }

  async call<E extends Endpoint>(endpoint: E, input: Input<E> = {}): Promise<Answer<E>> {
    const path = endpoint.path.replace(
      /:(\w+)/g,
      (_all, name: string) => input.params?.[name] ?? name,
    );
    const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
    let call = this.agent[method](path).query(input.query ?? {});
    if (this.session) call = call.set('X-Furlong-Csrf', this.session.csrfToken);
    if (endpoint.method !== 'GET') call = call.send((input.body ?? {}) as object);
    const answer = await call;
    return {
      status: answer.status,
      body: answer.body as z.output<E['response']>,
      error: (answer.body as { error?: Answer<E>['error'] } | null)?.error as Answer<E>['error'],
      headers: answer.headers as Record<string, string>,
      text: answer.text,
    };
  }

  /** Calls and insists on success, so that a test's arrangement cannot fail silently. */
  async must<E extends Endpoint>(
    endpoint: E,
    input: Input<E> = {},
  ): Promise<z.output<E['response']>> {
    const answer = await this.call(endpoint, input);
    if (answer.status !== 200)
      throw new Error(`${endpoint.method} ${endpoint.path}: ${answer.status} ${answer.text}`);
    return answer.body;
  }

  async signUp(fields: Partial<z.input<(typeof signUp)['body']>> = {}): Promise<this> {
    this.session = await this.must(signUp, { body: { ...newBusiness(), ...fields } });
    return this;
  }

  async signIn(email: string, password: string): Promise<this> {
    this.session = await this.must(signIn, { body: { email, password } });
    return this;
  }

  async renew(): Promise<Session> {
    this.session = await this.must(getSession);
    return this.session;
  }
}

let count = 0;

/** A new business of the test's own, so that nothing has to be emptied between tests. */
export function newBusiness() {
  count += 1;
  return {
    name: 'Odile',
    email: `odile${count}.${process.pid}.${Date.now()}@example.org`,
    password: 'scissors and comb',
    businessName: `Saltmarsh ${count}`,
    timeZone: 'Atlantic/Azores',
    currency: 'EUR',
    distanceUnit: 'km' as const,
    weightUnit: 'kg' as const,
  };
}
