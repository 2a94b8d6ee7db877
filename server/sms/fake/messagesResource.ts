import type { IncomingMessage } from 'node:http';
import { messageJson, type FakeMessage } from './FakeMessage.ts';
import type { MessageStore } from './openMessageStore.ts';
import type { Refusal } from './refusals.ts';

export interface Answer {
  status: number;
  json: unknown;
  /** The message a POST made. */
  made?: FakeMessage;
}

/** The documented messages resource: create, list newest first with pages, fetch one. */
export async function answerMessages(
  request: IncomingMessage,
  account: { accountSid: string; authToken: string },
  store: MessageStore,
  create: (form: URLSearchParams) => FakeMessage | Refusal,
): Promise<Answer> {
  const { accountSid } = account;
  const url = new URL(request.url ?? '/', 'http://carrier');
  const expected = Buffer.from(`${accountSid}:${account.authToken}`).toString('base64');
  if (request.headers.authorization !== `Basic ${expected}`)
    return refuse({ httpStatus: 401, code: 20003, message: 'Authenticate' });
  const path = /^\/2010-04-01\/Accounts\/(\w+)\/Messages(?:\/(\w+))?\.json$/.exec(url.pathname);
  if (!path || path[1] !== accountSid) return missing(url.pathname);
  if (path[2] !== undefined) {
    const found = store.find(path[2]);
    return found ? { status: 200, json: messageJson(found, accountSid) } : missing(url.pathname);
  }
  if (request.method === 'GET')
    return { status: 200, json: listJson(url, store.all(), accountSid) };
  if (request.method !== 'POST')
    return refuse({ httpStatus: 405, code: 20004, message: 'Method not allowed' });
  const made = create(new URLSearchParams(await readBody(request)));
  if ('code' in made) return refuse(made);
  return { status: 201, json: messageJson(made, accountSid), made };
}

export function refuse(refusal: Refusal): Answer {
  const { code, message, httpStatus } = refusal;
  return {
    status: httpStatus,
    json: {
      code,
      message,
      more_info: `https://www.twilio.com/docs/errors/${code}`,
      status: httpStatus,
    },
  };
}

function missing(path: string): Answer {
  return refuse({
    httpStatus: 404,
    code: 20404,
    message: `The requested resource ${path} was not found`,
  });
}

function listJson(url: URL, all: FakeMessage[], accountSid: string) {
  const asked = (name: string) => url.searchParams.get(name);
  const pageSize = Math.min(1000, Math.max(1, Number(asked('PageSize') ?? 50) || 50));
  const page = Math.max(0, Number(asked('Page') ?? 0) || 0);
  const kept = all
    .filter((message) => asked('To') === null || message.to === asked('To'))
    .filter((message) => asked('From') === null || message.from === asked('From'))
    .toReversed();
  const shown = kept.slice(page * pageSize, (page + 1) * pageSize);
  const pageUri = (number: number) => {
    const query = new URLSearchParams(url.searchParams);
    query.set('PageSize', String(pageSize));
    query.set('Page', String(number));
    return `${url.pathname}?${query}`;
  };
  return {
    end: page * pageSize + shown.length - 1,
    first_page_uri: pageUri(0),
    messages: shown.map((message) => messageJson(message, accountSid)),
    next_page_uri: (page + 1) * pageSize < kept.length ? pageUri(page + 1) : null,
    page,
    page_size: pageSize,
    previous_page_uri: page > 0 ? pageUri(page - 1) : null,
    start: page * pageSize,
    uri: pageUri(page),
  };
}

async function readBody(request: IncomingMessage): Promise<string> {
  const chunks: Buffer[] = [];
  for await (const chunk of request) chunks.push(chunk as Buffer);
  return Buffer.concat(chunks).toString('utf8');
}
