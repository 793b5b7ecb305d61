import { useQuery, useSuspenseQueries } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { useParams } from 'react-router-dom';
import type { Chapters } from '../../shared/contracts/marks';
import type { Recording } from '../../shared/contracts/recordings';
import { formatMs } from '../../shared/domain/timecode';
import { Button, ButtonLink } from '../components/Button';
import { buttonLook } from '../components/buttonLook';
import { Icon } from '../components/Icon';
import { LeaveDialog } from '../components/LeaveDialog';
import { PageTitle } from '../components/PageTitle';
import { SaveState } from '../components/SaveState';
import { stays } from '../components/stays';
import { Transport } from '../components/Transport';
import { chapterFileAddress, chaptersQuery } from '../features/chapters/api';
import { ChapterDialogs } from '../features/chapters/ChapterDialogs';
import { ChapterList } from '../features/chapters/ChapterList';
import { ChapterTape } from '../features/chapters/ChapterTape';
import { ChapterTools } from '../features/chapters/ChapterTools';
import { useChapterEdits } from '../features/chapters/useChapterEdits';
import { useChapters } from '../features/chapters/useChapters';
import { useMovementNames } from '../features/movementNames/useMovementNames';
import { sessionQuery } from '../features/plans/api';
import { recordingQuery } from '../features/recordings/api';
import { ChangeRecording } from '../features/recordings/ChangeRecording';
import { RecordingPicture } from '../features/recordings/RecordingPicture';
import { RecordingState } from '../features/recordings/RecordingState';
import { UploadOfRecording } from '../features/upload/UploadOfRecording';
import { formatCount, formatDate } from '../lib/format';
import { kitQuery } from '../lib/libraryQueries';
import { Playhead } from '../lib/playhead';
import { teamPath, useMay, useMe, useTeam } from '../lib/session';
import { useDocumentDialog } from '../lib/useDocument';
import { useLeaveGuard } from '../lib/useLeaveGuard';

/** A recording beside the list of its chapters: where footage becomes moments. */
export function MarkPage() {
  const { slug } = useTeam();
  const { recordingId = '' } = useParams();
  const [{ data: recording }, { data: chapters }] = useSuspenseQueries({
    queries: [recordingQuery(slug, recordingId), chaptersQuery(slug, recordingId)],
  });
  return <Mark key={recordingId} recording={recording} chapters={chapters} />;
}

function Mark({ recording, chapters }: { recording: Recording; chapters: Chapters }) {
  const { slug: team } = useTeam();
  const person = useMe()?.id ?? '';
  const mayPublish = useMay('publish');
  const [playhead] = useState(() => new Playhead());
  const { session, durationMs } = recording;
  const { data: plan } = useQuery({ ...sessionQuery(team, session?.id ?? ''), enabled: session !== null });
  const { data: kit } = useQuery(kitQuery(team));
  const { movements, names, add, dialog } = useMovementNames(team);
  const blocks = session ? (plan?.blocks ?? null) : null;
  const blockIds = useMemo(
    () => (session === null ? new Set<string>() : blocks && new Set(blocks.map(({ id }) => id))),
    [session, blocks],
  );

  const { kept, snapshot, faults } = useChapters({ team, recordingId: recording.id, person }, chapters, {
    durationMs,
    blockIds,
    sessionId: session?.id ?? null,
  });
  const edits = useChapterEdits(kept, playhead, durationMs ?? 0, names);
  const [dialogOpen, setDialogOpen] = useDocumentDialog(snapshot.save);
  const [particulars, setParticulars] = useState<'open' | 'closed'>('closed');
  const leaving = useLeaveGuard([kept]);
  const canPlace = recording.state === 'ready' && durationMs !== null;
  const upload = <UploadOfRecording team={team} recordingId={recording.id} />;
  const count = snapshot.content.length;

  return (
    <>
      <PageTitle
        title={
          session ? `${formatDate(session.date)}, take ${recording.take}` : `${recording.title}, take ${recording.take}`
        }
        tab={`Mark ${recording.title}`}
        meta={[
          session && recording.title,
          durationMs !== null && formatMs(durationMs),
          count === 0 ? 'no chapter yet' : `${formatCount(count, 'chapter', 'chapters')} marked`,
          session === null && 'not linked to a session',
        ]
          .filter(Boolean)
          .join(' · ')}
        actions={
          <>
            <SaveState
              state={snapshot.save}
              onRetry={() => void kept.flush()}
              onCompare={() => setDialogOpen('compare')}
            />
            {session && mayPublish && (
              <ButtonLink to={teamPath(team, 'sessions', session.id)} size="small">
                Check & publish
              </ButtonLink>
            )}
          </>
        }
      />
      <div className="-ms-3 mt-1 flex flex-wrap gap-1">
        <Button
          look="quiet"
          size="small"
          onClick={() => {
            // another session takes the blocks off the chapters that are saved
            void kept.flush();
            setParticulars('open');
          }}
        >
          <Icon name="edit" size={16} />
          {session ? 'Title, take, session' : 'Link to a session'}
        </Button>
        <ButtonLink look="quiet" size="small" to={teamPath(team, 'words', recording.id)}>
          <Icon name="captions" size={16} /> Words
        </ButtonLink>
        {recording.state === 'ready' && (
          <ButtonLink look="quiet" size="small" to={teamPath(team, 'watch', recording.id)}>
            <Icon name="play" size={16} /> See it as members do
          </ButtonLink>
        )}
        <Button look="quiet" size="small" onClick={() => setDialogOpen('history')}>
          <Icon name="clock" size={16} /> Versions
        </Button>
        <a href={chapterFileAddress(team, recording.id)} download className={buttonLook('quiet', 'small')}>
          <Icon name="download" size={16} /> Chapters as WebVTT
        </a>
      </div>

      <div className="mt-3 grid gap-5 min-[56.25rem]:grid-cols-2 min-[56.25rem]:items-start">
        <div className="contents min-[56.25rem]:sticky min-[56.25rem]:top-3 min-[56.25rem]:block">
          <div className={stays}>
            <RecordingPicture team={team} recording={recording} playhead={playhead} upload={upload} />
          </div>
          <div>
            {recording.state === 'ready' && (
              <Transport
                playhead={playhead}
                durationMs={durationMs ?? 0}
                strip={<ChapterTape chapters={snapshot.content} durationMs={durationMs ?? 0} />}
              />
            )}
            <div className="mt-4">
              <ChapterTools edits={edits} canUndo={snapshot.canUndo} canRedo={snapshot.canRedo} canPlace={canPlace} />
            </div>
            {recording.state === 'ready' && (
              <div className="mt-4">
                <RecordingState team={team} recording={recording} upload={upload} />
              </div>
            )}
          </div>
        </div>
        <section
          aria-label="Chapters"
          className="border-thin border-line bg-surface max-sm:[&_:is(button,input,select,textarea)]:scroll-mt-[60vw] min-[56.25rem]:max-h-[max(32rem,calc(100dvh-11.5rem))] min-[56.25rem]:overflow-y-auto"
        >
          <ChapterList
            chapters={snapshot.content}
            edits={edits}
            faults={faults}
            playhead={playhead}
            canPlace={canPlace}
            library={{ movements, names, add, kit: kit ?? [], blocks }}
          />
        </section>
      </div>

      {dialog}
      {particulars === 'open' && (
        <ChangeRecording team={team} recording={recording} onClose={() => setParticulars('closed')} />
      )}
      <ChapterDialogs
        team={team}
        recordingId={recording.id}
        kept={kept}
        names={names}
        open={dialogOpen}
        onClose={() => setDialogOpen('none')}
      />
      <LeaveDialog question={leaving} />
    </>
  );
}
