import { inBusiness, inTransaction } from '#server/db/database.ts';
import { newId } from '#server/db/newId.ts';
import { AppError } from '#server/errors.ts';
import { Business } from '#server/models/Business.ts';
import { Membership } from '#server/models/Membership.ts';
import { User } from '#server/models/User.ts';
import { currentTextRules } from '#server/services/texts/textRules.ts';
import { createUser, knownEmail } from './createUser.ts';
import { openSession, type SessionTokens } from './openSession.ts';
import { hashPassword, passwordFits } from './passwords.ts';
import { startingWeights } from './startingWeights.ts';

export interface SignUpInput {
  name: string;
  email: string;
  password: string;
  businessName: string;
  timeZone: string;
  currency: string;
  distanceUnit: string;
  weightUnit: string;
}

/** Creates a business and its operator; a person who already has a sign-in gives its password. */
export async function signUp(
  input: SignUpInput,
  now: Date,
): Promise<SessionTokens & { businessId: string }> {
  await refuseWhileClosed();
  const known = await User.findOne({ where: { email: input.email } });
  if (known && !(await passwordFits(input.password, known.passwordHash))) throw knownEmail();
  const passwordHash = known ? known.passwordHash : await hashPassword(input.password);
  return inTransaction(async () => {
    const user =
      known ?? (await createUser({ name: input.name, email: input.email, passwordHash }, now));
    const businessId = newId();
    await Business.create({
      id: businessId,
      name: input.businessName,
      timeZone: input.timeZone,
      currency: input.currency,
      distanceUnit: input.distanceUnit,
      weightUnit: input.weightUnit,
      weights: startingWeights,
      createdAt: now,
    });
    await inBusiness(businessId, () =>
      Membership.create({ userId: user.id, roles: ['operator', 'dispatcher'], createdAt: now }),
    );
    return { ...(await openSession(user.id, businessId, now)), businessId };
  });
}

/** A new business would text on the account of whoever runs this server: that person lets it in. */
async function refuseWhileClosed(): Promise<void> {
  const rules = currentTextRules();
  if (!rules || rules.signUpsOpen || (await Business.count()) === 0) return;
  throw new AppError(
    'notAllowed',
    'This server takes no new businesses by itself. Ask the person who runs it to open sign-up.',
  );
}
