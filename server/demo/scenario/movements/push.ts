import type { DemoMovement } from '../shapes';
import { needs, oneOf, option } from '../shorthand';

export const pushes = [
  {
    slug: 'push-up',
    name: 'Push-up',
    otherNames: ['press-up', 'floor press-up'],
    pattern: 'push',
    kitNeeded: [],
    points: [
      'Hands under the shoulders',
      'One line from heel to crown',
      'Elbows at forty-five degrees',
      'Chest leads, not the chin',
    ],
    faults: ['Hips sag', 'Elbows flare to the sides', 'Half the way down'],
    cautions: [],
  },
  {
    slug: 'chair-push-up',
    name: 'Chair push-up',
    otherNames: ['hands-raised push-up', 'incline push-up'],
    pattern: 'push',
    kitNeeded: [oneOf(option('chair'), option('box'))],
    points: ['Hands on the edge of the seat', 'Same straight line as on the floor', 'Chest to the edge'],
    faults: ['Hips stay behind', 'Hands slip off the edge'],
    cautions: [
      {
        say: 'Push the chair against a wall first.',
        more: 'Its back leans on the wall, and your hands hold the front edge.',
      },
    ],
  },
  {
    slug: 'wall-push-up',
    name: 'Wall push-up',
    otherNames: ['standing push-up'],
    pattern: 'push',
    kitNeeded: [needs('wall')],
    points: ['Hands at chest height', 'Body in one line', 'Nose to the wall, then away'],
    faults: ['Hips bend', 'Hands too high'],
    cautions: [],
  },
  {
    slug: 'knee-push-up',
    name: 'Knee push-up',
    otherNames: ['kneeling press-up'],
    pattern: 'push',
    kitNeeded: [],
    points: ['Line from knee to crown', 'Hands under the shoulders', 'Chest first'],
    faults: ['Hips stay up behind', 'Elbows flare'],
    cautions: [],
  },
  {
    slug: 'dumbbell-press',
    name: 'Dumbbell press',
    otherNames: ['shoulder press', 'overhead press', 'DB press'],
    pattern: 'push',
    kitNeeded: [needs('dumbbell', 2, 4)],
    points: [
      'Ribs down before you press',
      'Wrists above elbows',
      'Finish with the arms beside the ears',
      'Down as slowly as up',
    ],
    faults: ['Leaning back', 'Pressing forwards', 'Shoulders stuck at the ears'],
    cautions: [
      {
        say: 'Check the room above your head.',
        more: 'Lamps and beams count; step away from them before the first rep.',
      },
    ],
  },
  {
    slug: 'one-arm-press',
    name: 'One-arm press',
    otherNames: ['single-arm overhead press', 'half press'],
    pattern: 'push',
    kitNeeded: [oneOf(option('dumbbell', 1, 4), option('kettlebell', 1, 4))],
    points: ['Free hand makes a fist', 'Ribs down', 'Press past the ear'],
    faults: ['Leaning away from the weight', 'Elbow behind the back'],
    cautions: [{ say: 'Check the room above your head.', more: 'Start light: one side is less steady than two.' }],
  },
  {
    slug: 'band-press',
    name: 'Band press',
    otherNames: ['banded overhead press'],
    pattern: 'push',
    kitNeeded: [needs('band')],
    points: ['Stand on the band with both feet', 'Knuckles to the ceiling', 'Ribs down'],
    faults: ['Leaning back', 'Band rubs on the neck'],
    cautions: [
      {
        say: 'Look the band over for cracks before every use.',
        more: 'Stand on it with the whole foot, and turn your face away as you step off.',
      },
    ],
  },
  {
    slug: 'pike-push-up',
    name: 'Pike push-up',
    otherNames: ['tent push-up', 'downward press'],
    pattern: 'push',
    kitNeeded: [],
    points: ['Hips high like a tent', 'Crown goes in front of the hands', 'Push back to the tent'],
    faults: ['Hips sink, it becomes a push-up', 'Weight on the head'],
    cautions: [
      {
        say: 'Leave it out if your head throbs or you feel dizzy upside down.',
        more: 'Take the one-arm press or the chair push-up instead.',
      },
    ],
  },
] as const satisfies readonly DemoMovement[];
