import { useSuspenseQueries } from '@tanstack/react-query';
import { useDeferredValue, useMemo, useState } from 'react';
import { useParams } from 'react-router-dom';
import type { Captions, Chapters, Cues } from '../../shared/contracts/marks';
import type { Recording } from '../../shared/contracts/recordings';
import { type ReadingProfileName, readingProfiles } from '../../shared/domain/captions/readingProfile';
import { chapterAt } from '../../shared/domain/chapters/chapterAt';
import { Button, ButtonLink } from '../components/Button';
import { buttonLook } from '../components/buttonLook';
import { EmptyState } from '../components/EmptyState';
import { Icon } from '../components/Icon';
import { LeaveDialog } from '../components/LeaveDialog';
import { PageTitle } from '../components/PageTitle';
import { SaveState } from '../components/SaveState';
import { stays } from '../components/stays';
import { Transport } from '../components/Transport';
import { tell } from '../components/toasts';
import { asLines, captionFileAddress, captionsQuery, useCaptionSource } from '../features/captions/api';
import { CaptionDialogs } from '../features/captions/CaptionDialogs';
import { CaptionList } from '../features/captions/CaptionList';
import { CaptionTools } from '../features/captions/CaptionTools';
import { ImportCaptions } from '../features/captions/ImportCaptions';
import { faultyPlaces, type LineFault, lineAt, pictureShape, placeFaults } from '../features/captions/lineFaults';
import { SaidLine } from '../features/captions/SaidLine';
import { useLineEdits } from '../features/captions/useLineEdits';
import { chaptersQuery } from '../features/chapters/api';
import { asCues, cuesQuery, useCueSource } from '../features/cues/api';
import { CueBoard } from '../features/cues/CueBoard';
import { useMovementNames } from '../features/movementNames/useMovementNames';
import { recordingQuery } from '../features/recordings/api';
import { RecordingPicture } from '../features/recordings/RecordingPicture';
import { UploadOfRecording } from '../features/upload/UploadOfRecording';
import { formatCount, formatDate } from '../lib/format';
import { useKeys } from '../lib/keys';
import { Playhead } from '../lib/playhead';
import { teamPath, useMe, useTeam } from '../lib/session';
import { readStored, writeStored } from '../lib/stored';
import { useDocument, useDocumentDialog, useSnapshot } from '../lib/useDocument';
import { useLeaveGuard } from '../lib/useLeaveGuard';

/** What is said in a recording, line by line beside the picture, and the cues that are pinned to it. */
export function WordsPage() {
  const { slug } = useTeam();
  const { recordingId = '' } = useParams();
  const [{ data: recording }, { data: captions }, { data: cues }, { data: chapters }] = useSuspenseQueries({
    queries: [
      recordingQuery(slug, recordingId),
      captionsQuery(slug, recordingId),
      cuesQuery(slug, recordingId),
      chaptersQuery(slug, recordingId),
    ],
  });
  return <Words key={recordingId} {...{ recording, captions, cues, chapters }} />;
}

/** Until the count has caught up with the writing. */
const unknownPlaces: ReadonlyMap<number, LineFault[]> = new Map();
const profileKey = 'tapeline.readingProfile';

type Props = { recording: Recording; captions: Captions; cues: Cues; chapters: Chapters };

function Words({ recording, captions, cues, chapters }: Props) {
  const { slug: team } = useTeam();
  const person = useMe()?.id ?? '';
  const about = { team, recordingId: recording.id, person };
  const [playhead] = useState(() => new Playhead());
  const { movements, names, add, dialog } = useMovementNames(team);

  const savedLines = useMemo(() => asLines(captions), [captions]);
  const kept = useDocument(savedLines, useCaptionSource(about), () =>
    tell('Somebody else saved these captions. Theirs are shown now.'),
  );
  const savedCues = useMemo(() => asCues(cues), [cues]);
  const keptCues = useDocument(savedCues, useCueSource(about), () =>
    tell('Somebody else saved the cues of this recording. Theirs are shown now.'),
  );
  const { content: lines, save, canUndo, canRedo } = useSnapshot(kept);
  const edits = useLineEdits(kept, playhead, recording.durationMs);
  const [open, setOpen] = useDocumentDialog(save);
  const leaving = useLeaveGuard([kept, keptCues]);

  const [follow, setFollow] = useState<'on' | 'off'>('on');
  const [profileName, setProfileName] = useState<ReadingProfileName>(
    readStored(profileKey) === 'dcmp' ? 'dcmp' : 'bbc',
  );
  const profile = readingProfiles[profileName];
  const picture = pictureShape(recording);
  // counted behind the writing: 6,000 lines take a moment
  const counted = useDeferredValue(lines);
  const places = useMemo(() => placeFaults(counted, recording.durationMs), [counted, recording.durationMs]);
  const faulty = useMemo(() => faultyPlaces(counted, profile, picture, places), [counted, profile, picture, places]);

  const later = (what: 'undo' | 'redo') => {
    const able = (document: typeof kept | typeof keptCues) =>
      what === 'undo' ? document.current().canUndo : document.current().canRedo;
    const cuesLast = able(keptCues) && (!able(kept) || keptCues.touchedAt > kept.touchedAt);
    if (cuesLast) keptCues[what]();
    else edits[what]();
  };
  useKeys({ 'Mod+z': () => later('undo'), 'Mod+Shift+z': () => later('redo') });

  const { session } = recording;
  return (
    <>
      <PageTitle
        title={
          session ? `${formatDate(session.date)}, take ${recording.take}` : `${recording.title}, take ${recording.take}`
        }
        tab={`Words of ${recording.title}`}
        meta={[
          session && recording.title,
          lines.length === 0 ? 'no captions yet' : formatCount(lines.length, 'line', 'lines'),
          faulty.tooFast > 0 && `${faulty.tooFast} too fast`,
        ]
          .filter(Boolean)
          .join(' · ')}
        actions={<SaveState state={save} onRetry={() => void kept.flush()} onCompare={() => setOpen('compare')} />}
      />
      <div className="-ms-3 mt-1 flex flex-wrap gap-1">
        <ButtonLink look="quiet" size="small" to={teamPath(team, 'footage', recording.id)}>
          <Icon name="film" size={16} /> Chapters
        </ButtonLink>
        <ImportCaptions team={team} recordingId={recording.id} kept={kept} />
        {lines.length > 0 && (
          <a href={captionFileAddress(team, recording.id)} download className={buttonLook('quiet', 'small')}>
            <Icon name="download" size={16} /> Captions as WebVTT
          </a>
        )}
        <Button look="quiet" size="small" onClick={() => setOpen('history')}>
          <Icon name="clock" size={16} /> Versions
        </Button>
      </div>

      <div className="mt-3 grid gap-5 min-[56.25rem]:grid-cols-[minmax(20rem,27.5rem)_minmax(0,1fr)] min-[56.25rem]:items-start min-[112rem]:grid-cols-[40rem_minmax(0,1fr)]">
        <div className="contents min-[56.25rem]:block">
          <div className={stays}>
            <RecordingPicture
              team={team}
              recording={recording}
              playhead={playhead}
              upload={<UploadOfRecording team={team} recordingId={recording.id} />}
            >
              <SaidLine lines={lines} playhead={playhead} />
            </RecordingPicture>
          </div>
          <div>
            {recording.state === 'ready' && <Transport playhead={playhead} durationMs={recording.durationMs ?? 0} />}
          </div>
          <div className="max-[56.25rem]:order-last min-[56.25rem]:mt-5">
            <CueBoard
              team={team}
              recordingId={recording.id}
              kept={keptCues}
              playhead={playhead}
              movements={movements}
              names={names}
              onAddMovement={add}
              canPin={recording.state === 'ready'}
              momentAt={(ms) => ({
                text: lines[lineAt(lines, ms)]?.text ?? '',
                movementId: chapterAt(chapters.items, ms)?.movementId ?? null,
              })}
            />
          </div>
        </div>
        <section
          aria-label="Captions"
          className="max-sm:[&_:is(button,input,select,textarea)]:scroll-mt-[60vw] border-thin border-line bg-surface"
        >
          {lines.length === 0 ? (
            <div className="px-4">
              <EmptyState
                title="No captions yet."
                action={
                  <>
                    <ImportCaptions team={team} recordingId={recording.id} kept={kept} look="go" />
                    <Button size="small" onClick={() => edits.insert(null)}>
                      Write the first line
                    </Button>
                  </>
                }
              >
                Import a WebVTT or SRT file that another program made, or write what is said line by line.
              </EmptyState>
            </div>
          ) : (
            <>
              <CaptionTools
                edits={edits}
                faulty={faulty.all}
                follow={follow}
                onFollow={setFollow}
                profile={profileName}
                onProfile={(next) => {
                  setProfileName(next);
                  writeStored(profileKey, next);
                }}
                canUndo={canUndo}
                canRedo={canRedo}
              />
              <CaptionList
                {...{ lines, edits, playhead, profile, picture, follow }}
                places={counted === lines ? places : unknownPlaces}
              />
            </>
          )}
        </section>
      </div>

      {dialog}
      <CaptionDialogs team={team} recordingId={recording.id} kept={kept} open={open} onClose={() => setOpen('none')} />
      <LeaveDialog question={leaving} />
    </>
  );
}
