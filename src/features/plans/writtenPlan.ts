import { z } from 'zod';
import { type Block, PlanFields, type PlanLine } from '../../../shared/contracts/sessions';
import { formatDose, parseDose } from '../../../shared/domain/training/dose';
import { formatScheme, parseScheme, type Scheme } from '../../../shared/domain/training/scheme';
import { Id } from '../../../shared/domain/values';
import { blockKinds, missingThings } from '../../../shared/domain/words';
import { blockName } from './blockWords';

/** A plan while it is being written: doses and schemes are text still, and a movement may not be chosen yet. */

const WrittenSubstitution = z.object({
  id: Id,
  movementId: Id.nullable(),
  missing: z.enum(missingThings),
  missingKitItemId: Id.nullable(),
  dose: z.string(),
  reason: z.string(),
});
export type WrittenSubstitution = z.infer<typeof WrittenSubstitution>;

const WrittenLine = z.object({
  id: Id,
  movementId: Id.nullable(),
  dose: z.string(),
  note: z.string(),
  substitutions: z.array(WrittenSubstitution),
});
export type WrittenLine = z.infer<typeof WrittenLine>;

const WrittenBlock = z.object({
  id: Id,
  kind: z.enum(blockKinds),
  title: z.string(),
  scheme: z.string(),
  note: z.string(),
  lines: z.array(WrittenLine),
});
export type WrittenBlock = z.infer<typeof WrittenBlock>;

export const WrittenPlan = z.object({
  date: z.string(),
  title: z.string(),
  note: z.string(),
  aim: z.string(),
  blocks: z.array(WrittenBlock),
});
export type WrittenPlan = z.infer<typeof WrittenPlan>;

/** A saved plan as text to go on writing. */
export function asWritten({ date, title, note, aim, blocks }: PlanFields): WrittenPlan {
  return {
    date,
    title,
    note,
    aim,
    blocks: blocks.map((block) => ({
      ...block,
      scheme: block.scheme ? formatScheme(block.scheme) : '',
      lines: block.lines.map((line) => ({
        ...line,
        dose: formatDose(line.dose),
        substitutions: line.substitutions.map((one) => ({ ...one, dose: formatDose(one.dose) })),
      })),
    })),
  };
}

/** A line that was added and never written on; it is not saved, and nobody is told off for it. */
export const isBlankLine = ({ movementId, dose, note, substitutions }: WrittenLine): boolean =>
  movementId === null && !dose.trim() && !note.trim() && substitutions.every(isBlankSubstitution);

export const isBlankSubstitution = ({ movementId, dose, reason }: WrittenSubstitution): boolean =>
  movementId === null && !dose.trim() && !reason.trim();

export type PlanFaults = { faults: string[] };

/**
 * Reads a written plan. Blank lines are left out.
 * @param nameOf a movement's name
 * @returns the plan, or everything that is wrong with it, each with its place: “Workout, Ring row: …”
 */
export function readPlan(written: WrittenPlan, nameOf: (movementId: string) => string): PlanFields | PlanFaults {
  const faults: string[] = [];
  const blocks = written.blocks.map((block) => readBlock(block, nameOf, (text) => faults.push(text)));
  if (!written.title.trim()) faults.unshift('Give the session a title.');
  if (!PlanFields.shape.date.safeParse(written.date).success) faults.unshift('Choose the day of the session.');
  if (faults.length > 0) return { faults };
  const { date, title, note, aim } = written;
  const read = PlanFields.safeParse({ date, title, note, aim, blocks });
  return read.success ? read.data : { faults: read.error.issues.map(({ message }) => message) };
}

type Tell = (fault: string) => void;

function readBlock(written: WrittenBlock, nameOf: (id: string) => string, tell: Tell): Block {
  const { id, kind, title, note } = written;
  const place = blockName(written);
  const lines = written.lines
    .filter((line) => !isBlankLine(line))
    .flatMap((line, at): PlanLine[] => {
      const called = line.movementId === null ? `line ${at + 1}` : nameOf(line.movementId);
      const read = readLine(line, nameOf, (fault) => tell(`${place}, ${called}: ${fault}`));
      return read ? [read] : [];
    });
  return { id, kind, title, note, scheme: readScheme(written.scheme, (fault) => tell(`${place}: ${fault}`)), lines };
}

function readScheme(text: string, tell: Tell): Scheme | null {
  if (!text.trim()) return null;
  const scheme = parseScheme(text);
  if (!('fault' in scheme)) return scheme;
  tell(scheme.fault);
  return null;
}

function readLine(written: WrittenLine, nameOf: (id: string) => string, tell: Tell): PlanLine | null {
  const { id, movementId, note } = written;
  const dose = parseDose(written.dose);
  const substitutions = written.substitutions
    .filter((one) => !isBlankSubstitution(one))
    .flatMap((one) => {
      const called = one.movementId === null ? 'what to do instead' : nameOf(one.movementId);
      const read = readSubstitution(one, movementId, (fault) => tell(`${called}: ${fault}`));
      return read ? [read] : [];
    });
  if (movementId === null) tell('Choose a movement.');
  if ('fault' in dose) tell(dose.fault);
  return movementId === null || 'fault' in dose ? null : { id, movementId, dose, note, substitutions };
}

function readSubstitution(
  { id, movementId, missing, missingKitItemId, reason, dose: text }: WrittenSubstitution,
  planned: string | null,
  tell: Tell,
): PlanLine['substitutions'][number] | null {
  const dose = parseDose(text);
  if (movementId === null) tell('Choose a movement.');
  else if (movementId === planned) tell('That is the planned movement itself. Choose another.');
  if (missing === 'kit' && missingKitItemId === null) tell('Say which kit is missing.');
  if ('fault' in dose) tell(dose.fault);
  return movementId === null || 'fault' in dose ? null : { id, movementId, missing, missingKitItemId, dose, reason };
}
