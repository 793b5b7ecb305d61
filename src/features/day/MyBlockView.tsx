import type { MyBlock, MyLine } from '../../../shared/contracts/sessions';
import { formatMs } from '../../../shared/domain/timecode';
import { formatDose } from '../../../shared/domain/training/dose';
import { formatScheme } from '../../../shared/domain/training/scheme';
import type { ChapterKind } from '../../../shared/domain/words';
import { Caution } from '../../components/Caution';
import { MediaRow } from '../../components/MediaRow';
import { TapeStrip } from '../../components/TapeStrip';
import { TextLink } from '../../components/TextLink';
import { momentPath } from '../../lib/momentPath';
import { teamPath } from '../../lib/session';
import { blockName } from './blockName';

/** A block in the member's own version: its head as tape, its lines with what shows them, its cautions once. */
export function MyBlockView({ team, block }: { team: string; block: MyBlock }) {
  const cautions = [
    ...new Map(block.lines.flatMap((line) => line.cautions).map((caution) => [caution.say, caution])).values(),
  ];
  const name = blockName(block);
  return (
    <section aria-label={name} className="border-t-thin border-line pt-4 first:border-t-0 first:pt-0">
      <header className="flex flex-wrap items-center gap-x-3 gap-y-1">
        <TapeStrip kind={block.kind as ChapterKind} className="w-22" />
        <h2 className="text-md font-extrabold">{name}</h2>
        {block.scheme && <p className="ms-auto text-sm text-ink2">{formatScheme(block.scheme)}</p>}
      </header>
      {block.note && <p className="mt-1.5 text-ink2 wrap-anywhere whitespace-pre-line">{block.note}</p>}
      {(block.lines.length > 0 || block.moments.length > 0) && (
        <ul className="mt-1">
          {block.moments.map((moment) => (
            <MediaRow
              key={moment.chapterId}
              // the block's head has just said it
              title={moment.title === name ? `Watch the ${block.kind}` : moment.title}
              to={momentPath(team, moment)}
              still={{ src: moment.pictureUrl, length: formatMs(moment.endMs - moment.startMs) }}
            />
          ))}
          {block.lines.map((line) => (
            <LineRow key={line.lineId} team={team} line={line} />
          ))}
        </ul>
      )}
      {cautions.length > 0 && (
        <div className="mt-2 mb-1 space-y-2">
          {cautions.map((caution) => (
            <Caution key={caution.say} todo={caution.say}>
              {caution.more}
            </Caution>
          ))}
        </div>
      )}
    </section>
  );
}

function LineRow({ team, line }: { team: string; line: MyLine }) {
  const { demo, insteadOf, noWayText } = line;
  return (
    <MediaRow
      title={line.movement.name}
      to={demo ? momentPath(team, demo) : teamPath(team, 'dictionary', line.movement.id)}
      still={{ src: demo?.pictureUrl ?? null, length: demo ? formatMs(demo.endMs - demo.startMs) : 'not filmed' }}
      figure={<DoseFigure words={formatDose(line.dose)} />}
      notes={[
        insteadOf && (
          <>
            for <s>{insteadOf.movement.name}</s> · {insteadOf.missingText}
            {insteadOf.reason && <span className="block">{insteadOf.reason}</span>}
          </>
        ),
        noWayText && <strong className="text-danger">You have {noWayText}. Ask your coach what to do instead.</strong>,
        line.note,
        !insteadOf && !line.note && line.points[0],
        insteadOf && (
          <TextLink
            className="relative z-10 inline-flex min-h-target items-center"
            to={teamPath(team, 'dictionary', insteadOf.movement.id)}
          >
            See {insteadOf.movement.name}
          </TextLink>
        ),
      ]}
    />
  );
}

/** A tempo such as 5-1-1-0 is read as one figure: no line breaks at its hyphens. */
function DoseFigure({ words }: { words: string }) {
  return words.split(/(\S*-\S*)/).map((piece, at) => (
    // biome-ignore lint/suspicious/noArrayIndexKey: pieces of one line, never reordered
    <span key={at} className={piece.includes('-') ? 'whitespace-nowrap' : undefined}>
      {piece}
    </span>
  ));
}
