import { Link } from 'react-router-dom';
import type { SessionInList } from '../../../shared/contracts/sessions';
import { TapeStrip } from '../../components/TapeStrip';
import { formatCount, formatDate, formatDay, formatList } from '../../lib/format';
import { teamPath } from '../../lib/session';
import { blockWords } from './blockWords';

type Props = { team: string; session: SessionInList; today: string };

/** A session in the list: its day, its state, its blocks as tape, and how much of it the library shows. */
export function SessionRow({ team, session, today }: Props) {
  const { date, title, state, coach, blockKinds, movementCount, shownCount, recordingCount } = session;
  return (
    <li className="relative grid items-center gap-x-5 gap-y-1 border-b border-line py-2.5 hover:bg-raised sm:grid-cols-[9rem_minmax(0,1fr)] lg:grid-cols-[9rem_minmax(12rem,1fr)_minmax(9rem,14rem)_8rem_13rem]">
      <span className="text-sm text-ink2 lg:text-base">
        {date === today ? formatDate(date) : formatDay(date, today)}
      </span>
      <span className="min-w-0">
        <Link
          to={teamPath(team, 'sessions', session.id)}
          className="font-extrabold wrap-anywhere no-underline after:absolute after:inset-0 hover:underline"
        >
          {title}
        </Link>{' '}
        <StateWord state={state} isDue={date === today} />
        {coach && <span className="block text-sm text-ink2">{coach}</span>}
      </span>
      <span className="flex flex-wrap gap-1 sm:col-start-2 lg:col-auto">
        {blockKinds.length === 0 ? (
          <span className="text-sm text-ink2">no blocks yet</span>
        ) : (
          <>
            <span className="sr-only">{formatList(blockKinds.map((kind) => blockWords[kind].toLowerCase()))}</span>
            {blockKinds.map((kind, at) => (
              // biome-ignore lint/suspicious/noArrayIndexKey: blocks in their order
              <TapeStrip key={at} kind={kind} className="w-10" />
            ))}
          </>
        )}
      </span>
      <span className="flex flex-wrap gap-x-3 text-sm text-ink2 sm:col-start-2 lg:contents">
        <span className={recordingCount === 0 ? undefined : 'text-ink'}>
          {recordingCount === 0 ? 'no recording' : formatCount(recordingCount, 'recording', 'recordings')}
        </span>
        <span>
          {movementCount === 0
            ? 'no movement planned'
            : movementCount === shownCount
              ? 'every movement has a demo'
              : `${shownCount} of ${movementCount} movements have a demo`}
        </span>
      </span>
    </li>
  );
}

/** A draft on its own day is what a coach has to hear about. */
function StateWord({ state, isDue }: { state: SessionInList['state']; isDue: boolean }) {
  if (state === 'published') return <span className="text-sm text-good">published</span>;
  return isDue ? (
    <span className="text-sm font-bold text-danger">draft: members do not see it</span>
  ) : (
    <span className="text-sm text-ink2">draft</span>
  );
}
