import type { DemoMovement } from '../shapes';
import { needs, oneOf, option } from '../shorthand';

export const squats = [
  {
    slug: 'air-squat',
    name: 'Air squat',
    otherNames: ['bodyweight squat', 'free squat'],
    pattern: 'squat',
    kitNeeded: [],
    points: [
      'Whole foot on the floor',
      'Hips back and down between the heels',
      'Knees follow the toes',
      'Stand all the way up',
    ],
    faults: ['Heels lift', 'Knees fall inwards', 'Chest drops onto the thighs'],
    cautions: [],
  },
  {
    slug: 'goblet-squat',
    name: 'Goblet squat',
    otherNames: ['front-held squat', 'cup squat'],
    pattern: 'squat',
    kitNeeded: [oneOf(option('kettlebell', 1, 8), option('dumbbell', 1, 8))],
    points: [
      'Weight close to the breastbone',
      'Elbows inside the knees at the bottom',
      'Chest tall',
      'Push the floor away',
    ],
    faults: ['Weight drifts away from the body', 'Back rounds at the bottom', 'Heels lift'],
    cautions: [
      {
        say: 'Put the weight down before your back rounds.',
        more: 'A squat that is less deep with a steady back is the better one.',
      },
    ],
  },
  {
    slug: 'slow-air-squat',
    name: 'Slow air squat',
    otherNames: ['tempo squat', 'five-down squat'],
    pattern: 'squat',
    kitNeeded: [],
    points: ['Five counts down', 'One still count at the bottom', 'Up without a bounce'],
    faults: ['The last part of the way down is dropped', 'Breath is held all the way'],
    cautions: [],
  },
  {
    slug: 'chair-squat',
    name: 'Chair squat',
    otherNames: ['sit to stand', 'box squat'],
    pattern: 'squat',
    kitNeeded: [oneOf(option('chair'), option('box'))],
    points: [
      'Feet under the knees before you stand',
      'Touch the seat, do not fall onto it',
      'Stand without the hands if you can',
    ],
    faults: ['Rocking to get up', 'Knees fall inwards'],
    cautions: [
      { say: 'Stand the chair against a wall.', more: 'A chair that slides away is the one way to get hurt here.' },
    ],
  },
  {
    slug: 'backpack-squat',
    name: 'Backpack squat',
    otherNames: ['bag squat', 'hugged squat'],
    pattern: 'squat',
    kitNeeded: [needs('backpack', 1, 5)],
    points: ['Hug the bag high', 'Elbows under it', 'Sit between the heels'],
    faults: ['The bag slides down to the belly', 'Heels lift'],
    cautions: [{ say: 'Close every zip and strap first.', more: 'A book that falls out lands on a foot.' }],
  },
  {
    slug: 'wall-sit',
    name: 'Wall sit',
    otherNames: ['wall chair', 'sitting hold'],
    pattern: 'squat',
    kitNeeded: [needs('wall')],
    points: ['Back flat against the wall', 'Shins upright', 'Keep breathing'],
    faults: ['Hands push on the thighs', 'Feet too close to the wall'],
    cautions: [
      { say: 'Slide up or sit down before your legs give way.', more: 'Shoes that grip make it safer than socks.' },
    ],
  },
  {
    slug: 'squat-hold',
    name: 'Squat hold',
    otherNames: ['low squat hold', 'half squat hold'],
    pattern: 'squat',
    kitNeeded: [],
    points: ['Only as deep as the heels stay down', 'Chest up', 'Small, calm breaths'],
    faults: ['Resting on the joints instead of the muscles', 'Arches of the feet collapse'],
    cautions: [],
  },
] as const satisfies readonly DemoMovement[];
