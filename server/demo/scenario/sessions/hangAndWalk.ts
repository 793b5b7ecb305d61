import type { DemoSession } from '../shapes';
import { easier, kilos, line, metres, reps, seconds, secondsPerSide, without } from '../shorthand';
import { dario } from '../voices';

export const hangAndWalk: DemoSession = {
  slug: 'hang-and-walk',
  dayOffset: -4,
  title: 'Hang and walk',
  note: 'Grip day. Nobody needs a heavy weight for it, only a steady one.',
  aim: 'Aim for every minute done by second 40, so that 20 s are left to breathe.',
  coach: 'dario',
  state: 'published',
  blocks: [
    { slug: 'briefing', kind: 'briefing', title: 'Grip day', scheme: null, note: '', lines: [] },
    {
      slug: 'warm-up',
      kind: 'warm-up',
      title: 'Get warm',
      scheme: { type: 'quality', rounds: 2, minutes: 5 },
      note: '',
      lines: [line('jumping-jack', reps(20)), line('standing-turn', reps(10))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Every minute for twelve',
      scheme: { type: 'emom', minutes: 12, everySeconds: 60 },
      note: 'Minute one pull, minute two carry, minute three plank; four times through.',
      lines: [
        line('pull-up', reps(5), {
          substitutions: [
            easier('band-pull-up', reps(5), 'The band lifts the part that you cannot yet.'),
            without('bar', 'dumbbell-row', reps(5, { perSide: true }), 'The same pull, one arm at a time.'),
          ],
        }),
        line('suitcase-carry', metres(20, { perSide: true, load: kilos(16) }), {
          substitutions: [without('kettlebell', 'backpack-carry', metres(40), 'Hug the bag, walk the same way.')],
        }),
        line('plank', seconds(30)),
      ],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: 'Let go',
      scheme: { type: 'holds', rounds: 2 },
      note: '',
      lines: [
        line('dead-hang', seconds(20), {
          substitutions: [without('bar', 'kneeling-reach', seconds(30), 'Long arms and open sides without hanging.')],
        }),
        line('side-bend', secondsPerSide(20)),
      ],
    },
  ],
  recording: {
    slug: 'hang-and-walk',
    title: 'Hang and walk',
    coach: 'dario',
    fileName: 'hang-and-walk.mp4',
    script: {
      ...dario,
      place: 'loft',
      chapters: [
        {
          kind: 'briefing',
          title: 'Grip day',
          block: 'briefing',
          motion: 'briefing',
          says: [
            'Grip day, pickers. We hang, we walk, we hold.',
            'A new job starts every minute, twelve minutes long.',
            'If forty seconds are not enough, do fewer, not faster.',
          ],
        },
        {
          kind: 'warm-up',
          title: 'Jacks and turns',
          block: 'warm-up',
          movement: 'jumping-jack',
          motion: 'jumpingJack',
          says: [
            { text: 'Twenty jumping jacks on soft knees.', thenMs: 1800 },
            {
              text: 'Then turn from the ribs, and let the eyes follow the hands.',
              motion: 'standingTurn',
              thenMs: 2400,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Pull-up',
          block: 'workout',
          movement: 'pull-up',
          motion: 'pullUp',
          says: [
            {
              text: 'Pull on the beam with your feet on the floor before you hang.',
              cue: { kind: 'safety', text: 'Pull on the bar with feet on the floor first' },
            },
            {
              text: 'Start from a still hang, shoulders away from the ears.',
              cue: { kind: 'set-up', text: 'Shoulders away from the ears' },
              thenMs: 1400,
            },
            {
              text: 'Elbows to the back pockets, then down to long arms.',
              cue: { kind: 'go', text: 'Elbows to the back pockets' },
              thenMs: 2800,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Band-assisted pull-up',
          block: 'workout',
          movement: 'band-pull-up',
          standsInFor: 'pull-up',
          missing: 'ability',
          motion: 'bandPullUp',
          says: [
            'Not there yet? One foot goes into a long band.',
            {
              text: 'Hold the loop down with a hand until the foot is out again.',
              cue: { kind: 'safety', text: 'Hold the loop until your foot is out' },
              thenMs: 2400,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Dumbbell row, nothing to hang from',
          block: 'workout',
          movement: 'dumbbell-row',
          standsInFor: 'pull-up',
          missing: 'kit',
          missingKit: 'bar',
          motion: 'bentOverRow',
          says: [
            'Nothing to hang from? Row, with one dumbbell or with two.',
            {
              text: 'Hinge first, then row. The back stays still.',
              cue: { kind: 'set-up', text: 'Hinge first, then row' },
            },
            {
              text: 'The elbow goes past the ribs. Five on each side.',
              cue: { kind: 'go', text: 'Elbow past the ribs' },
              thenMs: 2400,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Suitcase carry',
          block: 'workout',
          movement: 'suitcase-carry',
          motion: 'suitcaseCarry',
          says: [
            {
              text: 'Clear your path before you pick up.',
              cue: { kind: 'safety', text: 'Clear your path before you pick up' },
            },
            {
              text: 'Then walk as if nothing hung there.',
              cue: { kind: 'go', text: 'Walk as if nothing hung there' },
              thenMs: 1600,
            },
            {
              text: 'Shoulders level, short and quiet steps.',
              cue: { kind: 'go', text: 'Shoulders level, quiet steps' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Backpack carry',
          block: 'workout',
          movement: 'backpack-carry',
          standsInFor: 'suitcase-carry',
          missing: 'kit',
          missingKit: 'kettlebell',
          motion: 'backpackCarry',
          says: [
            'A backpack full of books does it too.',
            {
              text: 'Hug it high on the chest, and breathe behind it.',
              cue: { kind: 'go', text: 'Hug it high, breathe behind it' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Plank',
          block: 'workout',
          movement: 'plank',
          motion: 'plank',
          says: [
            {
              text: 'Plank. Elbows under the shoulders, and push the floor away.',
              cue: { kind: 'set-up', text: 'Elbows under the shoulders' },
            },
            {
              text: 'Squeeze legs and seat, and breathe out slowly.',
              cue: { kind: 'go', text: 'Squeeze, and breathe out' },
              thenMs: 2200,
            },
          ],
        },
        {
          kind: 'cool-down',
          title: 'Dead hang',
          block: 'cool-down',
          movement: 'dead-hang',
          motion: 'deadHang',
          says: [
            {
              text: 'Step up to the beam, and hang with long arms.',
              cue: { kind: 'go', text: 'Long arms, easy neck' },
            },
            {
              text: 'Step down, do not drop. Stop if your fingers go numb.',
              cue: { kind: 'safety', text: 'Step down; stop on numb fingers' },
              thenMs: 1800,
            },
            { text: 'Side bends to finish, and that is the basket.', motion: 'standingSideBend', thenMs: 2600 },
          ],
        },
      ],
    },
  },
};
