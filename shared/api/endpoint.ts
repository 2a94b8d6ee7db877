import { z } from 'zod';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/**
 * One use-case's contract, written once: the server binds it with `handle`, the browser calls it
 * with `callApi`. `path` carries `:name` parts that `params` must name.
 */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Response extends z.ZodType = z.ZodType,
> {
  method: Method;
  path: string;
  summary: string;
  params: Params;
  query: Query;
  body: Body;
  response: Response;
}

const nothing = z.object({});

/** Missing parts default to an empty object, so every call has the same shape. */
export function endpoint<
  Response extends z.ZodType,
  Params extends z.ZodType = typeof nothing,
  Query extends z.ZodType = typeof nothing,
  Body extends z.ZodType = typeof nothing,
>(spec: {
  method: Method;
  path: string;
  summary: string;
  params?: Params;
  query?: Query;
  body?: Body;
  response: Response;
}): Endpoint<Params, Query, Body, Response> {
  return {
    method: spec.method,
    path: spec.path,
    summary: spec.summary,
    params: spec.params ?? (nothing as unknown as Params),
    query: spec.query ?? (nothing as unknown as Query),
    body: spec.body ?? (nothing as unknown as Body),
    response: spec.response,
  };
}

export type ParamsOf<E extends Endpoint> = z.output<E['params']>;
export type QueryOf<E extends Endpoint> = z.output<E['query']>;
export type BodyOf<E extends Endpoint> = z.output<E['body']>;
export type ResponseOf<E extends Endpoint> = z.output<E['response']>;
