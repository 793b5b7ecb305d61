import { ButtonLink } from '../../components/Button';
import { EmptyState } from '../../components/EmptyState';
import { PageTitle } from '../../components/PageTitle';
import { Waiting } from '../../components/Waiting';
import { teamPath } from '../../lib/session';

/** A recording that does not play yet, for those who made it; it is asked for again until it does. */
export function NotReady({ team, recordingId, message }: { team: string; recordingId: string; message: string }) {
  return (
    <div className="pt-6">
      <PageTitle title="Not ready to watch" />
      <EmptyState
        title="This recording does not play yet"
        action={<ButtonLink to={teamPath(team, 'footage', recordingId)}>See how far it is</ButtonLink>}
      >
        <p>{message}</p>
        <p className="mt-2">
          <Waiting label="It starts here as soon as it can" />
        </p>
      </EmptyState>
    </div>
  );
}
