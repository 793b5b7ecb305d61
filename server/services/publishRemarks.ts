import { Op, QueryTypes } from 'sequelize';
import type { z } from 'zod';
import type * as contract from '../../shared/contracts/sessions';
import { chapterFaults } from '../../shared/domain/chapters/chapterRules';
import type { OwnedKit } from '../../shared/domain/kit/kit';
import { missingText } from '../../shared/domain/kit/missingText';
import { type RankedSubstitution, substitutionsFor } from '../../shared/domain/kit/substitutionsFor';
import { database } from '../models/database';
import { ChapterRow } from '../models/marks';
import { Recording } from '../models/recordings';
import type { Session } from '../models/sessions';
import type { Actor } from './actor';
import { asChapter } from './chapters';
import { demoKinds, newestDemos } from './demos';
import { dictionaryOf, type TeamDictionary } from './dictionary';
import { groupBy, movementsOf, plansOf } from './sessionPlan';

export type PublishRemark = z.infer<typeof contract.PublishRemark>;

/**
 * What is missing before members can use a session. `missing` is only what makes it useless: a coach with little time decides
 * about the rest.
 */
export async function publishRemarks(actor: Actor, session: Session): Promise<PublishRemark[]> {
  const plan = (await plansOf(actor.team.id, [session.id])).get(session.id) ?? [];
  const recordings = await Recording.findAll({
    where: { teamId: actor.team.id, sessionId: session.id },
    order: [
      ['take', 'ASC'],
      ['id', 'ASC'],
    ],
  });
  const dictionary = await dictionaryOf(actor.team.id);
  const remarks = [
    ...planRemarks(plan),
    ...(await recordingRemarks(actor, recordings)),
    ...(await movementRemarks(actor, session, plan, dictionary)),
  ];
  const seen = new Set<string>();
  return remarks.filter(({ text }) => !seen.has(text) && seen.add(text));
}

const remark = (
  severity: PublishRemark['severity'],
  text: string,
  about: { recordingId?: string; movementId?: string } = {},
): PublishRemark => ({
  severity,
  text,
  recordingId: about.recordingId ?? null,
  movementId: about.movementId ?? null,
});

function planRemarks(plan: readonly contract.Block[]): PublishRemark[] {
  if (plan.length === 0) return [remark('missing', 'The plan has no blocks yet.')];
  const isEmpty = plan.every(({ lines, note, title, scheme }) => !lines.length && !note && !title && !scheme);
  if (isEmpty) return [remark('missing', 'The plan’s blocks are empty: nothing says what to do.')];
  return plan.some(({ lines }) => lines.length > 0)
    ? []
    : [remark('thin', 'No line of the plan names a movement, so nobody gets a version for their kit.')];
}

async function recordingRemarks(actor: Actor, recordings: Recording[]): Promise<PublishRemark[]> {
  if (recordings.length === 0) return [remark('thin', 'There is no recording yet: members get the plan alone.')];
  const ids = recordings.map(({ id }) => id);
  const [chapters, captioned] = await Promise.all([
    ChapterRow.findAll({ where: { teamId: actor.team.id, recordingId: ids }, order: [['startMs', 'ASC']] }),
    database().query<{ recording_id: string }>(
      `select t.recording_id from caption_tracks t
       where t.recording_id in (:ids) and exists (select 1 from caption_lines l where l.track_id = t.id)`,
      { replacements: { ids }, type: QueryTypes.SELECT },
    ),
  ]);
  const chaptersOf = groupBy(chapters, ({ recordingId }) => recordingId);
  const hasCaptions = new Set(captioned.map(({ recording_id }) => recording_id));
  return recordings.flatMap((recording) => {
    const about = { recordingId: recording.id };
    const called = `“${recording.title}”`;
    if (recording.state === 'failed')
      return [remark('thin', `${called} could not be made ready, so members do not see it.`, about)];
    if (recording.state !== 'ready')
      return [remark('thin', `${called} is not ready yet. Members see it as soon as it is.`, about)];
    const marked = (chaptersOf.get(recording.id) ?? []).map(asChapter);
    return [
      ...(marked.length === 0
        ? [remark('thin', `${called} has no chapters, so nobody finds what it shows.`, about)]
        : []),
      ...chapterFaults(marked, recording.durationMs)
        .filter(({ severity }) => severity === 'warning')
        .map(({ message }) => remark('thin', `${called}: ${message}`, about)),
      ...(hasCaptions.has(recording.id)
        ? []
        : [remark('thin', `${called} has no captions: who watches without sound misses what is said.`, about)]),
    ];
  });
}

async function movementRemarks(
  actor: Actor,
  session: Session,
  plan: readonly contract.Block[],
  dictionary: TeamDictionary,
): Promise<PublishRemark[]> {
  const lines = plan.flatMap((block) => block.lines);
  const gaps = lines.flatMap((line) => gapsOf(line, dictionary));
  const standIns = [
    ...lines.flatMap((line) => line.substitutions.map(({ movementId }) => ({ movementId, for: line.movementId }))),
    ...gaps.flatMap((gap) => (gap.way ? [{ movementId: gap.way.movementId, for: gap.movementId }] : [])),
  ];
  const shown = await shownAfterPublishing(actor, session, [
    ...movementsOf(plan),
    ...standIns.map(({ movementId }) => movementId),
  ]);
  const name = (id: string) => `“${dictionary.movements.get(id)?.name ?? 'a movement'}”`;
  return [
    ...lines
      .filter(({ movementId }) => !shown.has(movementId))
      .map(({ movementId }) => remark('thin', `No demo shows ${name(movementId)} yet.`, { movementId })),
    ...gaps
      .filter(({ way }) => !way)
      .map(({ movementId, without }) =>
        remark('thin', `${name(movementId)} has no substitution for members with ${without}.`, { movementId }),
      ),
    ...standIns
      .filter(({ movementId }) => !shown.has(movementId))
      .map((standIn) =>
        remark('thin', `${name(standIn.movementId)} stands in for ${name(standIn.for)}, and no demo shows it yet.`, {
          movementId: standIn.movementId,
        }),
      ),
  ];
}

type Gap = { movementId: string; without: string; way: RankedSubstitution | undefined };

/** What a line leaves a member with who has all kit but that of one need: the best way, or none. */
function gapsOf(line: contract.PlanLine, { kit, kitItems, movements }: TeamDictionary): Gap[] {
  const needs = movements.get(line.movementId)?.kitNeeded ?? [];
  return needs.flatMap((need) => {
    const lacking = new Set(need.anyOf.map(({ kitItemId }) => kitItemId));
    const allElse = Array.from(
      kitItems.keys(),
      (kitItemId): OwnedKit => ({ kitItemId, count: 50, loadsKg: [] }),
    ).filter(({ kitItemId }) => !lacking.has(kitItemId));
    const answer = substitutionsFor(line.movementId, kit, allElse, line.substitutions);
    if (answer.possible) return [];
    return [{ movementId: line.movementId, without: missingText(need, [], kitItems), way: answer.ways[0] }];
  });
}

/** Which movements have a demo once the session is published: those of published sessions and of its own ready recordings. */
async function shownAfterPublishing(actor: Actor, session: Session, movementIds: string[]): Promise<Set<string>> {
  const ids = [...new Set(movementIds)];
  const [published, own] = await Promise.all([
    newestDemos(actor, ids),
    ChapterRow.findAll({
      where: {
        teamId: actor.team.id,
        movementId: ids,
        kind: [...demoKinds],
        recordingId: {
          [Op.in]: (
            await Recording.findAll({
              where: { teamId: actor.team.id, sessionId: session.id, state: 'ready' },
              attributes: ['id'],
            })
          ).map(({ id }) => id),
        },
      },
      attributes: ['movementId'],
    }),
  ]);
  return new Set([...published.keys(), ...own.flatMap(({ movementId }) => movementId ?? [])]);
}
