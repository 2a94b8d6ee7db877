import { afterCommit, unsafeAcrossBusinesses } from '#server/db/database.ts';
import { AppError, notFound } from '#server/errors.ts';
import { log } from '#server/log.ts';
import { invitationLetter } from '#server/mail/invitationLetter.ts';
import { currentMailer } from '#server/mail/openMail.ts';
import { sendLetter } from '#server/mail/sendLetter.ts';
import { Business } from '#server/models/Business.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Invitation } from '#server/models/Invitation.ts';
import { Membership, type RoleName } from '#server/models/Membership.ts';
import { User } from '#server/models/User.ts';
import { hashToken, makeToken } from '#server/services/secrets/tokens.ts';
import type { Actor } from './Actor.ts';

const validDays = 7;

/** Sends an invitation letter; an open one to the same address is closed, so one link works. */
export async function inviteMember(
  actor: Actor,
  input: { email: string; roles: RoleName[]; groomerId: string | null },
  origin: string,
  now: Date,
): Promise<void> {
  // A server without mail must say so now: the letter itself leaves after the answer.
  currentMailer();
  const user = await User.findOne({ where: { email: input.email } });
  if (user && (await Membership.findOne({ where: { userId: user.id } })))
    throw new AppError('alreadyThere', `${input.email} is already in this business.`, {
      fields: { email: 'is already in this business' },
    });
  await needFreeGroomer(input.groomerId, null);
  await Invitation.update({ closedAt: now }, { where: { email: input.email, closedAt: null } });
  const token = makeToken();
  await Invitation.create({
    ...input,
    tokenHash: hashToken(token),
    expiresAt: new Date(now.getTime() + validDays * 86_400_000),
  });
  const business = await Business.findByPk(actor.businessId);
  const letter = invitationLetter({
    to: input.email,
    businessName: business!.name,
    inviterName: actor.userName,
    roleWords: input.roles.map((role) => roleWords[role]).join(' and '),
    url: `${origin}/join/${token}`,
    validDays,
  });
  // Only after commit: a letter must not point to an invitation that was rolled back.
  afterCommit(() => {
    sendLetter(letter).catch((error: unknown) =>
      log.error({ err: error }, 'an invitation letter did not go out'),
    );
  });
}

export async function withdrawInvitation(invitationId: string, now: Date): Promise<void> {
  const [count] = await Invitation.update(
    { closedAt: now },
    { where: { id: invitationId, closedAt: null } },
  );
  if (count === 0) throw notFound('open invitation');
}

/** A groomer row stands for at most one person of the business. */
export async function needFreeGroomer(
  groomerId: string | null,
  exceptUserId: string | null,
): Promise<void> {
  if (groomerId === null) return;
  if (!(await Groomer.findByPk(groomerId))) throw notFound('groomer');
  const holder = await Membership.findOne({ where: { groomerId } });
  if (holder && holder.userId !== exceptUserId)
    throw new AppError('alreadyThere', 'This groomer already has a sign-in.', {
      fields: { groomerId: 'already has a sign-in' },
    });
}

/** The invitation behind a link, still open; throws linkUsedUp otherwise. */
export async function findInvitation(token: string, now: Date, lock = false): Promise<Invitation> {
  return unsafeAcrossBusinesses(async () => {
    const invitation = await Invitation.findOne({ where: { tokenHash: hashToken(token) }, lock });
    if (!invitation || invitation.closedAt || invitation.expiresAt <= now)
      throw new AppError(
        'linkUsedUp',
        'This invitation was used, withdrawn, or is too old. Ask for a new one.',
      );
    return invitation;
  });
}

const roleWords: Record<RoleName, string> = {
  operator: 'owner-operator',
  dispatcher: 'dispatcher',
  groomer: 'groomer',
};
