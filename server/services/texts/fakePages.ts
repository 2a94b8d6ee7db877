import { notFound } from '#server/errors.ts';
import { fakesActive } from '#server/env.ts';
import { listFakeLetters as listKept } from '#server/mail/listFakeLetters.ts';
import { badField } from '#server/errors.ts';
import { currentFake } from './openCarriers.ts';

/** Every phone the fake carrier has seen. 404 while the fakes are not active. */
export function listFakePhones() {
  return needFake().listThreads();
}

/** Types a reply on a fake phone. 404 while the fakes are not active, 400 for a phone nobody texted. */
export async function replyFromFakePhone(phone: string, body: string): Promise<void> {
  const fake = needFake();
  if (!fake.listThreads().some((thread) => thread.phone === phone))
    throw badField('phone', 'must be a phone that has got a text');
  await fake.reply(phone, body);
}

/** Letters the fake mailbox kept, newest first. 404 while the fakes are not active. */
export function listFakeLetters() {
  const letters = fakesActive() ? listKept() : null;
  if (!letters) throw notFound('page');
  return letters.map(({ id, to, subject, text, at }) => ({ id, to, subject, text, at }));
}

function needFake() {
  const fake = currentFake();
  if (!fake) throw notFound('page');
  return fake;
}
