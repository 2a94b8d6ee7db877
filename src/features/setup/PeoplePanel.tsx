import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { Member } from '#shared/api/members.ts';
import { groomerQueries } from '#src/api/groomers.ts';
import { memberQueries, useRemoveMember, useWithdrawInvitation } from '#src/api/members.ts';
import { useSession } from '#src/api/sessionStore.ts';
import { Button } from '#src/components/Button.tsx';
import { Card } from '#src/components/Card.tsx';
import { Chip } from '#src/components/Chip.tsx';
import { ConfirmDialog } from '#src/components/ConfirmDialog.tsx';
import { ErrorNote } from '#src/components/ErrorNote.tsx';
import { Loading } from '#src/components/Loading.tsx';
import { toast } from '#src/components/toast.ts';
import { errorWords } from '#src/lib/errorWords.ts';
import { InviteDialog } from './InviteDialog.tsx';
import { MemberDialog } from './MemberDialog.tsx';

/** Who signs in, as what, and who is still to answer an invitation. */
export function PeoplePanel() {
  const me = useSession().user.id;
  const people = useQuery(memberQueries.list());
  const groomers = useQuery(groomerQueries.list());
  const withdraw = useWithdrawInvitation();
  const [open, setOpen] = useState<Member | null>(null);
  const [going, setGoing] = useState<Member | null>(null);
  const [inviting, setInviting] = useState(false);
  if (people.isPending || groomers.isPending) return <Loading />;
  if (people.isError) return <ErrorNote error={people.error} onRetry={() => people.refetch()} />;
  if (groomers.isError)
    return <ErrorNote error={groomers.error} onRetry={() => groomers.refetch()} />;
  const { members, invitations } = people.data;
  const groomerName = (id: string | null) =>
    groomers.data.find((groomer) => groomer.id === id)?.name ?? null;
  return (
    <div className="grid max-w-4xl gap-4">
      <Card title="People" dim={String(members.length)}>
        <ul className="rows">
          {members.map((member) => (
            <li
              key={member.userId}
              className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-2.5"
            >
              <div className="min-w-0">
                <p>
                  <span className="font-semibold">{member.name}</span>
                  {member.userId === me && <span className="text-slate"> (you)</span>}
                </p>
                <p className="break-words text-slate">{member.email}</p>
                <div className="mt-1 flex flex-wrap gap-1.5">
                  {member.roles.map((role) => (
                    <Chip key={role}>
                      {role === 'groomer' && groomerName(member.groomerId)
                        ? `groomer: ${groomerName(member.groomerId)}`
                        : role}
                    </Chip>
                  ))}
                </div>
              </div>
              <div className="flex gap-2">
                <Button size="small" onClick={() => setOpen(member)}>
                  Change roles<span className="sr-only"> of {member.name}</span>
                </Button>
                {member.userId !== me && (
                  <Button size="small" kind="quiet" onClick={() => setGoing(member)}>
                    Remove<span className="sr-only"> {member.name}</span>
                  </Button>
                )}
              </div>
            </li>
          ))}
        </ul>
      </Card>
      {invitations.length > 0 && (
        <Card title="Invited, not answered yet">
          <ul className="rows">
            {invitations.map((invitation) => (
              <li
                key={invitation.id}
                className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 py-2.5"
              >
                <div className="min-w-0">
                  <p className="font-semibold break-words">{invitation.email}</p>
                  <p className="text-slate">
                    as {invitation.roles.join(', ')} · the link ends{' '}
                    {new Date(invitation.expiresAt).toLocaleDateString('en-GB', {
                      day: 'numeric',
                      month: 'long',
                    })}
                  </p>
                </div>
                <Button
                  size="small"
                  busy={
                    withdraw.isPending && withdraw.variables.params.invitationId === invitation.id
                  }
                  onClick={() =>
                    withdraw.mutate(
                      { params: { invitationId: invitation.id } },
                      {
                        onSuccess: () => toast('The link no longer works.'),
                        onError: (error) => toast(errorWords(error), 'bad'),
                      },
                    )
                  }
                >
                  Take the invitation back
                </Button>
              </li>
            ))}
          </ul>
        </Card>
      )}
      <div>
        <Button kind="go" onClick={() => setInviting(true)}>
          Invite someone
        </Button>
      </div>
      {inviting && <InviteDialog groomers={groomers.data} onClose={() => setInviting(false)} />}
      {open && (
        <MemberDialog member={open} groomers={groomers.data} onClose={() => setOpen(null)} />
      )}
      {going && <RemoveMember member={going} onClose={() => setGoing(null)} />}
    </div>
  );
}

function RemoveMember({ member, onClose }: { member: Member; onClose: () => void }) {
  const remove = useRemoveMember();
  return (
    <ConfirmDialog
      title={`Remove ${member.name}?`}
      confirm="Remove and sign out"
      keep="Keep"
      busy={remove.isPending}
      error={remove.error}
      onClose={onClose}
      onConfirm={() =>
        remove.mutate(
          { params: { userId: member.userId } },
          {
            onSuccess: () => {
              toast(`${member.name} no longer signs in here.`);
              onClose();
            },
          },
        )
      }
    >
      Every sign-in of theirs to this business ends now. What they did stays on record. Change gate
      codes they have seen.
    </ConfirmDialog>
  );
}
