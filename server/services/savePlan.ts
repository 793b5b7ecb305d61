import { QueryTypes } from 'sequelize';
import type { Block as PlanBlock } from '../../shared/contracts/sessions';
import { AppError, type FieldErrors } from '../../shared/errors';
import { database } from '../models/database';
import { KitItem, Movement } from '../models/dictionary';
import { Block, BlockLine, LineSubstitution } from '../models/sessions';
import type { Actor } from './actor';
import { followMerges } from './mergeMovements';
import { movementsOf } from './sessionPlan';

/**
 * Replaces a session's blocks, lines and substitutions, in the surrounding transaction. What stays keeps its row: chapters point at
 * blocks, and a line may move to another block.
 * @returns the plan as it is kept: merged duplicates became what they were merged into
 * @throws AppError `invalid` naming the field at fault
 */
export async function savePlan(actor: Actor, sessionId: string, sent: readonly PlanBlock[]): Promise<PlanBlock[]> {
  const blocks = await withMergesFollowed(actor, sent);
  await refuseFaulty(actor, sessionId, blocks);
  const teamId = actor.team.id;
  const lines = blocks.flatMap((block) =>
    block.lines.map((line, position) => ({ ...line, teamId, blockId: block.id, position })),
  );
  const substitutions = lines.flatMap((line) =>
    line.substitutions.map((substitution, position) => ({ ...substitution, teamId, lineId: line.id, position })),
  );

  await Block.bulkCreate(
    blocks.map(({ id, kind, title, scheme, note }, position) => ({
      teamId,
      id,
      sessionId,
      position,
      kind,
      title,
      scheme,
      note,
    })),
    { conflictAttributes: ownRow, updateOnDuplicate: ['position', 'kind', 'title', 'scheme', 'note'] },
  );
  await BlockLine.bulkCreate(
    lines.map(({ id, blockId, position, movementId, dose, note }) => ({
      teamId,
      id,
      blockId,
      position,
      movementId,
      dose,
      note,
    })),
    { conflictAttributes: ownRow, updateOnDuplicate: ['blockId', 'position', 'movementId', 'dose', 'note'] },
  );
  await LineSubstitution.bulkCreate(
    substitutions.map(({ id, lineId, position, movementId, missing, missingKitItemId, dose, reason }) => ({
      teamId,
      id,
      lineId,
      position,
      movementId,
      missing,
      missingKitItemId,
      dose,
      reason,
    })),
    { updateOnDuplicate: ['lineId', 'position', 'movementId', 'missing', 'missingKitItemId', 'dose', 'reason'] },
  );
  // after the others, so that a line that moved is not removed with the block that it left
  await removeOthers(teamId, sessionId, {
    blocks: blocks.map(({ id }) => id),
    lines: lines.map(({ id }) => id),
    substitutions: substitutions.map(({ id }) => id),
  });
  return blocks;
}

/** Only the team's own row is written over: another team's with the same id makes PostgreSQL refuse, whatever was checked before. */
const ownRow: ('teamId' | 'id')[] = ['teamId', 'id'];

async function removeOthers(
  teamId: string,
  sessionId: string,
  kept: { blocks: string[]; lines: string[]; substitutions: string[] },
): Promise<void> {
  // an id that none of them has stands for an empty list
  for (const [statement, ids] of [
    [removeSubstitutions, kept.substitutions],
    [removeLines, kept.lines],
    [removeBlocks, kept.blocks],
  ] as const)
    await database().query(statement, {
      replacements: { teamId, sessionId, ids: ids.length > 0 ? ids : [sessionId] },
    });
}

const removeSubstitutions = `delete from line_substitutions s using block_lines l, blocks b
  where s.team_id = :teamId and l.id = s.line_id and b.id = l.block_id and b.session_id = :sessionId and s.id not in (:ids)`;
const removeLines = `delete from block_lines l using blocks b
  where l.team_id = :teamId and b.id = l.block_id and b.session_id = :sessionId and l.id not in (:ids)`;
const removeBlocks = 'delete from blocks where team_id = :teamId and session_id = :sessionId and id not in (:ids)';

async function withMergesFollowed(actor: Actor, blocks: readonly PlanBlock[]): Promise<PlanBlock[]> {
  const became = await followMerges(actor.team.id, movementsOf(blocks));
  const follow = (id: string) => became(id) ?? id;
  return blocks.map((block) => ({
    ...block,
    lines: block.lines.map((line) => ({
      ...line,
      movementId: follow(line.movementId),
      substitutions: line.substitutions
        .filter((one) => one.movementId === line.movementId || follow(one.movementId) !== follow(line.movementId))
        .map((one) => ({ ...one, movementId: follow(one.movementId) })),
    })),
  }));
}

async function refuseFaulty(actor: Actor, sessionId: string, blocks: readonly PlanBlock[]): Promise<void> {
  const [movements, kit, taken] = [
    await knownMovements(actor, blocks),
    await knownKit(actor, blocks),
    await idsTakenElsewhere(sessionId, blocks),
  ];
  const fields: FieldErrors = {};
  const seen = new Set<string>();
  const checkId = (id: string, at: string) => {
    if (taken.has(id) || seen.has(id)) fields[`${at}.id`] = 'This id is taken. Add it anew.';
    seen.add(id);
  };
  const checkMovement = (id: string, at: string) => {
    if (!movements.has(id))
      fields[`${at}.movementId`] = 'This movement is not in the dictionary any more. Choose another.';
  };
  blocks.forEach((block, b) => {
    checkId(block.id, `blocks.${b}`);
    block.lines.forEach((line, l) => {
      const at = `blocks.${b}.lines.${l}`;
      checkId(line.id, at);
      checkMovement(line.movementId, at);
      line.substitutions.forEach(({ id, movementId, missing, missingKitItemId }, s) => {
        const place = `${at}.substitutions.${s}`;
        checkId(id, place);
        checkMovement(movementId, place);
        if (movementId === line.movementId)
          fields[`${place}.movementId`] = 'This is the planned movement itself. Choose another.';
        if (missing === 'kit' && missingKitItemId === null)
          fields[`${place}.missingKitItemId`] = 'Say which kit is missing.';
        else if (missing !== 'kit' && missingKitItemId !== null)
          fields[`${place}.missingKitItemId`] = 'Name kit only where kit is what is missing.';
        else if (missingKitItemId !== null && !kit.has(missingKitItemId))
          fields[`${place}.missingKitItemId`] = 'The team’s list has no such item any more.';
      });
    });
  });
  if (Object.keys(fields).length > 0) throw new AppError('invalid', { fields });
}

async function knownMovements(actor: Actor, blocks: readonly PlanBlock[]): Promise<Set<string>> {
  const rows = await Movement.findAll({
    where: { teamId: actor.team.id, id: movementsOf(blocks), mergedIntoId: null },
    attributes: ['id'],
  });
  return new Set(rows.map(({ id }) => id));
}

async function knownKit(actor: Actor, blocks: readonly PlanBlock[]): Promise<Set<string>> {
  const ids = blocks.flatMap((block) =>
    block.lines.flatMap((line) => line.substitutions.flatMap(({ missingKitItemId }) => missingKitItemId ?? [])),
  );
  const rows = await KitItem.findAll({ where: { teamId: actor.team.id, id: ids }, attributes: ['id'] });
  return new Set(rows.map(({ id }) => id));
}

/** Ids are the client's own choice: one that another session has is refused, never overwritten. */
async function idsTakenElsewhere(sessionId: string, blocks: readonly PlanBlock[]): Promise<Set<string>> {
  const lines = blocks.flatMap((block) => block.lines);
  const orNone = (ids: string[]) => (ids.length > 0 ? ids : [sessionId]);
  const rows = await database().query<{ id: string }>(
    `select id from blocks where id in (:blocks) and session_id <> :sessionId
     union all
     select l.id from block_lines l join blocks b on b.id = l.block_id where l.id in (:lines) and b.session_id <> :sessionId
     union all
     select s.id from line_substitutions s join block_lines l on l.id = s.line_id join blocks b on b.id = l.block_id
     where s.id in (:substitutions) and b.session_id <> :sessionId`,
    {
      replacements: {
        sessionId,
        blocks: orNone(blocks.map(({ id }) => id)),
        lines: orNone(lines.map(({ id }) => id)),
        substitutions: orNone(lines.flatMap((line) => line.substitutions.map(({ id }) => id))),
      },
      type: QueryTypes.SELECT,
    },
  );
  return new Set(rows.map(({ id }) => id));
}
