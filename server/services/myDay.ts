import { Op } from 'sequelize';
import type * as contract from '../../shared/contracts/sessions';
import type { OwnedKit } from '../../shared/domain/kit/kit';
import { missingTexts } from '../../shared/domain/kit/missingText';
import { type MyLine, myVersion } from '../../shared/domain/kit/myVersion';
import { ChapterRow } from '../models/marks';
import { Session } from '../models/sessions';
import type { Actor } from './actor';
import { demoKinds, newestDemos } from './demos';
import { dictionaryOf, type TeamDictionary } from './dictionary';
import { presentMoments } from './moments';
import { kitOf } from './myKit';
import { plansOf } from './sessionPlan';
import { namesOfPeople, recordingsOf } from './sessionPresent';
import { dateInZone } from './teamDay';

/**
 * A day's published sessions in the actor's own version: kit, then substitutions, then doses. Until somebody has said what they
 * own they get the plan as it is written. As many queries for a long plan as for a short one.
 * @param date the team's today where none is given
 */
export async function myDay(actor: Actor, date?: string): Promise<contract.MyDay> {
  const today = dateInZone(actor.team.timeZone);
  const day = date ?? today;
  const published = { teamId: actor.team.id, state: 'published' } as const;
  const neighbour = (where: object, direction: 'ASC' | 'DESC') =>
    Session.findOne({
      where: { ...published, ...where },
      attributes: ['date', 'title'],
      order: [
        ['date', direction],
        ['id', 'ASC'],
      ],
    });
  const [sessions, previous, next, kit] = await Promise.all([
    Session.findAll({
      where: { ...published, date: day },
      order: [
        ['createdAt', 'ASC'],
        ['id', 'ASC'],
      ],
    }),
    neighbour({ date: { [Op.lt]: day } }, 'DESC'),
    neighbour({ date: { [Op.gt]: day } }, 'ASC'),
    kitOf(actor),
  ]);
  return {
    date: day,
    today,
    previous: previous && { date: previous.date, title: previous.title },
    next: next && { date: next.date, title: next.title },
    sessions: await inMyVersion(actor, sessions, kit),
    kitUnknown: !kit.told,
  };
}

type Day = { dictionary: TeamDictionary; owned: readonly OwnedKit[]; told: boolean };
type PlannedLine = MyLine<contract.PlanLine>;

async function inMyVersion(
  actor: Actor,
  sessions: Session[],
  kit: { told: boolean; items: OwnedKit[] },
): Promise<contract.MyDay['sessions']> {
  const ids = sessions.map(({ id }) => id);
  const [plans, recordings, coaches] = await Promise.all([
    plansOf(actor.team.id, ids),
    recordingsOf(actor, ids, 'ready'),
    namesOfPeople(sessions.map(({ coachId }) => coachId)),
  ]);
  // after the plans, so that every movement of theirs is in it
  const dictionary = await dictionaryOf(actor.team.id);
  const day: Day = { dictionary, owned: kit.items, told: kit.told };
  const mine = sessions.map((session) => {
    const plan = plans.get(session.id) ?? [];
    const version = kit.told ? myVersion(plan, kit.items, dictionary.kit) : asWritten(plan);
    return { session, version, recordings: recordings.get(session.id) ?? [] };
  });

  const chapters = await ChapterRow.findAll({
    where: {
      teamId: actor.team.id,
      recordingId: mine.flatMap((one) => one.recordings.map(({ id }) => id)),
      kind: { [Op.ne]: 'aside' },
    },
    order: [['startMs', 'ASC']],
  });
  const lines = mine.flatMap(({ version }) => version.blocks.flatMap((block) => block.lines));
  const elsewhere = await newestDemos(
    actor,
    lines.map(({ movementId }) => movementId),
  );
  const moments = new Map(
    (
      await presentMoments(actor, [
        ...new Map([...chapters, ...elsewhere.values()].map((one) => [one.id, one])).values(),
      ])
    ).map((moment) => [moment.chapterId, moment]),
  );
  const momentOf = (chapter: ChapterRow | undefined) => (chapter && moments.get(chapter.id)) ?? null;

  return mine.map(({ session, version, recordings: own }) => {
    const takes = new Map(own.map(({ id }, index) => [id, index]));
    const ofSession = chapters
      .filter(({ recordingId }) => takes.has(recordingId))
      .toSorted((a, b) => (takes.get(a.recordingId) ?? 0) - (takes.get(b.recordingId) ?? 0));
    return {
      id: session.id,
      title: session.title,
      note: session.note,
      aim: session.aim,
      coach: session.coachId === null ? null : (coaches.get(session.coachId) ?? null),
      changedLines: version.changed,
      missingTexts: missingOfDay(
        version.blocks.flatMap((block) => block.lines),
        day,
      ),
      blocks: version.blocks.map(({ block, lines: own }) => ({
        id: block.id,
        kind: block.kind,
        title: block.title,
        scheme: block.scheme,
        note: block.note,
        lines: own.map((line) => ({
          ...presentLine(line, day),
          demo: momentOf(bestDemo(line, block.id, ofSession) ?? elsewhere.get(line.movementId)),
        })),
        moments: ofSession.flatMap((chapter) => (showsBlock(chapter, block.id) ? (momentOf(chapter) ?? []) : [])),
      })),
      recordings: own,
    };
  });
}

function asWritten(plan: readonly contract.Block[]) {
  return {
    blocks: plan.map((block) => ({
      block,
      lines: block.lines.map(
        (line): PlannedLine => ({ state: 'asPlanned', line, movementId: line.movementId, dose: line.dose }),
      ),
    })),
    changed: 0,
  };
}

const showsBlock = (chapter: ChapterRow, blockId: string) =>
  chapter.blockId === blockId &&
  (chapter.movementId === null || chapter.kind === 'workout' || chapter.kind === 'briefing');

/**
 * The chapter of the session's own recordings that shows a line best: for a replaced line one that was filmed as its substitution,
 * then one that belongs to the block, then a demo before a substitution's; of equals the first.
 */
function bestDemo(line: PlannedLine, blockId: string, chapters: readonly ChapterRow[]): ChapterRow | undefined {
  const insteadOf = line.state === 'replaced' ? line.insteadOf : null;
  const rank = (chapter: ChapterRow) =>
    (insteadOf !== null && chapter.standsInForMovementId === insteadOf ? 0 : 4) +
    (chapter.blockId === blockId ? 0 : 2) +
    (chapter.kind === 'demo' ? 0 : 1);
  return chapters
    .filter(({ movementId, kind }) => movementId === line.movementId && demoKinds.some((one) => one === kind))
    .toSorted((a, b) => rank(a) - rank(b))[0];
}

function presentLine(line: PlannedLine, { dictionary, owned }: Day): Omit<contract.MyLine, 'demo'> {
  const named = (id: string) => ({ id, name: dictionary.movements.get(id)?.name ?? '' });
  const shown = dictionary.movements.get(line.movementId);
  const missing = line.state === 'asPlanned' ? '' : inWords(missingTexts(line.missing, owned, dictionary.kitItems));
  return {
    lineId: line.line.id,
    movement: named(line.movementId),
    dose: line.dose,
    // what the coach wrote about a movement is not true of what is done instead
    note: line.state === 'replaced' ? '' : line.line.note,
    points: [...(shown?.points ?? [])],
    cautions: [...(shown?.cautions ?? [])],
    insteadOf:
      line.state === 'replaced'
        ? { movement: named(line.insteadOf), dose: line.line.dose, reason: line.reason, missingText: missing }
        : null,
    noWayText: line.state === 'askTheCoach' ? missing : null,
  };
}

function missingOfDay(lines: readonly PlannedLine[], { dictionary, owned }: Day): string[] {
  const needs = lines.flatMap((line) => (line.state === 'asPlanned' ? [] : line.missing));
  return missingTexts(needs, owned, dictionary.kitItems);
}

/** "no rope, no box and nothing to hang from" */
const inWords = (texts: readonly string[]) => new Intl.ListFormat('en-GB').format(texts);
