import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { done, id, phone } from './values.ts';

export const textStatus = z.enum([
  'waiting',
  'attempting',
  'queued',
  'sent',
  'delivered',
  'undelivered',
  'failed',
  'stale',
  'notSent',
]);

/** One line of a household's thread: a text out or in. */
export const text = z.object({
  id,
  direction: z.enum(['out', 'in']),
  kind: z.string(),
  body: z.string(),
  at: z.string(),
  status: textStatus,
  /** Why it was not sent, in words. */
  reason: z.string().nullable(),
});

export const listTexts = endpoint({
  method: 'GET',
  path: '/api/texts',
  summary: 'Latest texts of the business, newest first',
  query: z.object({
    householdId: id.optional(),
    limit: z.coerce.number().int().min(1).max(200).default(100),
  }),
  response: z.array(
    text.extend({
      householdId: id.nullable(),
      householdName: z.string().nullable(),
      phone: z.string(),
    }),
  ),
});

/** Fake pages: exist only while the fakes are active, else 404. */
export const listFakePhones = endpoint({
  method: 'GET',
  path: '/api/fake/phones',
  summary: 'Every number the fake carrier has seen, with its thread',
  response: z.array(
    z.object({
      phone: z.string(),
      texts: z.array(
        z.object({
          sid: z.string(),
          direction: z.enum(['out', 'in']),
          body: z.string(),
          status: z.string(),
          at: z.string(),
        }),
      ),
    }),
  ),
});
export const replyFromFakePhone = endpoint({
  method: 'POST',
  path: '/api/fake/phones/reply',
  summary: 'Type a reply on a fake phone: a signed inbound webhook',
  body: z.object({ phone, body: z.string().trim().min(1).max(1600) }),
  response: done,
});
export const listFakeLetters = endpoint({
  method: 'GET',
  path: '/api/fake/letters',
  summary: 'Letters the fake mailbox kept',
  response: z.array(
    z.object({
      id: z.string(),
      to: z.string(),
      subject: z.string(),
      text: z.string(),
      at: z.string(),
    }),
  ),
});
