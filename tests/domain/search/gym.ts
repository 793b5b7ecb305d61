import { buildDictionary, type NamedKit, type NamedMovement } from '../../../shared/domain/search/dictionary';
import type { Pattern } from '../../../shared/domain/words';

/** A small invented dictionary. */

export const kit: NamedKit[] = [
  { id: 'kettlebell', name: 'kettlebell', otherNames: ['KB', 'bell'] },
  { id: 'dumbbell', name: 'dumbbell', otherNames: ['DB'] },
  { id: 'hang', name: 'pull-up bar', otherNames: ['bar to hang from'] },
  { id: 'rings', name: 'rings', otherNames: [] },
  { id: 'rope', name: 'skipping rope', otherNames: ['jump rope'] },
  { id: 'box', name: 'box', otherNames: ['plyo box'] },
];

const movement = (name: string, pattern: Pattern, needs: string[] = [], otherNames: string[] = []): NamedMovement => ({
  id: name,
  name,
  otherNames,
  pattern,
  kitNeeded: needs.map((kitItemId) => ({ anyOf: [{ kitItemId, count: 1, minLoadKg: null }] })),
});

export const movements: NamedMovement[] = [
  movement('goblet squat', 'squat', ['kettlebell']),
  movement('air squat', 'squat', [], ['bodyweight squat']),
  movement('jump squat', 'jump', [], ['squat jump']),
  movement('kettlebell swing', 'hinge', ['kettlebell'], ['Russian swing']),
  movement('Romanian deadlift', 'hinge', ['dumbbell'], ['RDL']),
  movement('hip hinge drill', 'hinge'),
  movement('one-arm dumbbell row', 'pull', ['dumbbell'], ['single-arm DB row']),
  movement('ring row', 'pull', ['rings'], ['inverted row']),
  movement('pull-up', 'pull', ['hang']),
  movement('gorilla row', 'pull', ['kettlebell']),
  movement('push-up', 'push', [], ['press-up']),
  movement('pike push-up', 'push'),
  movement('step-up', 'lunge', ['box'], ['box step-up']),
  movement('reverse lunge', 'lunge'),
  movement('double-under', 'jump', ['rope']),
  movement('lateral hop', 'jump', [], ['line hop']),
  movement('sit-to-stand', 'squat', [], ['chair squat']),
  movement('développé', 'hold/stretch'),
  movement('dead bug', 'rotation/brace'),
  movement('dead hang', 'hold/stretch', ['hang']),
];

export const gym = buildDictionary(movements, kit);
