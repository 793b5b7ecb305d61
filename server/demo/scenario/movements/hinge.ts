import type { DemoMovement } from '../shapes';
import { needs, oneOf, option } from '../shorthand';

export const hinges = [
  {
    slug: 'hip-hinge',
    name: 'Hip hinge',
    otherNames: ['bow', 'bodyweight good morning'],
    pattern: 'hinge',
    kitNeeded: [],
    points: [
      'Soft knees that stay where they are',
      'Push the hips to the wall behind you',
      'Long back from tail to crown',
      'Squeeze to stand',
    ],
    faults: ['It turns into a squat', 'The back rounds to reach lower'],
    cautions: [],
  },
  {
    slug: 'kettlebell-swing',
    name: 'Kettlebell swing',
    otherNames: ['bell swing', 'two-hand swing', 'KB swing'],
    pattern: 'hinge',
    kitNeeded: [needs('kettlebell', 1, 8)],
    points: [
      'Hike the bell high between the thighs',
      'Stand up fast, the arms only guide',
      'Tall at the top, ribs down',
      'Wait for the bell before you fold',
    ],
    faults: ['Lifting with the arms', 'Squatting the swing', 'Leaning back at the top'],
    cautions: [
      { say: 'Clear three metres in front of you.', more: 'Nobody stands or walks there, children and dogs included.' },
      {
        say: 'Stop the set when your grip or your back tires.',
        more: 'Park the bell in front of you, never drop it mid-swing.',
      },
    ],
  },
  {
    slug: 'dumbbell-deadlift',
    name: 'Dumbbell deadlift',
    otherNames: ['two-dumbbell hinge', 'DB deadlift'],
    pattern: 'hinge',
    kitNeeded: [needs('dumbbell', 2, 6)],
    points: [
      'Weights brush the thighs',
      'Hips travel back',
      'Shoulders stay above the hips',
      'Stand tall without leaning back',
    ],
    faults: ['Weights drift forwards', 'Back rounds near the floor'],
    cautions: [
      {
        say: 'Lower only as far as your back stays long.',
        more: 'The floor is not the aim; mid-shin is enough for most.',
      },
    ],
  },
  {
    slug: 'suitcase-deadlift',
    name: 'Suitcase deadlift',
    otherNames: ['one-sided deadlift', 'one-hand pick-up'],
    pattern: 'hinge',
    kitNeeded: [oneOf(option('kettlebell', 1, 8), option('dumbbell', 1, 8))],
    points: ['Weight beside the ankle', 'Shoulders level all the way', 'Push the floor away with both feet'],
    faults: ['Leaning to the loaded side', 'Twisting to reach the weight'],
    cautions: [
      {
        say: 'Lower only as far as your back stays long.',
        more: 'Stand the weight on a step if the floor is too far.',
      },
    ],
  },
  {
    slug: 'band-good-morning',
    name: 'Band good morning',
    otherNames: ['banded bow', 'banded hinge'],
    pattern: 'hinge',
    kitNeeded: [needs('band')],
    points: ['Band under both feet and behind the shoulders', 'Hips back, knees soft', 'Stand up against the pull'],
    faults: ['Band lies on the neck', 'Knees bend more and more'],
    cautions: [
      {
        say: 'Look the band over for cracks before every use.',
        more: 'Stand on it with the whole foot, in shoes, so that it cannot snap up.',
      },
    ],
  },
  {
    slug: 'single-leg-hinge',
    name: 'Single-leg hinge',
    otherNames: ['one-leg bow', 'single-leg deadlift'],
    pattern: 'hinge',
    kitNeeded: [],
    points: ['Hips stay level like headlights', 'Back leg long', 'Fingertips on a wall are fine'],
    faults: ['The hip opens to the side', 'The standing knee locks'],
    cautions: [],
  },
  {
    slug: 'glute-bridge',
    name: 'Glute bridge',
    otherNames: ['hip bridge', 'bridge'],
    pattern: 'hinge',
    kitNeeded: [],
    points: [
      'Heels close enough to touch with the fingertips',
      'Push through the heels',
      'Shoulder, hip and knee in one line',
      'Hold the top for a breath',
    ],
    faults: ['Arching the lower back to get higher', 'Feet too far away'],
    cautions: [],
  },
  {
    slug: 'single-leg-bridge',
    name: 'Single-leg bridge',
    otherNames: ['one-leg bridge'],
    pattern: 'hinge',
    kitNeeded: [],
    points: ['Knees side by side', 'Hips stay level', 'Push through the heel'],
    faults: ['One hip drops', 'Cramp because the foot is too far away'],
    cautions: [],
  },
] as const satisfies readonly DemoMovement[];
