import type { FakeMessage } from './FakeMessage.ts';

/** One phone's texts, oldest first. */
export interface FakeThread {
  phone: string;
  texts: { sid: string; direction: 'out' | 'in'; body: string; status: string; at: string }[];
}

/** Every phone the carrier has seen, the one with the latest text first. */
export function listThreads(messages: readonly FakeMessage[]): FakeThread[] {
  const threads = new Map<string, FakeThread>();
  for (const { sid, direction, from, to, body, status, createdAt } of messages) {
    const isIn = direction === 'inbound';
    const phone = isIn ? from : to;
    const thread = threads.get(phone) ?? { phone, texts: [] };
    thread.texts.push({ sid, direction: isIn ? 'in' : 'out', body, status, at: createdAt });
    // Put back at the end, so that the map's order is the order of the latest text.
    threads.delete(phone);
    threads.set(phone, thread);
  }
  return [...threads.values()].reverse();
}
