import { UniqueConstraintError } from 'sequelize';
import { AppError } from '#server/errors.ts';
import { User } from '#server/models/User.ts';

/**
 * A new person. Throws 'alreadyThere' when somebody made a sign-in with this address between the
 * caller's look and now, as the second click of a double click does.
 */
export async function createUser(
  fields: { name: string; email: string; passwordHash: string },
  now: Date,
): Promise<User> {
  try {
    return await User.create({ ...fields, createdAt: now });
  } catch (error) {
    if (!(error instanceof UniqueConstraintError)) throw error;
    throw knownEmail();
  }
}

/** The refusal of an address that has a sign-in already. */
export function knownEmail(): AppError {
  return new AppError(
    'alreadyThere',
    'This e-mail address already has a sign-in. Give its password, or reset it.',
    { fields: { email: 'already has a sign-in' } },
  );
}
