import type { DemoSession } from '../shapes';
import { easier, line, perSide, reps, seconds, secondsPerSide, without } from '../shorthand';
import { dario } from '../voices';

export const crates: DemoSession = {
  slug: 'up-the-crates',
  dayOffset: -9,
  title: 'Up the crates',
  note: 'The apple crates come out. Rough side down, against the wall.',
  aim: 'Aim for 12 to 16 minutes. Step instead of jumping as soon as landings get loud.',
  coach: 'dario',
  state: 'published',
  blocks: [
    { slug: 'briefing', kind: 'briefing', title: 'Crates', scheme: null, note: '', lines: [] },
    {
      slug: 'warm-up',
      kind: 'warm-up',
      title: 'Raise the pulse',
      scheme: { type: 'quality', rounds: 2, minutes: 5 },
      note: '',
      lines: [line('march', seconds(30)), line('air-squat', reps(10))],
    },
    {
      slug: 'workout',
      kind: 'workout',
      title: 'Four rounds',
      scheme: { type: 'roundsForTime', rounds: 4, capMinutes: 18 },
      note: '',
      lines: [
        line('box-jump', reps(8), {
          substitutions: [
            without('box', 'squat-jump', reps(8), 'The same jump without a landing place.'),
            easier('box-step-up', perSide(4), 'Same box, one foot at a time.'),
          ],
        }),
        line('box-step-up', perSide(6), {
          substitutions: [
            without('box', 'split-squat', perSide(6), 'Up and down on one leg, without anything to climb.'),
          ],
        }),
        line('plank', seconds(30)),
      ],
    },
    {
      slug: 'cool-down',
      kind: 'cool-down',
      title: 'Walk it off',
      scheme: { type: 'holds', rounds: 1 },
      note: '',
      lines: [line('calf-stretch', secondsPerSide(60)), line('hip-flexor-stretch', secondsPerSide(60))],
    },
  ],
  recording: {
    slug: 'up-the-crates',
    title: 'Up the crates',
    coach: 'dario',
    fileName: 'up-the-crates.mp4',
    script: {
      ...dario,
      place: 'yard',
      chapters: [
        {
          kind: 'briefing',
          title: 'Crates',
          block: 'briefing',
          motion: 'briefing',
          says: [
            'The apple crates are out. Four rounds, up and down.',
            'Quiet landings are the score today, not the clock.',
          ],
        },
        {
          kind: 'warm-up',
          title: 'March and squat',
          block: 'warm-up',
          movement: 'air-squat',
          motion: 'march',
          says: [
            { text: 'March first, knees to hip height.', thenMs: 1500 },
            { text: 'Then ten air squats, whole foot on the floor.', motion: 'airSquat', thenMs: 3000 },
          ],
        },
        {
          kind: 'demo',
          title: 'Box jump',
          block: 'workout',
          movement: 'box-jump',
          motion: 'boxJump',
          says: [
            {
              text: 'Take a box that you could step onto easily.',
              cue: { kind: 'safety', text: 'A box that you could step onto easily' },
            },
            {
              text: 'Swing the arms, and land softly with the whole foot.',
              cue: { kind: 'go', text: 'Land softly, whole foot' },
              thenMs: 2200,
            },
            {
              text: 'Stand up on top, then step down. Never jump down.',
              cue: { kind: 'safety', text: 'Step down, do not jump down' },
              thenMs: 3000,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Squat jump',
          block: 'workout',
          movement: 'squat-jump',
          standsInFor: 'box-jump',
          missing: 'kit',
          missingKit: 'box',
          motion: 'squatJump',
          says: [
            {
              text: 'No box? Clear the floor, and jump where you stand.',
              cue: { kind: 'safety', text: 'Clear the floor before you jump' },
            },
            {
              text: 'Land like a cat, settle, then go again.',
              cue: { kind: 'go', text: 'Land like a cat' },
              thenMs: 2400,
            },
          ],
        },
        {
          kind: 'demo',
          title: 'Box step-up',
          block: 'workout',
          movement: 'box-step-up',
          motion: 'boxStepUp',
          says: [
            {
              text: 'Step-up. First see that the crate cannot tip or slide.',
              cue: { kind: 'safety', text: 'Check that the box cannot tip or slide' },
            },
            {
              text: 'Whole foot on the box, lean in, then stand all the way up.',
              cue: { kind: 'go', text: 'Whole foot on the box, then stand tall' },
              thenMs: 2600,
            },
            {
              text: 'Step down slowly. Do not drop.',
              cue: { kind: 'go', text: 'Step down slowly, do not drop' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'substitution',
          title: 'Split squat',
          block: 'workout',
          movement: 'split-squat',
          standsInFor: 'box-step-up',
          missing: 'kit',
          missingKit: 'box',
          motion: 'splitSquat',
          says: [
            'Nothing to climb? The split squat does the same work.',
            {
              text: 'Back knee kisses the floor, front heel heavy.',
              cue: { kind: 'go', text: 'Front heel heavy' },
              thenMs: 2600,
            },
          ],
        },
        {
          kind: 'cool-down',
          title: 'Calf stretch',
          block: 'cool-down',
          movement: 'calf-stretch',
          motion: 'calfStretch',
          says: [
            {
              text: 'Calves against the wall, a minute each side. That is the basket.',
              cue: { kind: 'go', text: 'Back heel heavy' },
              thenMs: 1800,
            },
          ],
        },
      ],
    },
  },
};
