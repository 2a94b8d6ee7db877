import { openPhoneStore } from './openPhoneStore.ts';

/** At sign-out: runs with their access notes leave the phone. Unsent taps stay for their owner. */
export async function forgetRuns(): Promise<void> {
  await (await openPhoneStore()).forgetRuns(() => true);
}
