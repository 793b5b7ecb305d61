import type { DemoMovement } from '../shapes';
import { needs, oneOf, option } from '../shorthand';

export const lunges = [
  {
    slug: 'split-squat',
    name: 'Split squat',
    otherNames: ['static lunge', 'scissor squat'],
    pattern: 'lunge',
    kitNeeded: [],
    points: [
      'Feet on two rails, not on a tightrope',
      'Straight down like a lift',
      'Back knee kisses the floor',
      'Front heel heavy',
    ],
    faults: ['Front knee falls inwards', 'Tipping forwards', 'Pushing off the back toes'],
    cautions: [],
  },
  {
    slug: 'dumbbell-split-squat',
    name: 'Dumbbell split squat',
    otherNames: ['loaded split squat', 'DB split squat'],
    pattern: 'lunge',
    kitNeeded: [needs('dumbbell', 2, 5)],
    points: ['Weights hang beside the hips', 'Straight down', 'Front heel heavy'],
    faults: ['Shoulders creep up', 'Front knee falls inwards'],
    cautions: [
      {
        say: 'Learn it without weight first.',
        more: 'Put the weights down beside you, not behind you, when you change legs.',
      },
    ],
  },
  {
    slug: 'reverse-lunge',
    name: 'Reverse lunge',
    otherNames: ['backward lunge', 'step-back lunge'],
    pattern: 'lunge',
    kitNeeded: [],
    points: ['Step back far enough for two right angles', 'Front foot stays rooted', 'Come up through the front heel'],
    faults: ['Stepping onto a tightrope', 'Dropping the back knee'],
    cautions: [],
  },
  {
    slug: 'box-step-up',
    name: 'Box step-up',
    otherNames: ['crate step-up', 'step-up'],
    pattern: 'lunge',
    kitNeeded: [needs('box')],
    points: ['Whole foot on the box', 'Lean in, then stand all the way up', 'Step down slowly, do not drop'],
    faults: ['Bouncing off the back foot', 'Heel hangs over the edge', 'Not standing tall on top'],
    cautions: [
      {
        say: 'Check that the box cannot tip or slide.',
        more: 'Stand it on the rough side or against a wall, and look where you step down.',
      },
    ],
  },
  {
    slug: 'low-step-up',
    name: 'Low step-up',
    otherNames: ['stair step-up', 'bottom-stair step-up'],
    pattern: 'lunge',
    kitNeeded: [oneOf(option('step'), option('box'))],
    points: ['Whole foot on the step', 'Stand tall', 'Down with control'],
    faults: ['Bouncing off the back foot', 'Looking down all the time'],
    cautions: [],
  },
  {
    slug: 'lateral-lunge',
    name: 'Lateral lunge',
    otherNames: ['side lunge'],
    pattern: 'lunge',
    kitNeeded: [],
    points: ['Sit back over one heel', 'Other leg straight', 'Both feet point forwards'],
    faults: ['Knee falls inwards', 'Heel lifts'],
    cautions: [],
  },
  {
    slug: 'rear-foot-split-squat',
    name: 'Rear-foot-raised split squat',
    otherNames: ['raised split squat', 'back foot up split squat'],
    pattern: 'lunge',
    kitNeeded: [oneOf(option('chair'), option('box'))],
    points: ['Laces on the seat', 'Most of the weight on the front leg', 'Straight down'],
    faults: ['Front foot too close', 'Hips twist towards the back leg'],
    cautions: [
      { say: 'Stand the chair against a wall.', more: 'Keep a hand near something steady until it feels calm.' },
    ],
  },
] as const satisfies readonly DemoMovement[];
