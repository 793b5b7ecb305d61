import type { DemoSession } from '../shapes';
import { easier, kilos, line, perSide, reps, seconds, secondsPerSide, without } from '../shorthand';
import { wilma } from '../voices';

export const swingAndPush: DemoSession = {
  slug: 'swing-and-push',
  dayOffset: -2,
  title: 'Swing and push',
  note: 'Short work, honest rest. The swing is a hinge, and the arms are only ropes.',
  aim: 'Aim for the same number in every interval: the tenth like the first.',
  coach: 'wilma',
  state: 'published',
  blocks: [
    { slug: 'briefing', kind: 'briefing', title: 'Short work, honest rest', scheme: null, note: '', lines: [] },
    {
      slug: 'activation',
      kind: 'activation',
      title: 'Wake the seat',
      scheme: { type: 'sets', sets: 2, restSeconds: 20 },
      note: '',
      lines: [line('glute-bridge', reps(12)), line('dead-bug', perSide(6))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Ten times thirty',
      scheme: { type: 'intervals', rounds: 10, workSeconds: 30, restSeconds: 30, restAfterLast: false },
      note: 'Odd rounds swing, even rounds push.',
      lines: [
        line('kettlebell-swing', reps(15, { load: kilos(16) }), {
          substitutions: [
            without('kettlebell', 'band-good-morning', reps(15), 'The band pulls you down as the bell would.'),
            easier('hip-hinge', reps(15), 'Make the hinge smooth first, then fast.'),
          ],
        }),
        line('push-up', reps(10), {
          substitutions: [easier('chair-push-up', reps(10), 'The higher the hands, the lighter it gets.')],
        }),
      ],
    },
    {
      slug: 'accessory',
      kind: 'accessory',
      title: 'Backs of the shoulders',
      scheme: { type: 'sets', sets: 3, restSeconds: 45 },
      note: '',
      lines: [line('band-pull-apart', reps(15))],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: 'Backs of the legs',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('hamstring-stretch', secondsPerSide(60)), line('kneeling-reach', seconds(60))],
    },
  ],
  recording: {
    slug: 'swing-and-push',
    title: 'Swing and push',
    coach: 'wilma',
    fileName: 'swing-and-push.mp4',
    script: {
      ...wilma,
      place: 'yard',
      chapters: [
        {
          kind: 'briefing',
          title: 'Short work, honest rest',
          block: 'briefing',
          motion: 'briefing',
          says: [
            'Hello from the yard. Ten rounds today: thirty on, thirty off.',
            'Odd rounds swing, even rounds push.',
            'Rest means rest. Put the bell down and walk about.',
          ],
        },
        {
          kind: 'aside',
          title: 'The hen again',
          motion: 'wave',
          says: [
            'Is it filming? There is a hen on my mat.',
            { text: 'Shoo. Right, we start again.', motion: 'tidyUp', thenMs: 1000 },
          ],
        },
        {
          kind: 'activation',
          title: 'Glute bridge',
          block: 'activation',
          movement: 'glute-bridge',
          motion: 'gluteBridge',
          says: [
            'On your back, heels close enough to touch.',
            {
              text: 'Push through the heels until shoulder, hip and knee make one line.',
              cue: { kind: 'go', text: 'Shoulder, hip and knee in one line' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'activation',
          title: 'Dead bug',
          block: 'activation',
          movement: 'dead-bug',
          motion: 'deadBug',
          says: [
            { text: 'The lower back stays on the floor.', cue: { kind: 'set-up', text: 'Lower back on the floor' } },
            {
              text: 'Opposite arm and leg reach away as you breathe out.',
              cue: { kind: 'go', text: 'Breathe out as you reach' },
              thenMs: 3200,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Kettlebell swing',
          block: 'workout',
          movement: 'kettlebell-swing',
          motion: 'kettlebellSwing',
          says: [
            {
              text: 'The swing. Clear three metres in front of you, hens included.',
              cue: { kind: 'safety', text: 'Clear three metres in front of you' },
            },
            {
              text: 'Hike the bell high between the thighs.',
              cue: { kind: 'set-up', text: 'Hike it high' },
              thenMs: 1500,
            },
            {
              text: 'Stand up fast. The arms only guide, like two ropes.',
              cue: { kind: 'go', text: 'Stand up fast, arms like ropes' },
              thenMs: 1800,
            },
            {
              text: 'Tall at the top, ribs down, then wait for the bell.',
              cue: { kind: 'go', text: 'Wait for the bell' },
              thenMs: 2400,
            },
            {
              text: 'When your back or your grip tires, park it and rest.',
              cue: { kind: 'safety', text: 'Park it when back or grip tires' },
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Band good morning',
          block: 'workout',
          movement: 'band-good-morning',
          standsInFor: 'kettlebell-swing',
          missing: 'kit',
          missingKit: 'kettlebell',
          motion: 'bandGoodMorning',
          says: [
            'With a long band, do the good morning.',
            {
              text: 'Look the band over for cracks, and stand on it with the whole foot.',
              cue: { kind: 'safety', text: 'Look the band over for cracks' },
            },
            {
              text: 'Hips back, long spine, and stand up against the pull.',
              cue: { kind: 'go', text: 'Stand up against the pull' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Hip hinge, to learn it',
          block: 'workout',
          movement: 'hip-hinge',
          standsInFor: 'kettlebell-swing',
          missing: 'ability',
          motion: 'hipHinge',
          says: [
            'New to this? Leave the bell, and learn the hinge.',
            {
              text: 'Hands on the hips, and push them to the wall behind you.',
              cue: { kind: 'go', text: 'Hips to the wall behind you' },
              thenMs: 2800,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Push-up',
          block: 'workout',
          movement: 'push-up',
          motion: 'pushUp',
          says: [
            {
              text: 'Push-up. Hands under the shoulders, one line from heel to crown.',
              cue: { kind: 'set-up', text: 'One line from heel to crown' },
            },
            {
              text: 'Chest leads, not the chin.',
              cue: { kind: 'go', text: 'Chest leads, not the chin' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Chair push-up, a lighter one',
          block: 'workout',
          movement: 'chair-push-up',
          standsInFor: 'push-up',
          missing: 'ability',
          motion: 'chairPushUp',
          says: [
            {
              text: 'Too heavy? Hands on a chair that stands against a wall.',
              cue: { kind: 'safety', text: 'Push the chair against a wall first' },
            },
            {
              text: 'The same straight line, and the chest comes to the edge.',
              cue: { kind: 'go', text: 'Chest to the edge' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'accessory',
          title: 'Band pull-apart',
          block: 'accessory',
          movement: 'band-pull-apart',
          motion: 'bandPullApart',
          says: [
            'Band at chest height, arms long.',
            {
              text: 'Pull from the shoulder blades, and keep the neck easy.',
              cue: { kind: 'go', text: 'Pull from the shoulder blades' },
              thenMs: 2400,
            },
          ],
        },
        {
          kind: 'cool-down',
          title: 'Hamstring stretch',
          block: 'cool-down',
          movement: 'hamstring-stretch',
          motion: 'hamstringStretch',
          says: [
            'Heel on a step, knee soft, and bow from the hip.',
            {
              text: 'Stop at a mild pull. A minute each side, and we are done.',
              cue: { kind: 'go', text: 'Bow from the hip' },
              thenMs: 2200,
            },
          ],
        },
      ],
    },
  },
};
