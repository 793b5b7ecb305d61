import type { DemoSession } from '../shapes';
import { easier, kilos, line, reps, seconds, secondsPerSide, without } from '../shorthand';
import { dario } from '../voices';

export const sitPullSkip: DemoSession = {
  slug: 'sit-pull-skip',
  dayOffset: 0,
  title: 'Sit, pull, skip',
  note: 'Three plain movements, one clock. Pick the version that fits your kit before the clock starts.',
  aim: 'Aim for 7 to 9 rounds, each 90 to 115 s. The last one looks like the first one.',
  coach: 'dario',
  state: 'published',
  blocks: [
    { slug: 'briefing', kind: 'briefing', title: 'What today is for', scheme: null, note: '', lines: [] },
    {
      slug: 'warm-up',
      kind: 'warm-up',
      title: 'Warm the hinges',
      scheme: { type: 'quality', rounds: 2, minutes: 6 },
      note: 'Easy breath, nothing hurried.',
      lines: [line('march', seconds(40)), line('arm-circle', reps(10)), line('air-squat', reps(8))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Fourteen minutes',
      scheme: { type: 'amrap', minutes: 14 },
      note: 'Set the rope down beside the tape, not on it.',
      lines: [
        line('goblet-squat', reps(8, { load: kilos(16) }), {
          note: 'A load that you could sit down with twelve times.',
          substitutions: [
            without(
              'kettlebell',
              'slow-air-squat',
              reps(8, { tempo: '5-1-1-0' }),
              'Without weight, five slow counts make it as hard.',
            ),
          ],
        }),
        line('ring-row', reps(8), {
          substitutions: [without('rings', 'towel-row', reps(8), 'The same pull with a door and a towel.')],
        }),
        line('rope-skip', reps(40), {
          substitutions: [
            without('rope', 'line-hop', reps(40), 'Hop over tape for the same count.'),
            easier('heel-bounce', reps(40), 'Toes stay down while your calves get used to it.'),
          ],
        }),
      ],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: 'Long calves',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('calf-stretch', secondsPerSide(60)), line('kneeling-reach', seconds(60))],
    },
  ],
  recording: {
    slug: 'sit-pull-skip',
    title: 'Sit, pull, skip',
    coach: 'dario',
    fileName: 'sit-pull-skip.mp4',
    script: {
      ...dario,
      place: 'loft',
      chapters: [
        {
          kind: 'briefing',
          title: 'What today is for',
          block: 'briefing',
          motion: 'briefing',
          says: [
            'Morning, pickers. Three movements today, and one long clock.',
            'We sit, we pull, we skip, and we do that for fourteen minutes.',
            'I want a pace that you could talk at until minute ten.',
            'Stop if anything hurts sharply, or if you feel dizzy.',
          ],
        },
        {
          kind: 'warm-up',
          title: 'March and circles',
          block: 'warm-up',
          movement: 'march',
          motion: 'march',
          says: [
            { text: 'March on the spot, and let the arms swing.', thenMs: 1600 },
            { text: 'Now large, slow arm circles, with the ribs down.', motion: 'armCircles', thenMs: 2400 },
          ],
        },
        {
          kind: 'demo',
          title: 'Goblet squat',
          block: 'workout',
          movement: 'goblet-squat',
          motion: 'gobletSquat',
          says: [
            'Goblet squat. Hold the bell by its horns, close to the breastbone.',
            {
              text: 'Sit down between your heels, and keep the chest tall.',
              cue: { kind: 'go', text: 'Sit between your heels, chest tall' },
              thenMs: 2000,
            },
            {
              text: 'Elbows touch the inside of the knees, then push the floor away.',
              cue: { kind: 'go', text: 'Push the floor away' },
              thenMs: 2400,
            },
            {
              text: 'If your back rounds, go less deep, or put the bell down.',
              cue: { kind: 'safety', text: 'Put the bell down before your back rounds' },
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Slow air squat',
          block: 'workout',
          movement: 'slow-air-squat',
          standsInFor: 'goblet-squat',
          missing: 'kit',
          missingKit: 'kettlebell',
          motion: 'airSquat',
          says: [
            'No bell? Then the slow air squat is yours.',
            { text: 'Take five counts on the way down.', cue: { kind: 'go', text: 'Five counts down' }, thenMs: 1800 },
            { text: 'One quiet count at the bottom, and up without a bounce.', thenMs: 2200 },
          ],
        },
        {
          kind: 'demo',
          title: 'Ring row',
          block: 'workout',
          movement: 'ring-row',
          motion: 'ringRow',
          says: [
            {
              text: 'Ring row. First pull hard on the straps with both feet under you.',
              cue: { kind: 'safety', text: 'Check the anchor before you lean back' },
            },
            {
              text: 'Lean back like a plank that stands on its heels.',
              cue: { kind: 'set-up', text: 'A plank that stands on its heels' },
              thenMs: 2000,
            },
            {
              text: 'Rings to the ribs, squeeze at the top, do not rush it.',
              cue: { kind: 'go', text: 'Rings to the ribs, then squeeze' },
              thenMs: 2800,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Towel row',
          block: 'workout',
          movement: 'towel-row',
          standsInFor: 'ring-row',
          missing: 'kit',
          missingKit: 'rings',
          motion: 'towelRow',
          says: [
            'Without rings, take a towel and a solid door.',
            {
              text: 'The door opens away from you, it is shut, and it is locked.',
              cue: { kind: 'safety', text: 'A door that opens away from you, shut and locked' },
            },
            {
              text: 'Lean back, and pull your elbows past the ribs.',
              cue: { kind: 'go', text: 'Elbows past the ribs' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Rope skip',
          block: 'workout',
          movement: 'rope-skip',
          motion: 'ropeSkip',
          says: [
            {
              text: 'Rope skip. Look up first: is there a lamp or a beam?',
              cue: { kind: 'safety', text: 'Clear the floor and the room above you' },
            },
            {
              text: 'Turn from the wrists, elbows at the ribs.',
              cue: { kind: 'set-up', text: 'Elbows at the ribs' },
              thenMs: 1800,
            },
            {
              text: 'Hop as high as a thumb, and land quietly.',
              cue: { kind: 'go', text: 'Hop as high as a thumb' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Line hop',
          block: 'workout',
          movement: 'line-hop',
          standsInFor: 'rope-skip',
          missing: 'kit',
          missingKit: 'rope',
          motion: 'lineHop',
          says: [
            {
              text: 'No rope today? Hop over a strip of floor tape.',
              cue: { kind: 'safety', text: 'Clear the floor before you hop' },
            },
            {
              text: 'Feet together, soft knees, the same forty.',
              cue: { kind: 'go', text: 'Soft knees, quiet landings' },
              thenMs: 2400,
            },
          ],
        },
        {
          kind: 'aside',
          title: 'Where is my bell',
          motion: 'tidyUp',
          says: ['Hang on. Somebody left my bell on the stairs again.', { text: 'Wilma, was that you?', thenMs: 900 }],
        },
        {
          kind: 'cool-down',
          title: 'Calf stretch',
          block: 'cool-down',
          movement: 'calf-stretch',
          motion: 'calfStretch',
          says: [
            'Calves to finish. Hands on the wall, one long step back.',
            {
              text: 'The back heel stays heavy. A minute on each side.',
              cue: { kind: 'go', text: 'Back heel heavy' },
              thenMs: 2000,
            },
            { text: "That's the basket. Write your rounds down.", motion: 'wave', thenMs: 900 },
          ],
        },
      ],
    },
  },
};
