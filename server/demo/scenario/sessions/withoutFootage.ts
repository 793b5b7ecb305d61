import type { DemoSession } from '../shapes';
import { easier, kilos, line, metres, perSide, reps, seconds, secondsPerSide, without } from '../shorthand';

/** Planned, never filmed: where the library has gaps. */

export const carryHome: DemoSession = {
  slug: 'carry-home',
  dayOffset: -5,
  title: 'Carry it home',
  note: 'Wilma’s camera was flat: no footage of this one yet.',
  aim: 'Aim for five rounds without putting the weight down between lines.',
  coach: 'wilma',
  state: 'published',
  blocks: [
    {
      slug: 'warm-up',
      kind: 'warm-up',
      title: '',
      scheme: { type: 'quality', rounds: 2, minutes: 6 },
      note: '',
      lines: [line('hand-walk-out', reps(5)), line('hip-hinge', reps(10)), line('arm-circle', reps(10))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Five rounds, steady',
      scheme: { type: 'roundsForTime', rounds: 5, capMinutes: 20 },
      note: '',
      lines: [
        line('suitcase-deadlift', perSide(8, { load: kilos(16) }), {
          substitutions: [without('kettlebell', 'single-leg-hinge', perSide(8), 'One leg keeps the work on one side.')],
        }),
        line('front-carry', metres(40, { load: kilos(16) }), {
          substitutions: [without('kettlebell', 'backpack-carry', metres(40), 'The same load at the chest.')],
        }),
        line('side-plank', secondsPerSide(20)),
      ],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: '',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('lying-hamstring-stretch', secondsPerSide(60)), line('kneeling-reach', seconds(60))],
    },
  ],
  recording: null,
};

export const floorAndDoor: DemoSession = {
  slug: 'floor-and-door',
  dayOffset: 1,
  title: 'Floor and door',
  note: 'Hotel-proof: everything fits between a bed and a door.',
  aim: 'Aim for 6 to 8 rounds, each 80 to 100 s.',
  coach: 'dario',
  state: 'draft',
  blocks: [
    { slug: 'briefing', kind: 'briefing', title: 'Between bed and door', scheme: null, note: '', lines: [] },
    {
      slug: 'activation',
      kind: 'activation',
      title: 'Wake the middle',
      scheme: { type: 'sets', sets: 2, restSeconds: null },
      note: '',
      lines: [line('dead-bug', perSide(6)), line('glute-bridge', reps(12))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Ten minutes',
      scheme: { type: 'amrap', minutes: 10 },
      note: '',
      lines: [
        line('reverse-lunge', perSide(6)),
        line('towel-row', reps(10), {
          substitutions: [
            without('door', 'prone-row-hold', seconds(20), 'No door that shuts: hold the end of the pull.'),
          ],
        }),
        line('push-up', reps(8, { tempo: '3-0-1-0' }), {
          substitutions: [
            easier('chair-push-up', reps(8, { tempo: '3-0-1-0' }), 'The higher the hands, the lighter it gets.'),
          ],
        }),
      ],
    },
    {
      slug: 'accessory',
      kind: 'accessory',
      title: 'Shoulders',
      scheme: { type: 'sets', sets: 3, restSeconds: 45 },
      note: '',
      lines: [line('band-pull-apart', reps(15))],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: 'Long back',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('kneeling-reach', seconds(75)), line('standing-hip-stretch', secondsPerSide(60))],
    },
  ],
  recording: null,
};

export const quietJumps: DemoSession = {
  slug: 'quiet-jumps',
  dayOffset: 3,
  title: 'Quiet jumps',
  note: 'Film the heel bounce and the step jack: half the team lives above somebody.',
  aim: 'Aim for landings that nobody downstairs could hear.',
  coach: 'dario',
  state: 'draft',
  blocks: [
    {
      slug: 'warm-up',
      kind: 'warm-up',
      title: '',
      scheme: { type: 'quality', rounds: 2, minutes: 6 },
      note: '',
      lines: [line('march', seconds(40)), line('standing-turn', reps(10)), line('squat-hold', seconds(20))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Eight times forty',
      scheme: { type: 'intervals', rounds: 8, workSeconds: 40, restSeconds: 20, restAfterLast: true },
      note: 'One line a round, twice through.',
      lines: [
        line('rope-skip', seconds(40), {
          substitutions: [without('rope', 'line-hop', seconds(40), 'Hop over tape instead.')],
        }),
        line('goblet-squat', seconds(40), {
          substitutions: [without('kettlebell', 'slow-air-squat', seconds(40), 'Slow counts in place of the weight.')],
        }),
        line('jumping-jack', seconds(40)),
        line('bear-crawl', seconds(40)),
      ],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: '',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('standing-calf-stretch', secondsPerSide(60)), line('side-bend', secondsPerSide(30))],
    },
  ],
  recording: null,
};

export const slowStrength: DemoSession = {
  slug: 'slow-strength',
  dayOffset: 5,
  title: 'Slow strength',
  note: '',
  aim: 'Aim for the same load in all four sets.',
  coach: 'wilma',
  state: 'draft',
  blocks: [
    {
      slug: 'warm-up',
      kind: 'warm-up',
      title: '',
      scheme: { type: 'quality', rounds: null, minutes: 8 },
      note: '',
      lines: [line('broomstick-pass', reps(10)), line('hip-hinge', reps(10)), line('air-squat', reps(10))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Four sets',
      scheme: { type: 'sets', sets: 4, restSeconds: 120 },
      note: '',
      lines: [
        line('rear-foot-split-squat', perSide(6, { tempo: '3-1-1-0' })),
        line('ring-row', reps(8, { tempo: '3-0-1-1' })),
        line('dumbbell-deadlift', reps(10, { load: kilos(12.5) })),
      ],
    },
    {
      slug: 'accessory',
      kind: 'accessory',
      title: 'Hold on',
      scheme: { type: 'sets', sets: 3, restSeconds: 60 },
      note: '',
      lines: [line('band-press-out', perSide(8)), line('wall-sit', seconds(40))],
    },
  ],
  recording: null,
};
