import type { DemoSession } from '../shapes';
import { easier, kilos, line, perSide, reps, seconds, secondsPerSide, without } from '../shorthand';
import { wilma } from '../voices';

export const oneLegOnePress: DemoSession = {
  slug: 'one-leg-one-press',
  dayOffset: -7,
  title: 'One leg, one press',
  note: 'Slow sets. Nobody counts your time, so spend it on balance.',
  aim: 'Aim for three clean sets with two reps left in the tank.',
  coach: 'wilma',
  state: 'published',
  blocks: [
    { slug: 'briefing', kind: 'briefing', title: 'Slow sets', scheme: null, note: '', lines: [] },
    {
      slug: 'activation',
      kind: 'activation',
      title: 'Steady the middle',
      scheme: { type: 'sets', sets: 2, restSeconds: null },
      note: '',
      lines: [line('bird-dog', perSide(6)), line('prone-row-hold', seconds(20)), line('side-bend', secondsPerSide(20))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Three sets each',
      scheme: { type: 'sets', sets: 3, restSeconds: 90 },
      note: 'All sets of one, then all sets of the next.',
      lines: [
        line('reverse-lunge', perSide(8), {
          substitutions: [easier('split-squat', perSide(8), 'Feet stay put, so balance is easier.')],
        }),
        line('dumbbell-press', reps(8, { amountTo: 10, load: kilos(8) }), {
          substitutions: [
            without('dumbbell', 'pike-push-up', reps(6), 'Your own weight overhead is heavier than it looks.'),
          ],
        }),
      ],
    },
    {
      slug: 'mobility',
      kind: 'mobility',
      title: 'Open the hip',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('hip-flexor-stretch', secondsPerSide(75)), line('kneeling-reach', seconds(60))],
    },
  ],
  recording: {
    slug: 'one-leg-one-press',
    title: 'One leg, one press',
    coach: 'wilma',
    fileName: 'one-leg-one-press.mp4',
    script: {
      ...wilma,
      place: 'loft',
      chapters: [
        {
          kind: 'briefing',
          title: 'Slow sets',
          block: 'briefing',
          motion: 'briefing',
          says: [
            'No clock today. Three sets of two things, and a lot of patience.',
            'Stop each set while two good ones are left in the tank.',
          ],
        },
        {
          kind: 'activation',
          title: 'Bird dog',
          block: 'activation',
          movement: 'bird-dog',
          motion: 'birdDog',
          says: [
            'Hands under the shoulders, knees under the hips.',
            {
              text: 'Reach long, not high. A cup of tea stands on your back.',
              cue: { kind: 'go', text: 'Reach long, not high' },
              thenMs: 3400,
            },
          ],
        },
        {
          kind: 'activation',
          title: 'Prone row hold',
          block: 'activation',
          movement: 'prone-row-hold',
          motion: 'proneRowHold',
          says: [
            'Face down, forehead just off the floor.',
            {
              text: 'Draw the elbows up and back, squeeze, and keep breathing.',
              cue: { kind: 'go', text: 'Elbows back, squeeze, breathe' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Reverse lunge',
          block: 'workout',
          movement: 'reverse-lunge',
          motion: 'reverseLunge',
          says: [
            {
              text: 'Step back as if you stood on two rails.',
              cue: { kind: 'set-up', text: 'Feet on two rails' },
              thenMs: 1400,
            },
            {
              text: 'The front heel stays heavy, and brings you up.',
              cue: { kind: 'go', text: 'Up through the front heel' },
              thenMs: 3000,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Split squat, easier to balance',
          block: 'workout',
          movement: 'split-squat',
          standsInFor: 'reverse-lunge',
          missing: 'ability',
          motion: 'splitSquat',
          says: [
            'Wobbly? Leave both feet where they are.',
            {
              text: 'Straight down like a lift, and straight up again.',
              cue: { kind: 'go', text: 'Straight down like a lift' },
              thenMs: 2800,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Dumbbell press',
          block: 'workout',
          movement: 'dumbbell-press',
          motion: 'dumbbellPress',
          says: [
            {
              text: 'Look up: nothing hangs above you.',
              cue: { kind: 'safety', text: 'Check the room above your head' },
            },
            {
              text: 'Ribs down before you press.',
              cue: { kind: 'set-up', text: 'Ribs down before you press' },
              thenMs: 1200,
            },
            {
              text: 'Arms finish beside the ears. Down as slowly as up.',
              cue: { kind: 'go', text: 'Finish beside the ears' },
              thenMs: 2800,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Pike push-up',
          block: 'workout',
          movement: 'pike-push-up',
          standsInFor: 'dumbbell-press',
          missing: 'kit',
          missingKit: 'dumbbell',
          motion: 'pikePushUp',
          says: [
            'Without dumbbells, make a tent and press yourself.',
            {
              text: 'The crown goes in front of the hands, then back to the tent.',
              cue: { kind: 'go', text: 'Crown in front of the hands' },
              thenMs: 2400,
            },
            {
              text: 'Leave it out if you get dizzy with your head down.',
              cue: { kind: 'safety', text: 'Leave it out if you get dizzy' },
            },
          ],
        },
        {
          kind: 'mobility',
          title: 'Hip flexor stretch',
          block: 'mobility',
          movement: 'hip-flexor-stretch',
          motion: 'hipFlexorStretch',
          says: [
            {
              text: 'Kneel on something soft, and squeeze the seat first.',
              cue: { kind: 'set-up', text: 'Squeeze the seat first' },
            },
            {
              text: 'Only then move the hip forwards, ribs down.',
              cue: { kind: 'go', text: 'Hip forwards, ribs down' },
              thenMs: 2600,
            },
            { text: 'And sit back with long arms for a minute.', motion: 'kneelingReach', thenMs: 2600 },
          ],
        },
      ],
    },
  },
};
