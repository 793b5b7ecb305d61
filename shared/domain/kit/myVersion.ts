import type { Dose } from '../training/dose';
import type { KitNeed, OwnedKit } from './kit';
import {
  doseFor,
  type KitDictionary,
  type LineSubstitution,
  type RankedSubstitution,
  substitutionsFor,
} from './substitutionsFor';

/** A line of a plan as far as kit is concerned. */
export type PlanLine = { movementId: string; dose: Dose; substitutions: readonly LineSubstitution[] };

/** A line of a plan as one member does it. `line` is the planned one with all that the caller had in it. */
export type MyLine<Line extends PlanLine> =
  | { state: 'asPlanned'; line: Line; movementId: string; dose: Dose }
  | {
      state: 'replaced';
      line: Line;
      movementId: string;
      dose: Dose;
      /** the planned movement */
      insteadOf: string;
      reason: string;
      missing: KitNeed[];
      via: string[];
      /** the other ways, best first, for a member who wants to choose */
      otherWays: RankedSubstitution[];
    }
  | { state: 'askTheCoach'; line: Line; movementId: string; dose: Dose; missing: KitNeed[] };

export type MyVersion<Line extends PlanLine, Block extends { lines: readonly Line[] }> = {
  blocks: { block: Block; lines: MyLine<Line>[] }[];
  /** lines that are done differently than planned */
  changed: number;
  /** lines that nobody without this kit can do as things are: the coach has to say */
  toAsk: number;
};

/** A session's plan in a member's own version: every line as planned, replaced by the best way for this kit, or a question to the coach. */
export function myVersion<Line extends PlanLine, Block extends { lines: readonly Line[] }>(
  blocks: readonly (Block & { lines: readonly Line[] })[],
  owned: readonly OwnedKit[],
  dictionary: KitDictionary,
): MyVersion<Line, Block> {
  const mine = blocks.map((block) => ({ block, lines: block.lines.map((line) => myLine(line, owned, dictionary)) }));
  const count = (state: MyLine<Line>['state']) =>
    mine.flatMap(({ lines }) => lines).filter((line) => line.state === state).length;
  return { blocks: mine, changed: count('replaced'), toAsk: count('askTheCoach') };
}

/** One line of a plan in a member's own version. */
export function myLine<Line extends PlanLine>(
  line: Line,
  owned: readonly OwnedKit[],
  dictionary: KitDictionary,
): MyLine<Line> {
  const { movementId, dose } = line;
  const answer = substitutionsFor(movementId, dictionary, owned, line.substitutions);
  if (answer.possible) return { state: 'asPlanned', line, movementId, dose };
  const [way, ...otherWays] = answer.ways;
  if (!way) return { state: 'askTheCoach', line, movementId, dose, missing: answer.missing };
  return {
    state: 'replaced',
    line,
    movementId: way.movementId,
    dose: doseFor(way, dose),
    insteadOf: movementId,
    reason: oneReason(way.reasons),
    missing: answer.missing,
    via: way.via,
    otherWays,
  };
}

/** The reasons of a chain as one text: sentences follow each other, phrases are joined. */
export const oneReason = (reasons: readonly string[]) =>
  reasons.reduce(
    (text, reason) => (text === '' ? reason : /[.?!]$/.test(text) ? `${text} ${reason}` : `${text}; ${reason}`),
    '',
  );
