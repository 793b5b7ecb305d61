import type { KitItem } from '../../../shared/contracts/kit';
import type { Block } from '../../../shared/contracts/sessions';
import type { MovementName } from '../../components/MovementField';
import type { Names } from './chapterNames';

/** What chapters can point at. */
export type Library = {
  movements: readonly MovementName[];
  names: Names;
  /** adds a movement to the dictionary, then calls back */
  add: (name: string, then: (movement: { id: string; name: string }) => void) => void;
  kit: readonly KitItem[];
  /** of the recording's session; null without one, or while it is on its way */
  blocks: readonly Block[] | null;
};
