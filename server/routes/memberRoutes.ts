import { Router } from 'express';
import * as api from '#shared/api/members.ts';
import { ownOrigin } from '#server/http/csrf.ts';
import { handle, handlePublic } from '#server/http/handle.ts';
import { limitFailures, limitLinks, limitMaking } from '#server/http/limits.ts';
import { presentGateOpenings, presentMember, presentMembers } from '#server/presenters/members.ts';
import {
  acceptInvitation,
  describeInvitation,
} from '#server/services/accounts/acceptInvitation.ts';
import { inviteMember, withdrawInvitation } from '#server/services/accounts/inviteMember.ts';
import { listGateOpenings } from '#server/services/accounts/listGateOpenings.ts';
import { listMembers, removeMember, updateMember } from '#server/services/accounts/members.ts';
import { enter } from './sessionRoutes.ts';

export const memberRoutes = Router();
const done = { done: true } as const;

// Letters go to addresses the inviter names.
memberRoutes.post(api.inviteMember.path, limitMaking);
memberRoutes.use(api.getInvitation.path, limitLinks);
// A known person's password is checked here as well.
memberRoutes.use(api.acceptInvitation.path, limitFailures);

handle(memberRoutes, api.listMembers, 'members.edit', async ({ now }) =>
  presentMembers(await listMembers(now)),
);
handle(memberRoutes, api.inviteMember, 'members.edit', async ({ actor, body, now, req }) => {
  await inviteMember(actor, body, ownOrigin(req), now);
  return done;
});
handle(memberRoutes, api.withdrawInvitation, 'members.edit', async ({ params, now }) => {
  await withdrawInvitation(params.invitationId, now);
  return done;
});
handle(memberRoutes, api.updateMember, 'members.edit', async ({ params, body }) =>
  presentMember(await updateMember(params.userId, body)),
);
handle(memberRoutes, api.listGateOpenings, 'members.edit', async ({ params }) =>
  presentGateOpenings(await listGateOpenings(params.userId)),
);
handle(memberRoutes, api.removeMember, 'members.edit', async ({ actor, params, now }) => {
  await removeMember(actor, params.userId, now);
  return done;
});
handlePublic(memberRoutes, api.getInvitation, async ({ params, now }) =>
  describeInvitation(params.token, now),
);
handlePublic(memberRoutes, api.acceptInvitation, async ({ params, body, now, req, res }) =>
  enter(req, res, await acceptInvitation(params.token, body, now)),
);
