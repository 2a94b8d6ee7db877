import { unsafeAcrossBusinesses } from '#server/db/database.ts';
import { AppError } from '#server/errors.ts';
import { Membership } from '#server/models/Membership.ts';
import { Session } from '#server/models/Session.ts';
import { User } from '#server/models/User.ts';
import type { Actor } from './Actor.ts';
import { openSession, type SessionTokens } from './openSession.ts';
import { passwordFits } from './passwords.ts';

/** The same answer for an unknown address and a wrong password. */
export async function signIn(email: string, password: string, now: Date): Promise<SessionTokens> {
  const user = await User.findOne({ where: { email } });
  const fits = await passwordFits(password, user?.passwordHash ?? null);
  if (!user || !fits)
    throw new AppError('wrongSignIn', 'E-mail address and password do not fit together.');
  return unsafeAcrossBusinesses(async () => {
    const membership = await Membership.findOne({
      where: { userId: user.id },
      order: [['createdAt', 'ASC']],
    });
    if (!membership)
      throw new AppError(
        'notAllowed',
        'This sign-in belongs to no business any more. Ask for an invitation.',
      );
    return openSession(user.id, membership.businessId, now);
  });
}

export async function signOut(actor: Actor, now: Date): Promise<void> {
  await Session.update({ revokedAt: now }, { where: { id: actor.sessionId } });
}

/** A token names one business: working in another one starts another sign-in and ends this one. */
export async function switchBusiness(
  actor: Actor,
  businessId: string,
  now: Date,
): Promise<SessionTokens> {
  return unsafeAcrossBusinesses(async () => {
    const membership = await Membership.findOne({ where: { userId: actor.userId, businessId } });
    if (!membership) throw new AppError('notFound', 'There is no such business for you.');
    await Session.update({ revokedAt: now }, { where: { id: actor.sessionId } });
    return openSession(actor.userId, businessId, now);
  });
}
