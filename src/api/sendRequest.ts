import type { z } from 'zod';
import type { Endpoint, ResponseOf } from '#shared/api/endpoint.ts';
import { errorBody } from '#shared/api/errors.ts';
import { ApiError } from './ApiError.ts';

type Part<Key extends string, Value> =
  Record<never, never> extends Value ? { [K in Key]?: Value } : { [K in Key]: Value };

/** What a call of one endpoint needs; parts without a required field may be left out. */
export type CallParts<E extends Endpoint> = Part<'params', z.input<E['params']>> &
  Part<'query', z.input<E['query']>> &
  Part<'body', z.input<E['body']>> & { signal?: AbortSignal };

interface LooseParts {
  params?: unknown;
  query?: unknown;
  body?: unknown;
  signal?: AbortSignal;
}

/** One request, one parsed answer, no second try. Throws `ApiError`; an abort passes through. */
export async function sendRequest<E extends Endpoint>(
  endpoint: E,
  parts: CallParts<E>,
  csrfToken: string | null,
): Promise<ResponseOf<E>> {
  const { params, query, body, signal } = parts as LooseParts;
  const headers: Record<string, string> = { Accept: 'application/json' };
  const hasBody = endpoint.method !== 'GET' && endpoint.method !== 'DELETE';
  if (hasBody) headers['Content-Type'] = 'application/json';
  if (endpoint.method !== 'GET' && csrfToken) headers['X-Furlong-Csrf'] = csrfToken;

  let answer: Response;
  try {
    answer = await fetch(addressOf(endpoint.path, params, query), {
      method: endpoint.method,
      headers,
      credentials: 'same-origin',
      ...(hasBody ? { body: JSON.stringify(body ?? {}) } : {}),
      ...(signal ? { signal } : {}),
    });
  } catch (cause) {
    if (signal?.aborted) throw cause;
    throw offline();
  }
  const content = await readContent(answer);
  if (!answer.ok) throw refusal(answer.status, content);
  const parsed = endpoint.response.safeParse(content);
  if (parsed.success) return parsed.data as ResponseOf<E>;
  throw new ApiError({
    code: 'badAnswer',
    status: answer.status,
    message: 'The server answered in a form this page does not know. Reload the page.',
    body: content,
  });
}

/** The path with its `:name` parts filled in and the query behind it. */
export function addressOf(path: string, params: unknown, query: unknown): string {
  const filled = path.replace(/:(\w+)/g, (_, name: string) => {
    const value = (params as Record<string, unknown> | undefined)?.[name];
    if (value === undefined) throw new Error(`${path} needs ${name}`);
    return encodeURIComponent(String(value));
  });
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query ?? {}))
    if (value !== undefined && value !== null) search.set(name, String(value));
  const tail = search.toString();
  return tail ? `${filled}?${tail}` : filled;
}

async function readContent(answer: Response): Promise<unknown> {
  try {
    const isJson = answer.headers.get('content-type')?.includes('json') ?? false;
    return isJson ? await answer.json() : await answer.text();
  } catch {
    throw offline();
  }
}

function refusal(status: number, content: unknown): ApiError {
  const parsed = errorBody.safeParse(content);
  if (parsed.success) return new ApiError({ ...parsed.data.error, status, body: content });
  // A proxy or a server that is starting answers without our error shape.
  const starting = status === 502 || status === 503 || status === 504;
  return new ApiError({
    code: starting ? 'notReady' : 'broken',
    status,
    message: starting
      ? 'The server is not ready yet. Try again in a moment.'
      : `The server could not answer (${status}). Try again; if it stays, tell the desk.`,
    body: content,
  });
}

function offline(): ApiError {
  return new ApiError({
    code: 'offline',
    status: 0,
    message: 'No connection to Furlong. Check the network, then try again.',
  });
}
