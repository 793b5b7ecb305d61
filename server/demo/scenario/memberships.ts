import type { DemoMembership } from './shapes';
import { owns } from './shorthand';

/** Who is in the Apple Loft, and what each has where they train. */
export const memberships = [
  {
    person: 'wilma',
    role: 'owner',
    kit: [owns('bar'), owns('rings'), owns('box'), owns('kettlebell', 12, 16), owns('rope'), owns('mat'), owns('wall')],
  },
  {
    person: 'dario',
    role: 'coach',
    kit: [
      owns('bar'),
      owns('rings'),
      owns('box'),
      owns('step'),
      owns('kettlebell', 16, 20, 24),
      owns('dumbbell', 10, 10, 15, 15),
      owns('band'),
      owns('rope'),
      owns('mat'),
    ],
  },
  { person: 'sunniva', role: 'editor', kit: [owns('dumbbell', 6, 6), owns('band'), owns('mat'), owns('chair')] },
  // one dumbbell, a door and a towel: the member whom most substitutions are for
  {
    person: 'bo',
    role: 'member',
    kit: [owns('dumbbell', 10), owns('towel'), owns('door'), owns('chair'), owns('mat'), owns('wall')],
  },
  // a whole garage
  {
    person: 'ngaire',
    role: 'member',
    kit: [
      owns('bar'),
      owns('rings'),
      owns('box'),
      owns('step'),
      owns('dumbbell', 8, 8, 12.5, 12.5),
      owns('kettlebell', 12, 16, 16, 24),
      owns('band'),
      owns('mini-band'),
      owns('rope'),
      owns('mat'),
      owns('wall'),
      owns('chair'),
      owns('broomstick'),
    ],
  },
  // hotels: two bands in the suitcase, the room's own towel, door and chair
  {
    person: 'oskar',
    role: 'member',
    kit: [owns('band'), owns('mini-band'), owns('towel'), owns('door'), owns('chair'), owns('wall')],
  },
  // nothing at all
  { person: 'halima', role: 'member', kit: [] },
  // a park: a bar and a low wall to step on
  { person: 'teun', role: 'member', kit: [owns('bar'), owns('step'), owns('rope'), owns('backpack', 8)] },
  // a living room
  {
    person: 'pia',
    role: 'member',
    kit: [owns('mat'), owns('chair'), owns('wall'), owns('kettlebell', 8), owns('mini-band'), owns('broomstick')],
  },
  {
    person: 'jonty',
    role: 'member',
    kit: [owns('dumbbell', 12.5, 12.5), owns('bar'), owns('box'), owns('mat'), owns('band')],
  },
] as const satisfies readonly DemoMembership[];
