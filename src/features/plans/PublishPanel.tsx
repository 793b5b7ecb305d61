import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { Session } from '../../../shared/contracts/sessions';
import { Button } from '../../components/Button';
import { ConfirmDialog } from '../../components/ConfirmDialog';
import { ErrorPanel } from '../../components/ErrorPanel';
import { FormFault } from '../../components/FormFault';
import { GoButton } from '../../components/GoButton';
import { Section } from '../../components/PageTitle';
import { SkeletonRows } from '../../components/Skeleton';
import { announce } from '../../lib/announce';
import { formatInstant } from '../../lib/format';
import { publishCheckQuery, usePublish, useRemoveSession, useUnpublish } from './api';
import { RemarkList } from './RemarkList';

type Props = {
  team: string;
  timeZone: string;
  session: Session;
  /** the remarks are about the plan as it was saved last */
  isSaved: boolean;
  /** saves what was written last. @returns the version that the server then has, or null where it could not be saved */
  saveFirst: () => Promise<number | null>;
  onRemoved: () => void;
};

const notSaved = 'The plan is not saved yet. See above what keeps it; then try again.';
const changed = 'Somebody changed the session meanwhile. Here it is as it is now: look at it, then try again.';

/** What is missing before members can use a session; publishing it, taking it back, removing it. */
export function PublishPanel(props: Props) {
  return props.session.state === 'published' ? <Published {...props} /> : <Unpublished {...props} />;
}

function Unpublished({ team, session, isSaved, saveFirst, onRemoved }: Props) {
  const { data: remarks, error, refetch } = useQuery(publishCheckQuery(team, session.id, session.version));
  const publish = usePublish(team, session.id);
  const [fault, setFault] = useState<string | null>(null);
  const [saving, setSaving] = useState<'no' | 'yes'>('no');
  const missing = remarks?.filter(({ severity }) => severity === 'missing') ?? [];
  const thin = remarks?.filter(({ severity }) => severity === 'thin') ?? [];
  const send = async () => {
    setFault(null);
    setSaving('yes');
    const version = await saveFirst();
    setSaving('no');
    if (version === null) return setFault(notSaved);
    publish.mutate(version, {
      onSuccess: () => announce('Published. Members see it now'),
      onError: (refused) => {
        setFault('code' in refused && refused.code === 'stale' ? changed : refused.message);
        void refetch();
      },
    });
  };
  return (
    <Section title="Publish" place="aside">
      {error && !remarks ? (
        <ErrorPanel title="What is missing did not arrive." message={error.message} onRetry={() => void refetch()} />
      ) : !remarks ? (
        <SkeletonRows label="What is missing" count={3} />
      ) : (
        <>
          {missing.length > 0 && (
            <div className="mb-3 border-s-4 border-danger ps-3">
              <p className="text-sm font-bold text-danger">
                Members could do nothing with it yet, so it cannot be published:
              </p>
              <RemarkList team={team} remarks={missing} />
            </div>
          )}
          {thin.length > 0 && (
            <div className="mb-3">
              <p className="text-sm text-ink2">
                {missing.length > 0 ? 'Also worth a look:' : 'Worth a look. You can publish without it:'}
              </p>
              <RemarkList team={team} remarks={thin} />
            </div>
          )}
          {remarks.length === 0 && <p className="mb-3 text-sm">Nothing is missing.</p>}
          {!isSaved && <p className="mb-3 text-sm text-ink2">This is about the plan as it was saved last.</p>}
        </>
      )}
      <FormFault>{fault}</FormFault>
      <div className="mt-2 flex flex-wrap items-center gap-3">
        <GoButton
          disabled={missing.length > 0}
          busy={saving === 'yes' ? 'Saving' : publish.isPending ? 'Publishing' : undefined}
          onClick={() => void send()}
        >
          {thin.length > 0 && missing.length === 0 ? 'Publish it as it is' : 'Publish'}
        </GoButton>
        <RemoveDraft team={team} session={session} onRemoved={onRemoved} />
      </div>
    </Section>
  );
}

function RemoveDraft({ team, session, onRemoved }: Pick<Props, 'team' | 'session' | 'onRemoved'>) {
  const remove = useRemoveSession(team, session.id);
  const [asked, setAsked] = useState<'no' | 'yes'>('no');
  return (
    <>
      <Button look="quiet" onClick={() => setAsked('yes')}>
        Remove the draft
      </Button>
      <ConfirmDialog
        open={asked === 'yes'}
        title={`Remove “${session.title}”?`}
        confirm="Remove it"
        busy={remove.isPending ? 'Removing' : undefined}
        error={remove.error?.message}
        onConfirm={() =>
          remove.mutate(undefined, {
            onSuccess: () => {
              announce('The draft was removed');
              onRemoved();
            },
          })
        }
        onClose={() => setAsked('no')}
      >
        The plan is gone for good.{' '}
        {session.recordings.length > 0 && 'Its recordings stay in the library, without a session.'}
      </ConfirmDialog>
    </>
  );
}

function Published({ team, timeZone, session, saveFirst }: Props) {
  const { data: remarks = [] } = useQuery(publishCheckQuery(team, session.id, session.version));
  const unpublish = useUnpublish(team, session.id);
  const [asked, setAsked] = useState<'no' | 'yes'>('no');
  const [fault, setFault] = useState<string | null>(null);
  const takeBack = async () => {
    setFault(null);
    const version = await saveFirst();
    if (version === null) return setFault(notSaved);
    unpublish.mutate(version, {
      onSuccess: () => {
        announce('It is a draft again');
        setAsked('no');
      },
      onError: (refused) => setFault('code' in refused && refused.code === 'stale' ? changed : refused.message),
    });
  };
  return (
    <Section title="Published" place="aside">
      <p className="text-sm">
        Members see it{session.publishedAt && ` since ${formatInstant(session.publishedAt, timeZone)}`}. What you change
        here they see at once.
      </p>
      {remarks.length > 0 && (
        <div className="mt-3">
          <p className="text-sm text-ink2">Still worth a look:</p>
          <RemarkList team={team} remarks={remarks} />
        </div>
      )}
      <div className="mt-3">
        <Button onClick={() => setAsked('yes')}>Take back to a draft</Button>
      </div>
      <ConfirmDialog
        open={asked === 'yes'}
        title={`Take “${session.title}” back to a draft?`}
        confirm="Take it back"
        busy={unpublish.isPending ? 'Taking it back' : undefined}
        error={fault}
        onConfirm={() => void takeBack()}
        onClose={() => {
          setAsked('no');
          setFault(null);
        }}
      >
        Members no longer see or find the session and its recordings. Nothing is lost: publish it again when it is
        ready.
      </ConfirmDialog>
    </Section>
  );
}
