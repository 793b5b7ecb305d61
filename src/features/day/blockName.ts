import type { BlockKind } from '../../../shared/domain/words';

const kindNames = {
  briefing: 'Briefing',
  'warm-up': 'Warm-up',
  activation: 'Activation',
  mobility: 'Mobility',
  workout: 'Workout',
  accessory: 'Accessory',
  'cool-down': 'Cool-down',
} as const satisfies Record<BlockKind, string>;

/** What a block is called: its own title, else its kind. */
export const blockName = ({ title, kind }: { title: string; kind: BlockKind }): string => title || kindNames[kind];
