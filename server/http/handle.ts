import type { Request, RequestHandler, Response, Router } from 'express';
import { abilityRoles, type Ability } from '#shared/api/abilities.ts';
import type { BodyOf, Endpoint, ParamsOf, QueryOf, ResponseOf } from '#shared/api/endpoint.ts';
import type { z } from 'zod';
import { clock } from '#server/clock.ts';
import { AppError } from '#server/errors.ts';
import { type Actor, actAs } from '#server/services/accounts/Actor.ts';
import { needCsrf } from './csrf.ts';
import { registerEndpoint } from './endpointList.ts';

export interface Call<E extends Endpoint> {
  params: ParamsOf<E>;
  query: QueryOf<E>;
  body: BodyOf<E>;
  now: Date;
  req: Request;
  res: Response;
}

/** A call by someone signed in; its work runs inside the business's scope and transaction. */
export interface SignedCall<E extends Endpoint> extends Call<E> {
  actor: Actor;
}

/**
 * Binds an endpoint: ability → zod → use-case → response schema. The ability is required; 'public'
 * is said aloud through `handlePublic`. The answer is parsed on the way out, so a column nobody
 * named cannot leak. `readBody` reads a body that is not JSON, once it is known who sends it and
 * before the transaction opens.
 */
export function handle<E extends Endpoint>(
  router: Router,
  endpoint: E,
  ability: Exclude<Ability, 'public'>,
  fn: (call: SignedCall<E>) => Promise<z.input<E['response']>>,
  options: { readBody?: (req: Request, res: Response) => Promise<void> } = {},
): void {
  bind(router, endpoint, ability, async (req, res) => {
    const actor = needActor(req, ability);
    needCsrf(req, actor.sessionId);
    await options.readBody?.(req, res);
    const call = { ...readInput(endpoint, req), now: clock.now(), req, res, actor };
    // Parsed before the commit: an answer that breaks its contract takes the change back with it.
    const work = async () => endpoint.response.parse(await fn(call)) as ResponseOf<E>;
    return actAs(actor, work, { onlyReads: endpoint.method === 'GET' });
  });
}

/** Binds an endpoint anyone may call. */
export function handlePublic<E extends Endpoint>(
  router: Router,
  endpoint: E,
  fn: (call: Call<E>) => Promise<z.input<E['response']>>,
): void {
  bind(router, endpoint, 'public', (req, res) =>
    fn({ ...readInput(endpoint, req), now: clock.now(), req, res }).then(
      (result) => endpoint.response.parse(result) as ResponseOf<E>,
    ),
  );
}

function bind<E extends Endpoint>(
  router: Router,
  endpoint: E,
  ability: Ability,
  answer: (req: Request, res: Response) => Promise<ResponseOf<E>>,
): void {
  registerEndpoint(endpoint, ability);
  const handler: RequestHandler = async (req, res) => {
    const body = await answer(req, res);
    res.setHeader('Cache-Control', 'no-store');
    if (typeof body === 'string') res.send(body);
    else res.json(body);
  };
  const method = endpoint.method.toLowerCase() as 'get' | 'post' | 'put' | 'patch' | 'delete';
  router[method](endpoint.path, handler);
}

function needActor(req: Request, ability: Exclude<Ability, 'public'>): Actor {
  const actor = req.actor;
  if (!actor) throw new AppError('signInNeeded', 'Please sign in.');
  if (ability === 'signedIn') return actor;
  if (
    !(abilityRoles[ability] as readonly string[]).some((role) =>
      (actor.roles as string[]).includes(role),
    )
  )
    throw new AppError('notAllowed', 'Your roles in this business do not allow this.');
  return actor;
}

/** Every issue of params, query and body comes back at once, keyed by path. */
function readInput<E extends Endpoint>(endpoint: E, req: Request) {
  const parts = {
    params: endpoint.params.safeParse(req.params),
    query: endpoint.query.safeParse(req.query),
    body: endpoint.body.safeParse(req.body ?? {}),
  };
  // An id that is no id names nothing: the same 404 as another business's id.
  if (!parts.params.success) throw new AppError('notFound', 'There is no such page or thing here.');
  const issues = [...(parts.query.error?.issues ?? []), ...(parts.body.error?.issues ?? [])];
  if (issues.length > 0) {
    const fields: Record<string, string> = {};
    for (const issue of issues) fields[issue.path.join('.') || 'body'] ??= issue.message;
    const [first, message] = Object.entries(fields)[0]!;
    throw new AppError('badInput', `Please look at ${first}: ${message}.`, { fields });
  }
  return {
    params: parts.params.data as ParamsOf<E>,
    query: parts.query.data as QueryOf<E>,
    body: parts.body.data as BodyOf<E>,
  };
}
