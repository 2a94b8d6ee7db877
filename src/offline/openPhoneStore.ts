import { deviceId } from './deviceId.ts';
import { idbStore } from './idbStore.ts';
import { memoryStore } from './memoryStore.ts';
import type { PhoneStore } from './PhoneStore.ts';

let opened: Promise<PhoneStore> | null = null;

/** The one store of this page; in memory where the browser refuses a database. */
export function openPhoneStore(): Promise<PhoneStore> {
  opened ??= idbStore().catch(() => memoryStore(deviceId()));
  return opened;
}
