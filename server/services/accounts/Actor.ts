import { inBusiness } from '#server/db/database.ts';
import type { RoleName } from '#server/models/Membership.ts';

/** The signed-in person in one business. */
export interface Actor {
  userId: string;
  userName: string;
  email: string;
  businessId: string;
  sessionId: string;
  roles: RoleName[];
  groomerId: string | null;
  accessEndsAt: Date;
}

/** Runs a use-case in the actor's business: its scope and one transaction. */
export function actAs<Result>(
  actor: Actor,
  fn: () => Promise<Result>,
  options: { onlyReads?: boolean } = {},
): Promise<Result> {
  return inBusiness(actor.businessId, fn, options);
}
