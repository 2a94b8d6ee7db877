import { notFound } from '#server/errors.ts';
import { Groomer } from '#server/models/Groomer.ts';
import { Membership } from '#server/models/Membership.ts';

/** Groomers with the sign-in that works as each, when there is one. */
export async function listGroomers() {
  const [groomers, memberships] = await Promise.all([
    Groomer.findAll({ order: [['name', 'ASC']] }),
    Membership.findAll(),
  ]);
  return groomers.map((groomer) => ({ groomer, userId: userOf(groomer.id, memberships) }));
}

export async function createGroomer(input: { name: string; skills: string[] }) {
  return { groomer: await Groomer.create(input), userId: null };
}

export async function updateGroomer(
  groomerId: string,
  change: Partial<Pick<Groomer, 'name' | 'skills' | 'active'>>,
) {
  const groomer = await Groomer.findByPk(groomerId);
  if (!groomer) throw notFound('groomer');
  await groomer.update(change);
  return { groomer, userId: userOf(groomer.id, await Membership.findAll()) };
}

function userOf(groomerId: string, memberships: Membership[]): string | null {
  return memberships.find((one) => one.groomerId === groomerId)?.userId ?? null;
}
