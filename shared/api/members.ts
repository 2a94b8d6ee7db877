import { z } from 'zod';
import { endpoint } from './endpoint.ts';
import { session } from './session.ts';
import { done, email, id, name, password, role } from './values.ts';

export const member = z.object({
  userId: id,
  name: z.string(),
  email: z.string(),
  roles: z.array(role),
  groomerId: id.nullable(),
});
export type Member = z.infer<typeof member>;

const roles = z
  .array(role)
  .min(1, 'must hold at least one role')
  .transform((list) => [...new Set(list)]);

export const listMembers = endpoint({
  method: 'GET',
  path: '/api/members',
  summary: 'Everyone in the business, with invitations still open',
  response: z.object({
    members: z.array(member),
    invitations: z.array(
      z.object({ id, email: z.string(), roles: z.array(role), expiresAt: z.string() }),
    ),
  }),
});

export const inviteMember = endpoint({
  method: 'POST',
  path: '/api/invitations',
  summary: 'Send an invitation letter',
  body: z.object({ email, roles, groomerId: id.nullable().default(null) }),
  response: done,
});

export const withdrawInvitation = endpoint({
  method: 'DELETE',
  path: '/api/invitations/:invitationId',
  summary: 'Make an invitation link useless',
  params: z.object({ invitationId: id }),
  response: done,
});

export const updateMember = endpoint({
  method: 'PATCH',
  path: '/api/members/:userId',
  summary: 'Change roles; a business keeps at least one operator',
  params: z.object({ userId: id }),
  body: z.object({ roles, groomerId: id.nullable().optional() }),
  response: member,
});

export const removeMember = endpoint({
  method: 'DELETE',
  path: '/api/members/:userId',
  summary: 'End a membership and its sign-ins',
  params: z.object({ userId: id }),
  response: done,
});

export const listGateOpenings = endpoint({
  method: 'GET',
  path: '/api/members/:userId/gate-openings',
  summary: 'Households whose gate code a person has seen and that still have one, latest first',
  params: z.object({ userId: id }),
  response: z.array(
    z.object({
      householdId: id,
      householdName: z.string(),
      siteName: z.string().nullable(),
      at: z.string(),
    }),
  ),
});

const token = z.object({ token: z.string().min(10).max(64) });

export const getInvitation = endpoint({
  method: 'GET',
  path: '/api/invitations/:token/open',
  summary: 'What an invitation link is for',
  params: token,
  response: z.object({
    businessName: z.string(),
    email: z.string(),
    roles: z.array(role),
    /** The person already has a sign-in and only confirms with its password. */
    knownPerson: z.boolean(),
  }),
});

export const acceptInvitation = endpoint({
  method: 'POST',
  path: '/api/invitations/:token/accept',
  summary: 'Join the business; a known person gives the present password',
  params: token,
  body: z.object({ name: name.optional(), password }),
  response: session,
});
