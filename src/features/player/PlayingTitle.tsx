import { type ReactNode, useEffect } from 'react';
import type { Watch } from '../../../shared/contracts/watch';
import { formatMs } from '../../../shared/domain/timecode';
import { TextLink } from '../../components/TextLink';
import { formatDate } from '../../lib/format';
import { notRepeated } from '../../lib/notRepeated';
import { teamPath } from '../../lib/session';

type Props = {
  team: string;
  watch: Watch;
  chapter: Watch['chapters'][number] | undefined;
  /** for those who work on it */
  actions?: ReactNode;
};

/** What plays, in the largest letters: the chapter, or the recording where no chapter is. */
export function PlayingTitle({ team, watch, chapter, actions }: Props) {
  const { title, session, coach, movements } = watch;
  const standsInFor = movements.find(({ id }) => id === chapter?.standsInForMovementId)?.name;
  useEffect(() => {
    document.title = `${title} · Tapeline`;
  }, [title]);
  const words = [
    chapter?.kind,
    formatMs(chapter ? chapter.endMs - chapter.startMs : watch.durationMs),
    standsInFor && `for ${standsInFor}`,
    chapter && notRepeated(chapter.missingText, chapter.title),
    coach,
  ].filter(Boolean);
  return (
    <header>
      <h1 className="text-xl font-black tracking-tight wrap-anywhere">{chapter?.title ?? title}</h1>
      <p className="text-sm text-ink2">
        {words.join(' · ')}
        {session && (
          <>
            {' · '}
            <TextLink to={teamPath(team, 'days', session.date)} className="font-normal! whitespace-nowrap text-ink2!">
              {formatDate(session.date)}
            </TextLink>
          </>
        )}
      </p>
      {session && !session.published && (
        <p className="mt-1 text-sm font-bold">A draft: members do not see this session yet.</p>
      )}
      {actions}
    </header>
  );
}
