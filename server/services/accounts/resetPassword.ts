import { inTransaction } from '#server/db/database.ts';
import { AppError } from '#server/errors.ts';
import { log } from '#server/log.ts';
import { currentMailer } from '#server/mail/openMail.ts';
import { passwordResetLetter } from '#server/mail/passwordResetLetter.ts';
import { sendLetter } from '#server/mail/sendLetter.ts';
import { PasswordReset } from '#server/models/PasswordReset.ts';
import { Session } from '#server/models/Session.ts';
import { User } from '#server/models/User.ts';
import { hashToken, makeToken } from '#server/services/secrets/tokens.ts';
import { hashPassword } from './passwords.ts';

const validMs = 60 * 60 * 1000;

/**
 * Sends a letter when the address is known, and says nothing either way: the work is not waited for,
 * because the time it takes would tell. Throws 'notReady' when no mail can go, for every address.
 */
export async function requestPasswordReset(
  email: string,
  origin: string,
  now: Date,
): Promise<void> {
  currentMailer();
  sendReset(email, origin, now).catch((error: unknown) =>
    log.error({ err: error }, 'a reset letter did not go out'),
  );
}

async function sendReset(email: string, origin: string, now: Date): Promise<void> {
  const user = await User.findOne({ where: { email } });
  if (!user) return;
  const token = makeToken();
  await PasswordReset.create({
    userId: user.id,
    tokenHash: hashToken(token),
    expiresAt: new Date(now.getTime() + validMs),
  });
  await sendLetter(
    passwordResetLetter({
      to: user.email,
      name: user.name,
      url: `${origin}/reset/${token}`,
      validMinutes: validMs / 60_000,
    }),
  );
}

/** A link works once and for an hour; the person's other links and every sign-in end. */
export async function resetPassword(token: string, password: string, now: Date): Promise<void> {
  const passwordHash = await hashPassword(password);
  await inTransaction(async () => {
    const reset = await PasswordReset.findOne({
      where: { tokenHash: hashToken(token) },
      lock: true,
    });
    if (!reset || reset.usedAt || reset.expiresAt <= now)
      throw new AppError(
        'linkUsedUp',
        'This link has been used or is over an hour old. Ask for a new one.',
      );
    // Every open link of the person, for older letters may lie in other hands.
    await PasswordReset.update({ usedAt: now }, { where: { userId: reset.userId, usedAt: null } });
    await User.update({ passwordHash }, { where: { id: reset.userId } });
    await Session.update({ revokedAt: now }, { where: { userId: reset.userId, revokedAt: null } });
  });
}
