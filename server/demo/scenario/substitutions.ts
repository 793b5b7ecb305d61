import type { DoseRule } from '../../../shared/domain/kit/doseRule';
import type { DemoSubstitution } from './shapes';
import { reps, secondsPerSide } from './shorthand';

/** What is done instead, and how the dose changes. Several lead on to others: no rings → towel row → no door → prone row hold. */

const same: DoseRule = { type: 'same' };
const samePerSide: DoseRule = { type: 'samePerSide' };
const times = (factor: number, cap: number | null = null): DoseRule => ({ type: 'times', factor, cap });
const hold = (secondsPerRep: number, cap: number | null = null): DoseRule => ({
  type: 'secondsForReps',
  secondsPerRep,
  cap,
});

const noKit = (missingKit: string, from: string, to: string, doseRule: DoseRule, reason: string): DemoSubstitution => ({
  from,
  to,
  missing: 'kit',
  missingKit,
  doseRule,
  reason,
});
const noSpace = (from: string, to: string, doseRule: DoseRule, reason: string): DemoSubstitution => ({
  from,
  to,
  missing: 'space',
  missingKit: null,
  doseRule,
  reason,
});
const tooHard = (from: string, to: string, doseRule: DoseRule, reason: string): DemoSubstitution => ({
  from,
  to,
  missing: 'ability',
  missingKit: null,
  doseRule,
  reason,
});

export const substitutions: readonly DemoSubstitution[] = [
  // squat
  noKit('kettlebell', 'goblet-squat', 'backpack-squat', same, 'The same squat with the weight hugged to the chest.'),
  noKit('kettlebell', 'goblet-squat', 'slow-air-squat', same, 'Without weight, five slow counts make it as hard.'),
  noKit('backpack', 'backpack-squat', 'slow-air-squat', same, 'Slow counts take the place of the weight.'),
  noKit('wall', 'wall-sit', 'squat-hold', times(0.7), 'The same thighs without a wall, so a little shorter.'),
  tooHard('air-squat', 'chair-squat', same, 'The seat says how deep, and catches you.'),
  tooHard('goblet-squat', 'air-squat', times(1.25), 'Learn the line first; a few more reps instead of weight.'),
  // hinge
  noKit('kettlebell', 'kettlebell-swing', 'band-good-morning', same, 'The band pulls you down as the bell would.'),
  noKit(
    'kettlebell',
    'kettlebell-swing',
    'single-leg-hinge',
    times(0.5),
    'No bell: one leg carries everything, half the count.',
  ),
  noKit(
    'band',
    'band-good-morning',
    'single-leg-hinge',
    { type: 'times', factor: 0.5, cap: 10 },
    'One leg in place of the pull.',
  ),
  noKit('dumbbell', 'dumbbell-deadlift', 'band-good-morning', same, 'The same bow against a band.'),
  noKit('kettlebell', 'suitcase-deadlift', 'single-leg-hinge', same, 'One leg keeps the work on one side.'),
  tooHard('kettlebell-swing', 'hip-hinge', same, 'The swing is a hinge first; make it smooth, then make it fast.'),
  tooHard('single-leg-hinge', 'hip-hinge', times(1.5), 'Two feet while balance is still the hard part.'),
  tooHard('single-leg-bridge', 'glute-bridge', times(1.5), 'Both feet share the work.'),
  // lunge
  noKit('box', 'box-step-up', 'split-squat', same, 'Up and down on one leg, without anything to climb.'),
  noKit('dumbbell', 'dumbbell-split-squat', 'split-squat', times(1.5), 'Half as many again makes up for the weight.'),
  noKit('chair', 'rear-foot-split-squat', 'split-squat', times(1.25), 'Back foot on the floor, a few more.'),
  noKit('step', 'low-step-up', 'reverse-lunge', same, 'A step down instead of a step up.'),
  tooHard('box-step-up', 'low-step-up', same, 'The bottom stair asks less of the knee.'),
  noSpace('lateral-lunge', 'split-squat', same, 'Needs no room to the side.'),
  tooHard('reverse-lunge', 'split-squat', same, 'Feet stay put, so balance is easier.'),
  // push
  noKit('dumbbell', 'dumbbell-press', 'band-press', times(1.25), 'A band is lightest at the bottom: a few more.'),
  noKit(
    'dumbbell',
    'dumbbell-press',
    'pike-push-up',
    times(0.75),
    'Your own weight overhead is heavier than it looks.',
  ),
  noKit('band', 'band-press', 'pike-push-up', times(0.6), 'No band: press yourself, a little more than half.'),
  noKit('dumbbell', 'one-arm-press', 'band-press', same, 'The band gives each arm its own pull.'),
  tooHard('push-up', 'chair-push-up', same, 'The higher the hands, the lighter it gets.'),
  noKit('chair', 'chair-push-up', 'knee-push-up', same, 'Shorter lever on the floor.'),
  tooHard('chair-push-up', 'wall-push-up', times(1.25), 'Lighter still, a few more.'),
  tooHard('pike-push-up', 'chair-push-up', same, 'Keeps the head up and the load lower.'),
  // pull
  noKit('bar', 'pull-up', 'towel-row', times(1.5), 'Nothing to hang from: lean back on a towel, half as many again.'),
  noKit('bar', 'pull-up', 'dumbbell-row', samePerSide, 'The same pull, one arm at a time.'),
  tooHard('pull-up', 'band-pull-up', same, 'The band lifts the part that you cannot yet.'),
  tooHard('pull-up', 'ring-row', times(1.5, 15), 'Feet on the floor, so a few more.'),
  noKit('band', 'band-pull-up', 'ring-row', times(1.5, 15), 'Same muscles, feet on the floor.'),
  noKit('rings', 'ring-row', 'towel-row', same, 'The same pull with a door and a towel.'),
  noKit('rings', 'ring-row', 'dumbbell-row', samePerSide, 'One weight, one arm at a time.'),
  noKit('rings', 'ring-row', 'band-row', times(1.5, 20), 'A band is lighter: half as many again.'),
  noKit(
    'door',
    'towel-row',
    'prone-row-hold',
    hold(2, 30),
    'No door that shuts: hold the end of the pull, two seconds a rep.',
  ),
  noKit('dumbbell', 'dumbbell-row', 'backpack-row', same, 'Books weigh as much as iron.'),
  noKit('backpack', 'backpack-row', 'prone-row-hold', hold(2, 30), 'Nothing to lift: hold the end of the pull.'),
  noKit('band', 'band-row', 'prone-row-hold', hold(1.5, 30), 'Hold the end of the pull.'),
  noKit('band', 'band-pull-apart', 'prone-row-hold', hold(1, 20), 'The same muscles between the shoulder blades.'),
  // carry
  noKit('kettlebell', 'suitcase-carry', 'backpack-carry', same, 'Hug the bag, walk the same way.'),
  noSpace(
    'suitcase-carry',
    'suitcase-march',
    { type: 'fixed', dose: secondsPerSide(30) },
    'No room to walk: march where you stand.',
  ),
  noKit(
    'backpack',
    'backpack-carry',
    'slow-march',
    { type: 'fixed', dose: secondsPerSide(30) },
    'Nothing to carry: two slow counts on each leg.',
  ),
  noKit('dumbbell', 'two-hand-carry', 'backpack-carry', same, 'One heavy bag instead of two weights.'),
  noKit('kettlebell', 'front-carry', 'backpack-carry', same, 'The same load at the chest.'),
  // brace
  noKit('band', 'band-press-out', 'side-plank', hold(2, 30), 'Both keep the trunk from turning.'),
  tooHard('plank', 'all-fours-hold', same, 'Shorter line, same brace.'),
  tooHard('side-plank-reach', 'side-plank', hold(3, 30), 'Hold first, turn later.'),
  // jump
  noKit('rope', 'rope-skip', 'line-hop', same, 'Hop over tape for the same count.'),
  noSpace('rope-skip', 'heel-bounce', same, 'Low ceiling or people asleep below: quick heels, no hop.'),
  tooHard('line-hop', 'heel-bounce', same, 'Toes stay down, so landings are none.'),
  noKit('box', 'box-jump', 'squat-jump', same, 'The same jump without a landing place.'),
  tooHard('box-jump', 'box-step-up', samePerSide, 'Same box, one foot at a time.'),
  tooHard('squat-jump', 'fast-air-squat', same, 'As quick on the way up, feet stay on the floor.'),
  noSpace('jumping-jack', 'step-jack', same, 'Quiet for the neighbours.'),
  // locomotion
  noSpace(
    'bear-crawl',
    'all-fours-hold',
    { type: 'fixed', dose: { ...reps(20), unit: 'seconds' } },
    'No lane: hover where you are.',
  ),
  noSpace(
    'shuttle-walk',
    'high-knees',
    { type: 'fixed', dose: { ...reps(30), unit: 'seconds' } },
    'Run on the spot instead.',
  ),
  tooHard('high-knees', 'march', same, 'One foot always on the floor.'),
  // hold and stretch
  noKit('bar', 'dead-hang', 'kneeling-reach', times(1.5), 'Long arms and open sides without hanging.'),
  noKit('wall', 'calf-stretch', 'standing-calf-stretch', same, 'The same stretch with hands on the thigh.'),
  noKit('chair', 'hamstring-stretch', 'lying-hamstring-stretch', same, 'On your back, with a towel around the foot.'),
  noKit('mat', 'hip-flexor-stretch', 'standing-hip-stretch', same, 'Spares the knee on a hard floor.'),
  noKit('broomstick', 'broomstick-pass', 'arm-circle', times(1.5), 'Circles reach nearly as far.'),
];
