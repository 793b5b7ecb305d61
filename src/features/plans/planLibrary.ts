import type { MovementName } from '../../components/MovementField';
import type { KitById, MovementFacts } from './lineWays';

/** What a plan is written with. */
export type PlanLibrary = {
  team: string;
  sessionId: string;
  movements: readonly MovementName[];
  names: ReadonlyMap<string, string>;
  kit: KitById;
  facts: ReadonlyMap<string, MovementFacts>;
  /** asks for a movement that the dictionary does not have yet */
  add: (name: string, then: (movement: { id: string; name: string }) => void) => void;
};

export const movementName = (names: ReadonlyMap<string, string>, id: string): string =>
  names.get(id) ?? 'a movement that is gone';
