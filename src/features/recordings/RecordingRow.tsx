import { clsx } from 'clsx';
import { type ReactNode, useState } from 'react';
import { Link } from 'react-router-dom';
import type { Recording } from '../../../shared/contracts/recordings';
import { formatMs } from '../../../shared/domain/timecode';
import { Button, ButtonLink } from '../../components/Button';
import { Icon } from '../../components/Icon';
import { Menu, type MenuItem } from '../../components/Menu';
import { Still } from '../../components/Still';
import { TextButton, TextLink } from '../../components/TextLink';
import { formatBytes, formatCount, formatDate } from '../../lib/format';
import { teamPath, useMay } from '../../lib/session';
import { ChangeRecording } from './ChangeRecording';
import { RecordingState } from './RecordingState';
import { RemoveRecording } from './RemoveRecording';

type Props = { team: string; recording: Recording; upload: ReactNode };

/** One recording: what it shows, whose session it is, how far it is, and the ways on from here. */
export function RecordingRow({ team, recording, upload }: Props) {
  const [open, setOpen] = useState<'none' | 'change' | 'remove'>('none');
  const mayRemove = useMay('removeFootage');
  const { id, title, take, state, durationMs, posterUrl } = recording;
  const isReady = state === 'ready';
  const items: MenuItem[] = [
    { label: 'Title, take, session', icon: 'edit', onSelect: () => setOpen('change') },
    ...(mayRemove
      ? [{ label: 'Remove', icon: 'trash', look: 'danger', onSelect: () => setOpen('remove') } as const]
      : []),
  ];
  return (
    <li className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 border-b border-line py-3 sm:gap-x-4 lg:grid-cols-[auto_minmax(0,1fr)_auto]">
      <Still
        src={posterUrl}
        length={durationMs === null ? undefined : formatMs(durationMs)}
        className="w-23 min-[400px]:w-32 sm:row-span-2 sm:w-37"
      />
      <div className="min-w-0">
        <h2 className="text-md leading-tight font-extrabold wrap-anywhere">
          {isReady || state === 'making' ? (
            <Link to={teamPath(team, 'footage', id)} className="no-underline hover:underline">
              {title}
            </Link>
          ) : (
            title
          )}
        </h2>
        <p className="mt-0.5 text-sm text-ink2">
          Take {take} · <SessionOf team={team} recording={recording} onChoose={() => setOpen('change')} />
        </p>
        <p className="text-sm text-ink2">{factsOf(recording)}</p>
      </div>
      <div className="col-span-2 mt-2 flex flex-wrap items-center gap-2 sm:col-span-1 sm:col-start-2 lg:contents">
        <div className="max-w-xl min-w-0 grow basis-52 empty:hidden lg:col-start-2 lg:mt-2">
          <RecordingState team={team} recording={recording} upload={upload} />
        </div>
        <div
          className={clsx(
            'flex flex-wrap items-center gap-x-1 gap-y-2 min-[360px]:gap-x-2 lg:col-start-3 lg:row-span-2 lg:row-start-1 lg:self-start',
            isReady ? 'grow' : 'ms-auto flex-none',
          )}
        >
          {isReady && (
            <>
              <ButtonLink size="small" to={teamPath(team, 'footage', id)} aria-label={`Mark ${title}`}>
                Mark
              </ButtonLink>
              <ButtonLink size="small" to={teamPath(team, 'words', id)} aria-label={`Words of ${title}`}>
                Words
              </ButtonLink>
              <ButtonLink size="small" to={teamPath(team, 'watch', id)} aria-label={`Watch ${title}`}>
                Watch
              </ButtonLink>
            </>
          )}
          {state === 'failed' && mayRemove && (
            <Button size="small" onClick={() => setOpen('remove')} aria-label={`Remove ${title}`}>
              Remove
            </Button>
          )}
          <Menu
            label={<Icon name="more" size={18} />}
            name={`More for ${title}`}
            size="small"
            items={items}
            className="ms-auto"
          />
        </div>
      </div>
      {open === 'change' && <ChangeRecording team={team} recording={recording} onClose={() => setOpen('none')} />}
      {open === 'remove' && <RemoveRecording team={team} recording={recording} onClose={() => setOpen('none')} />}
    </li>
  );
}

function SessionOf({ team, recording, onChoose }: { team: string; recording: Recording; onChoose: () => void }) {
  const { session, title } = recording;
  if (session)
    return (
      <>
        <TextLink to={teamPath(team, 'sessions', session.id)}>
          {formatDate(session.date)}, {session.title}
        </TextLink>
        {session.state === 'draft' && ' (draft)'}
      </>
    );
  return (
    <>
      no session yet:{' '}
      <TextButton onClick={onChoose} aria-label={`Choose one for ${title}`}>
        choose one
      </TextButton>
    </>
  );
}

function factsOf({ state, chapterCount, captionLineCount, sizeBytes, coach }: Recording): string {
  const isWorkedOn = state === 'ready' || chapterCount > 0 || captionLineCount > 0;
  const chapters = chapterCount === 0 ? 'no chapters yet' : formatCount(chapterCount, 'chapter', 'chapters');
  const lines =
    captionLineCount === 0 ? 'no captions yet' : formatCount(captionLineCount, 'caption line', 'caption lines');
  return [...(isWorkedOn ? [chapters, lines] : [formatBytes(sizeBytes)]), coach?.name].filter(Boolean).join(' · ');
}
