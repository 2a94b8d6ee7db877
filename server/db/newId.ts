import { v7 } from 'uuid';

/** UUIDv7: time-ordered, so primary keys grow at the end. */
export function newId(): string {
  return v7();
}
