import type { z } from 'zod';
import type { listGateOpenings, listMembers, member } from '#shared/api/members.ts';
import type { Household } from '#server/models/Household.ts';
import type { Invitation } from '#server/models/Invitation.ts';
import type { Membership } from '#server/models/Membership.ts';
import type { Site } from '#server/models/Site.ts';
import type { User } from '#server/models/User.ts';

interface MemberFacts {
  membership: Membership;
  user: User;
}

export function presentMember({ membership, user }: MemberFacts): z.input<typeof member> {
  return {
    userId: user.id,
    name: user.name,
    email: user.email,
    roles: membership.roles,
    groomerId: membership.groomerId ?? null,
  };
}

export function presentMembers(facts: {
  members: MemberFacts[];
  invitations: Invitation[];
}): z.input<(typeof listMembers)['response']> {
  return {
    members: facts.members.map(presentMember),
    invitations: facts.invitations.map(({ id, email, roles, expiresAt }) => ({
      id,
      email,
      roles,
      expiresAt: expiresAt.toISOString(),
    })),
  };
}

export function presentGateOpenings(
  opened: { household: Household; site: Site | null; at: Date }[],
): z.input<(typeof listGateOpenings)['response']> {
  return opened.map(({ household, site, at }) => ({
    householdId: household.id,
    householdName: household.name,
    siteName: site?.name ?? null,
    at: at.toISOString(),
  }));
}
