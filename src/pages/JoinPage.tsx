import { useQuery } from '@tanstack/react-query';
import { useNavigate } from 'react-router-dom';
import { ErrorPanel } from '../components/ErrorPanel';
import { PageTitle } from '../components/PageTitle';
import { TextLink } from '../components/TextLink';
import { Waiting } from '../components/Waiting';
import { invitationQuery } from '../features/account/api';
import { JoinForm } from '../features/account/JoinForm';
import { useSecret } from '../features/account/secret';
import { teamPath } from '../lib/session';

const asRole = { owner: 'an owner', coach: 'a coach', editor: 'an editor', member: 'a member' } as const;

export function JoinPage() {
  const secret = useSecret();
  const navigate = useNavigate();
  const invitation = useQuery(invitationQuery(secret));
  if (invitation.isPending) return <Waiting label="Reading the invitation" />;
  if (invitation.isError)
    return (
      <div className="space-y-5">
        <PageTitle title="This invitation does not work" />
        <ErrorPanel
          title="The link was used already, or its time is over."
          message="Ask the owner of the team for a new one."
        />
        <TextLink to="/sign-in">Sign in, if you joined before</TextLink>
      </div>
    );
  const { team, role } = invitation.data;
  return (
    <div className="space-y-5">
      <PageTitle title={`Join ${team}`} />
      <p>You are invited as {asRole[role]}.</p>
      <JoinForm
        secret={secret}
        invitation={invitation.data}
        onDone={(slug) => navigate(teamPath(slug), { replace: true })}
      />
    </div>
  );
}
