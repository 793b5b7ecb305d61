import type { DemoMovement } from '../shapes';
import { needs, oneOf, option } from '../shorthand';

export const carries = [
  {
    slug: 'suitcase-carry',
    name: 'Suitcase carry',
    otherNames: ['one-sided carry', 'one-hand carry'],
    pattern: 'carry',
    kitNeeded: [oneOf(option('kettlebell', 1, 8), option('dumbbell', 1, 8))],
    points: ['Walk as if nothing hung there', 'Shoulders level', 'Short, quiet steps', 'Turn slowly'],
    faults: ['Leaning away from the weight', 'Weight knocks against the leg'],
    cautions: [
      {
        say: 'Clear your path before you pick up.',
        more: 'Set the weight down with bent knees when the grip goes, do not let it drop.',
      },
    ],
  },
  {
    slug: 'two-hand-carry',
    name: 'Two-hand carry',
    otherNames: ['loaded walk', 'double carry'],
    pattern: 'carry',
    kitNeeded: [oneOf(option('dumbbell', 2, 6), option('kettlebell', 2, 8))],
    points: ['Tall, ribs over hips', 'Arms long and still', 'Short, quick steps'],
    faults: ['Shoulders roll forwards', 'Long, swaying steps'],
    cautions: [
      { say: 'Clear your path before you pick up.', more: 'Lift both weights from the floor with a long back.' },
    ],
  },
  {
    slug: 'backpack-carry',
    name: 'Backpack carry',
    otherNames: ['bag hug carry', 'bear hug walk'],
    pattern: 'carry',
    kitNeeded: [needs('backpack', 1, 5)],
    points: ['Hug the bag high on the chest', 'Breathe behind it', 'Walk tall'],
    faults: ['Leaning back', 'Bag sinks to the belly'],
    cautions: [{ say: 'Make sure that you can see your feet.', more: 'Carry on level ground, not on stairs.' }],
  },
  {
    slug: 'front-carry',
    name: 'Front carry',
    otherNames: ['goblet carry', 'cup carry'],
    pattern: 'carry',
    kitNeeded: [oneOf(option('kettlebell', 1, 8), option('dumbbell', 1, 8))],
    points: ['Weight at the breastbone', 'Elbows down', 'Quiet steps'],
    faults: ['Leaning back', 'Breath held'],
    cautions: [],
  },
  {
    slug: 'suitcase-march',
    name: 'Suitcase march',
    otherNames: ['loaded march on the spot'],
    pattern: 'carry',
    kitNeeded: [oneOf(option('kettlebell', 1, 6), option('dumbbell', 1, 6), option('backpack', 1, 4))],
    points: ['One knee up at a time', 'Stand tall on the other leg', 'Weight stays still'],
    faults: ['Leaning to either side', 'Rushing'],
    cautions: [],
  },
  {
    slug: 'slow-march',
    name: 'Slow march',
    otherNames: ['empty-handed march', 'balance march'],
    pattern: 'carry',
    kitNeeded: [],
    points: ['Make fists as if you carried', 'Knee to hip height', 'Two counts on one leg'],
    faults: ['Leaning back', 'Rushing'],
    cautions: [],
  },
] as const satisfies readonly DemoMovement[];
