import type { Block as PlanBlock } from '../../shared/contracts/sessions';
import { Block, BlockLine, LineSubstitution } from '../models/sessions';

/** The plans of sessions, blocks in order, by session; three queries however many there are. */
export async function plansOf(teamId: string, sessionIds: readonly string[]): Promise<Map<string, PlanBlock[]>> {
  const plans = new Map<string, PlanBlock[]>(sessionIds.map((id) => [id, []]));
  if (sessionIds.length === 0) return plans;
  const inOrder: [string, string][] = [['position', 'ASC']];
  const blocks = await Block.findAll({ where: { teamId, sessionId: [...sessionIds] }, order: inOrder });
  const lines = await BlockLine.findAll({ where: { teamId, blockId: blocks.map(({ id }) => id) }, order: inOrder });
  const substitutions = await LineSubstitution.findAll({
    where: { teamId, lineId: lines.map(({ id }) => id) },
    order: inOrder,
  });
  const substitutionsOf = groupBy(substitutions, ({ lineId }) => lineId);
  const linesOf = groupBy(lines, ({ blockId }) => blockId);
  for (const block of blocks)
    plans.get(block.sessionId)?.push({
      id: block.id,
      kind: block.kind,
      title: block.title,
      scheme: block.scheme,
      note: block.note,
      lines: (linesOf.get(block.id) ?? []).map((line) => ({
        id: line.id,
        movementId: line.movementId,
        dose: line.dose,
        note: line.note,
        substitutions: (substitutionsOf.get(line.id) ?? []).map(
          ({ id, movementId, missing, missingKitItemId, dose, reason }) => ({
            id,
            movementId,
            missing,
            missingKitItemId,
            dose,
            reason,
          }),
        ),
      })),
    });
  return plans;
}

/** Every movement that a plan names, each once. */
export function movementsOf(plan: readonly PlanBlock[]): string[] {
  const lines = plan.flatMap((block) => block.lines);
  return [
    ...new Set(lines.flatMap((line) => [line.movementId, ...line.substitutions.map(({ movementId }) => movementId)])),
  ];
}

export function groupBy<T>(rows: readonly T[], keyOf: (row: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) {
    const group = groups.get(keyOf(row));
    if (group) group.push(row);
    else groups.set(keyOf(row), [row]);
  }
  return groups;
}
