import { formatMs, spokenMs } from '../../../shared/domain/timecode';
import { TextLink } from '../../components/TextLink';
import { formatDate } from '../../lib/format';
import { momentPath } from '../../lib/momentPath';
import { teamPath } from '../../lib/session';
import { demoOf, type MovementFacts } from './lineWays';

/** Whether the library shows a movement: how long its newest demo is and from when, or that it is still to be filmed. */
export function DemoCell({ team, facts }: { team: string; facts: MovementFacts | undefined }) {
  if (!facts) return <span className="text-ink2">…</span>;
  const demo = demoOf(facts);
  const { name } = facts.movement;
  if (!demo)
    return (
      <TextLink to={teamPath(team, 'footage')} className="text-danger! decoration-danger/50!">
        <span className="sr-only">Demo of {name}: </span>none yet: film it
      </TextLink>
    );
  const length = demo.endMs - demo.startMs;
  return (
    <TextLink to={momentPath(team, demo)} className="font-normal!">
      <span className="sr-only">
        Watch the demo of {name}, {spokenMs(length)},{' '}
      </span>
      <span aria-hidden="true">{formatMs(length)} </span>
      {demo.session ? formatDate(demo.session.date) : 'without a session'}
    </TextLink>
  );
}
