/** The field's words as closed lists: every screen, route, table and test takes them from here. */

export const roles = ['owner', 'coach', 'editor', 'member'] as const;
export type Role = (typeof roles)[number];

export const blockKinds = [
  'briefing',
  'warm-up',
  'activation',
  'mobility',
  'workout',
  'accessory',
  'cool-down',
] as const;
export type BlockKind = (typeof blockKinds)[number];

/** What a stretch of a recording shows. An aside (outtakes, chat) is never shown to members. */
export const chapterKinds = [
  'briefing',
  'warm-up',
  'activation',
  'mobility',
  'demo',
  'substitution',
  'workout',
  'accessory',
  'cool-down',
  'aside',
] as const;
export type ChapterKind = (typeof chapterKinds)[number];

export const patterns = [
  'squat',
  'hinge',
  'lunge',
  'push',
  'pull',
  'carry',
  'rotation/brace',
  'jump',
  'locomotion',
  'hold/stretch',
] as const;
export type Pattern = (typeof patterns)[number];

/** What a substitution does without. */
export const missingThings = ['kit', 'space', 'ability'] as const;
export type MissingThing = (typeof missingThings)[number];

export const sessionStates = ['draft', 'published'] as const;
export type SessionState = (typeof sessionStates)[number];

/** `uploading` bytes are on their way, `making` the worker is at it, `ready` it plays, `failed` it never will as it is. */
export const recordingStates = ['uploading', 'making', 'ready', 'failed'] as const;
export type RecordingState = (typeof recordingStates)[number];

/** What the worker does with a recording, in order; `drawing` only for the demo team's own recordings. */
export const makingSteps = ['drawing', 'probe', 'poster', 'playback', 'chapterPictures'] as const;
export type MakingStep = (typeof makingSteps)[number];

export const stepStates = ['waiting', 'running', 'done', 'failed'] as const;
export type StepState = (typeof stepStates)[number];

/** When in a demo a coaching cue is meant: before the first repetition, while moving, or to stay safe. */
export const cueKinds = ['set-up', 'go', 'safety'] as const;
export type CueKind = (typeof cueKinds)[number];
