import { Op } from 'sequelize';
import { AppError, badField, notFound } from '#server/errors.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Invitation } from '#server/models/Invitation.ts';
import { Membership, type RoleName } from '#server/models/Membership.ts';
import { Session } from '#server/models/Session.ts';
import { User } from '#server/models/User.ts';
import { needFreeGroomer } from './inviteMember.ts';
import type { Actor } from './Actor.ts';

export async function listMembers(now: Date) {
  const memberships = await Membership.findAll({ order: [['createdAt', 'ASC']] });
  const users = await User.findAll({ where: { id: memberships.map((m) => m.userId) } });
  const invitations = await Invitation.findAll({
    where: { closedAt: null, expiresAt: { [Op.gt]: now } },
    order: [['expiresAt', 'DESC']],
  });
  return {
    members: memberships.map((membership) => ({
      membership,
      user: users.find((user) => user.id === membership.userId)!,
    })),
    invitations,
  };
}

/** Changes roles and the groomer row; the last operator stays one. */
export async function updateMember(
  userId: string,
  input: { roles: RoleName[]; groomerId?: string | null | undefined },
) {
  const membership = await needMembership(userId);
  if (!input.roles.includes('operator')) await needOtherOperator(userId);
  const user = (await User.findByPk(userId))!;
  let groomerId = input.groomerId === undefined ? (membership.groomerId ?? null) : input.groomerId;
  await needFreeGroomer(groomerId, userId);
  if (groomerId === null && input.roles.includes('groomer'))
    groomerId = (await Groomer.create({ name: user.name, skills: [] })).id;
  await membership.update({ roles: input.roles, groomerId });
  return { membership, user };
}

/** Ends the membership and every sign-in of the person in this business. */
export async function removeMember(actor: Actor, userId: string, now: Date): Promise<void> {
  const membership = await needMembership(userId);
  await needOtherOperator(userId);
  await membership.destroy();
  await Session.update(
    { revokedAt: now },
    { where: { userId, businessId: actor.businessId, revokedAt: null } },
  );
}

async function needMembership(userId: string): Promise<Membership> {
  const membership = await Membership.findOne({ where: { userId }, lock: true });
  if (!membership) throw notFound('person');
  return membership;
}

async function needOtherOperator(userId: string): Promise<void> {
  const memberships = await Membership.findAll({ lock: true });
  const own = memberships.find((one) => one.userId === userId);
  if (!own?.roles.includes('operator')) return;
  if (!memberships.some((one) => one.userId !== userId && one.roles.includes('operator')))
    throw memberships.length > 0
      ? badField('roles', 'a business keeps at least one owner-operator')
      : new AppError('notFound', 'There is no such person here.');
}
