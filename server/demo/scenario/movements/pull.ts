import type { DemoMovement } from '../shapes';
import { needs, oneOf, option } from '../shorthand';

export const pulls = [
  {
    slug: 'pull-up',
    name: 'Pull-up',
    otherNames: ['beam pull', 'overhand pull-up'],
    pattern: 'pull',
    kitNeeded: [needs('bar')],
    points: [
      'Start from a still hang',
      'Shoulders away from the ears first',
      'Elbows to the back pockets',
      'Down to long arms',
    ],
    faults: ['Kicking the legs', 'Chin reaches, shoulders do not move', 'Half the way down'],
    cautions: [
      {
        say: 'Pull on the bar with your feet on the floor before you hang.',
        more: 'If it moves, creaks or turns, do the towel row today.',
      },
    ],
  },
  {
    slug: 'band-pull-up',
    name: 'Band-assisted pull-up',
    otherNames: ['banded pull-up', 'helped pull-up'],
    pattern: 'pull',
    kitNeeded: [needs('bar'), needs('band')],
    points: ['One foot in the loop, the other beside it', 'Elbows to the back pockets', 'Slow on the way down'],
    faults: ['Bouncing in the band', 'Shoulders at the ears'],
    cautions: [
      {
        say: 'Hold the loop down with a hand until your foot is out.',
        more: 'A band that slips off a foot flies at the face.',
      },
    ],
  },
  {
    slug: 'ring-row',
    name: 'Ring row',
    otherNames: ['body row', 'hanging row'],
    pattern: 'pull',
    kitNeeded: [oneOf(option('rings'), option('bar'))],
    points: [
      'Plank that stands on its heels',
      'Squeeze at the top, do not rush it',
      'Rings to the ribs',
      'Long arms at the bottom',
    ],
    faults: ['Hips sag', 'Shrugging', 'Elbows wide'],
    cautions: [
      {
        say: 'Check the anchor before you lean back.',
        more: 'Pull hard once with both feet under you, and again after each change of height.',
      },
    ],
  },
  {
    slug: 'towel-row',
    name: 'Towel row',
    otherNames: ['door row', 'towel door pull'],
    pattern: 'pull',
    kitNeeded: [needs('towel'), needs('door')],
    points: ['Knot on the far side of a shut door', 'Lean back in one line', 'Pull the elbows past the ribs'],
    faults: ['Bending at the hips', 'Jerking on the towel'],
    cautions: [
      {
        say: 'Use a door that opens away from you, shut and locked.',
        more: 'Your pull then holds it in its frame. Test it gently before you lean back.',
      },
    ],
  },
  {
    slug: 'dumbbell-row',
    name: 'Dumbbell row',
    otherNames: ['bent-over row', 'row, one dumbbell', 'one-arm row'],
    pattern: 'pull',
    kitNeeded: [oneOf(option('dumbbell', 1, 6), option('kettlebell', 1, 6))],
    points: ['Hinge first, then row', 'Elbow past the ribs', 'Back stays still'],
    faults: ['Standing up a little more each rep', 'Twisting to lift', 'Shrugging'],
    cautions: [
      { say: 'Rest a hand on a chair if your back tires.', more: 'The row is for the arm; the back only holds.' },
    ],
  },
  {
    slug: 'band-row',
    name: 'Band row',
    otherNames: ['banded row', 'seated band row'],
    pattern: 'pull',
    kitNeeded: [needs('band')],
    points: ['Band around both feet, legs long', 'Tall seat', 'Thumbs to the ribs'],
    faults: ['Rocking back', 'Shrugging'],
    cautions: [
      {
        say: 'Look the band over for cracks before every use.',
        more: 'Wear shoes, so that the loop sits behind the heel of the sole.',
      },
    ],
  },
  {
    slug: 'backpack-row',
    name: 'Backpack row',
    otherNames: ['bag row'],
    pattern: 'pull',
    kitNeeded: [needs('backpack', 1, 4)],
    points: ['Hold the bag by both straps', 'Hinge and stay there', 'Bag to the belly button'],
    faults: ['Standing up to lift', 'Back rounds'],
    cautions: [],
  },
  {
    slug: 'prone-row-hold',
    name: 'Prone row hold',
    otherNames: ['floor row hold', 'face-down row'],
    pattern: 'pull',
    kitNeeded: [],
    points: [
      'Forehead just off the floor',
      'Elbows drawn back beside the ribs',
      'Squeeze the shoulder blades and breathe',
    ],
    faults: ['Neck cranes up', 'Legs kick'],
    cautions: [],
  },
  {
    slug: 'band-pull-apart',
    name: 'Band pull-apart',
    otherNames: ['pull-apart'],
    pattern: 'pull',
    kitNeeded: [oneOf(option('band'), option('mini-band'))],
    points: ['Arms long at chest height', 'Pull from the shoulder blades', 'Ribs down'],
    faults: ['Shrugging', 'Elbows bend'],
    cautions: [],
  },
] as const satisfies readonly DemoMovement[];
