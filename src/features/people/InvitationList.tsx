import type { Invitation } from '../../../shared/contracts/people';
import { Button } from '../../components/Button';
import { FormFault } from '../../components/FormFault';
import { formatInstant } from '../../lib/format';
import { useRevokeInvitation } from './api';
import { roleWords } from './roleWords';

export function InvitationList({
  team,
  timeZone,
  invitations,
}: {
  team: string;
  timeZone: string;
  invitations: readonly Invitation[];
}) {
  const revoke = useRevokeInvitation(team);
  if (invitations.length === 0) return <p className="text-sm text-ink2">Nobody is waiting for an answer.</p>;
  return (
    <>
      <ul>
        {invitations.map((invitation) => (
          <li key={invitation.id} className="flex flex-wrap items-center gap-x-4 gap-y-1 border-b border-line py-2">
            <span className="min-w-0 grow">
              <span className="font-bold wrap-anywhere">{invitation.email}</span>
              <span className="block text-sm text-ink2">
                as {roleWords[invitation.role].name.toLowerCase()} · works until{' '}
                {formatInstant(invitation.expiresAt, timeZone)}
              </span>
            </span>
            <Button
              size="small"
              busy={revoke.isPending && revoke.variables === invitation.id ? 'Taking back' : undefined}
              onClick={() => revoke.mutate(invitation.id)}
              aria-label={`Take the invitation of ${invitation.email} back`}
            >
              Take back
            </Button>
          </li>
        ))}
      </ul>
      <FormFault>{revoke.error?.message}</FormFault>
    </>
  );
}
