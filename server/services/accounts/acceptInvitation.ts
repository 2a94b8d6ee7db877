import { inBusiness, inTransaction } from '#server/db/database.ts';
import { AppError } from '#server/errors.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Membership } from '#server/models/Membership.ts';
import { User } from '#server/models/User.ts';
import { createUser } from './createUser.ts';
import { findInvitation, needFreeGroomer } from './inviteMember.ts';
import { openSession, type SessionTokens } from './openSession.ts';
import { hashPassword, passwordFits } from './passwords.ts';

/** What the invited person sees before joining. */
export async function describeInvitation(token: string, now: Date) {
  const invitation = await findInvitation(token, now);
  const [business, user] = await Promise.all([
    Business.findByPk(invitation.businessId),
    User.findOne({ where: { email: invitation.email } }),
  ]);
  return {
    businessName: business!.name,
    email: invitation.email,
    roles: invitation.roles,
    knownPerson: user !== null,
  };
}

/** Joins the business: a known person confirms with the present password, a new one chooses it. */
export async function acceptInvitation(
  token: string,
  input: { name?: string | undefined; password: string },
  now: Date,
): Promise<SessionTokens> {
  const invitation = await findInvitation(token, now);
  const known = await User.findOne({ where: { email: invitation.email } });
  if (known && !(await passwordFits(input.password, known.passwordHash)))
    throw new AppError('wrongSignIn', 'This is not the password of your sign-in.', {
      fields: { password: 'is not the password of your sign-in' },
    });
  if (!known && !input.name)
    throw new AppError('badInput', 'Please give your name.', {
      fields: { name: 'must not be empty' },
    });
  const passwordHash = known ? known.passwordHash : await hashPassword(input.password);
  return inTransaction(async () => {
    // Looked up again under a lock: a double click must not join twice.
    const open = await findInvitation(token, now, true);
    const user =
      known ?? (await createUser({ name: input.name!, email: open.email, passwordHash }, now));
    await inBusiness(open.businessId, () => join(open, user, now));
    return openSession(user.id, open.businessId, now);
  });
}

async function join(
  invitation: Awaited<ReturnType<typeof findInvitation>>,
  user: User,
  now: Date,
): Promise<void> {
  await invitation.update({ closedAt: now });
  const groomerId = invitation.groomerId ?? (await ownGroomer(invitation.roles, user.name));
  await needFreeGroomer(groomerId, user.id);
  const present = await Membership.findOne({ where: { userId: user.id } });
  if (present) {
    await present.update({ roles: [...new Set([...present.roles, ...invitation.roles])] });
    return;
  }
  await Membership.create({ userId: user.id, roles: invitation.roles, groomerId, createdAt: now });
}

/** A groomer invited without a groomer row gets one, so that shifts can name them. */
async function ownGroomer(roles: string[], name: string): Promise<string | null> {
  if (!roles.includes('groomer')) return null;
  return (await Groomer.create({ name, skills: [] })).id;
}
