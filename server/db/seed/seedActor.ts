import type { Actor } from '#server/services/accounts/Actor.ts';
import { Membership } from '#server/models/Membership.ts';
import { User } from '#server/models/User.ts';

/** The demo's own people acting through the services, so that the log names them. Inside a business. */
export async function seedActor(businessId: string, email: string): Promise<Actor> {
  const user = (await User.findOne({ where: { email } }))!;
  const membership = (await Membership.findOne({ where: { userId: user.id } }))!;
  return {
    userId: user.id,
    userName: user.name,
    email: user.email,
    businessId,
    sessionId: '',
    roles: membership.roles,
    groomerId: membership.groomerId ?? null,
    accessEndsAt: new Date(0),
  };
}
