import { readSession } from '#src/api/sessionStore.ts';
import { openPhoneStore } from './openPhoneStore.ts';
import { ownerKeyOf } from './startQueue.ts';

/** How many taps of the signed-in person the server has not taken: ask before signing out. */
export async function countUnsent(): Promise<number> {
  const session = readSession();
  if (!session) return 0;
  const mine = ownerKeyOf(session);
  const queued = await (await openPhoneStore()).list();
  return queued.filter(({ ownerKey, refusedWhy }) => ownerKey === mine && refusedWhy === null)
    .length;
}
