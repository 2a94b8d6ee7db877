import { AsyncLocalStorage } from 'node:async_hooks';
import { Sequelize } from 'sequelize';

/**
 * What a query belongs to, carried by the call, not by arguments: the business and the open
 * transaction. Sequelize asks it for the transaction through `useCLS`, so no query can be left
 * outside one by mistake.
 */
const storage = new AsyncLocalStorage<Map<string, unknown>>();

Sequelize.useCLS({
  bind: (fn: unknown) => fn,
  get: (key: string) => storage.getStore()?.get(key),
  set: (key: string, value: unknown) => void storage.getStore()?.set(key, value),
  run: (fn: (context: unknown) => void) =>
    storage.run(new Map(storage.getStore()), fn as () => void),
} as never);

/** The business queries are scoped to, or 'across' inside `unsafeAcrossBusinesses`, or null. */
export function currentScope(): string | 'across' | null {
  return (storage.getStore()?.get('businessId') as string | undefined) ?? null;
}

export function hasTransaction(): boolean {
  return storage.getStore()?.get('transaction') != null;
}

export function withScope<Result>(
  businessId: string | 'across',
  fn: () => Promise<Result>,
): Promise<Result> {
  const store = new Map(storage.getStore());
  store.set('businessId', businessId);
  return storage.run(store, fn);
}
