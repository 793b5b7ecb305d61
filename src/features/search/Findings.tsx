import type { Finding, FindingGroup } from '../../../shared/contracts/search';
import { formatMs } from '../../../shared/domain/timecode';
import { MediaRow } from '../../components/MediaRow';
import { TextLink } from '../../components/TextLink';
import { formatDate } from '../../lib/format';
import { momentPath } from '../../lib/momentPath';
import { notRepeated } from '../../lib/notRepeated';
import { teamPath } from '../../lib/session';

/** Results: moments with a picture, grouped by movement. */
export function Findings({ team, groups }: { team: string; groups: readonly FindingGroup[] }) {
  return (
    <>
      {groups.map((group) => (
        <section key={`${group.heading} ${group.movement?.id ?? ''}`} className="mt-5">
          <GroupHead team={team} group={group} />
          <ul>
            {group.findings.map((finding) => (
              <FindingRow key={finding.moment.chapterId} team={team} finding={finding} inMyKit={group.inMyKit} />
            ))}
          </ul>
        </section>
      ))}
    </>
  );
}

function GroupHead({ team, group: { heading, movement } }: { team: string; group: FindingGroup }) {
  if (heading === 'said') return <h2 className="text-lg font-extrabold">Said or written</h2>;
  if (heading === 'insteadOf')
    return (
      <h2 className="text-lg font-extrabold">
        Do this instead {movement && <span className="text-base font-normal text-ink2">of {movement.name}</span>}
      </h2>
    );
  return (
    <h2 className="flex flex-wrap items-baseline gap-x-3 text-lg font-extrabold">
      {movement?.name}
      {movement && (
        <TextLink
          className="-my-3 inline-flex min-h-target items-center text-sm"
          to={teamPath(team, 'dictionary', movement.id)}
        >
          points and cautions
        </TextLink>
      )}
    </h2>
  );
}

function FindingRow({
  team,
  finding: { moment, why, said, note },
  inMyKit,
}: {
  team: string;
  finding: Finding;
  inMyKit: boolean | null;
}) {
  // a date stays in one piece: in the narrow column beside a picture it broke after its day
  const when = moment.session ? formatDate(moment.session.date).replaceAll(' ', '\u00a0') : null;
  const title =
    why === 'demo' && when
      ? `Demo, ${when}`
      : why === 'substitution'
        ? (moment.movement?.name ?? moment.title)
        : moment.title;
  const about = [
    moment.coach,
    why === 'demo' ? null : when,
    notRepeated(moment.missingText, title),
    why === 'demo' && inMyKit === false ? 'not in your kit' : null,
  ].filter(Boolean);
  return (
    <MediaRow
      size="large"
      title={title}
      to={momentPath(team, moment, said?.atMs)}
      still={{ src: moment.pictureUrl, length: formatMs(moment.endMs - moment.startMs) }}
      tape={moment.kind}
      notes={[
        note,
        said && (
          <span className="text-ink">
            “
            {said.pieces.map((piece, at) =>
              // biome-ignore lint/suspicious/noArrayIndexKey: pieces of one line, never reordered
              piece.marked ? <mark key={at}>{piece.text}</mark> : <span key={at}>{piece.text}</span>,
            )}
            ” <span className="text-ink2">at {formatMs(said.atMs)}</span>
          </span>
        ),
        about.join(' · '),
      ]}
    />
  );
}
