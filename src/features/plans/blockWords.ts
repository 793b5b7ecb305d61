import type { Block } from '../../../shared/contracts/sessions';
import type { BlockKind } from '../../../shared/domain/words';

export const blockWords = {
  briefing: 'Briefing',
  'warm-up': 'Warm-up',
  activation: 'Activation',
  mobility: 'Mobility',
  workout: 'Workout',
  accessory: 'Accessory',
  'cool-down': 'Cool-down',
} as const satisfies Record<BlockKind, string>;

/** A block as it is called in a sentence: its kind, and its title where that says more. */
export function blockName({ kind, title }: Pick<Block, 'kind' | 'title'>): string {
  const own = title.trim();
  return own === '' || own.toLowerCase() === kind ? blockWords[kind] : `${blockWords[kind]} · ${own}`;
}
