import { z } from 'zod';
import { DoseRule } from '../domain/kit/doseRule';
import { KitNeed } from '../domain/kit/kit';
import { Caution } from '../domain/training/caution';
import { Id, shortText, Version } from '../domain/values';
import { missingThings, patterns } from '../domain/words';
import { limits } from '../limits';
import { endpoint, Nothing, PageQuery, page } from './endpoint';
import { Moment, NamedMovement } from './moments';

export const MovementName = shortText(80);

export const MovementFields = z.object({
  name: MovementName,
  otherNames: z.array(shortText(80)).max(40).default([]),
  pattern: z.enum(patterns),
  kitNeeded: z.array(KitNeed).max(10).default([]),
  /** points of performance */
  points: z.array(shortText(200)).max(20).default([]),
  /** common faults */
  faults: z.array(shortText(200)).max(20).default([]),
  cautions: z.array(Caution).max(10).default([]),
});
export type MovementFields = z.infer<typeof MovementFields>;

export const Substitution = z.object({
  id: Id,
  from: NamedMovement,
  to: NamedMovement,
  missing: z.enum(missingThings),
  missingKitItemId: Id.nullable(),
  doseRule: DoseRule,
  reason: z.string(),
  version: Version,
});
export type Substitution = z.infer<typeof Substitution>;

export const Movement = MovementFields.extend({ id: Id, pictureUrl: z.string().nullable(), version: Version });
export type Movement = z.infer<typeof Movement>;

export const MovementInList = z.object({
  id: Id,
  name: z.string(),
  otherNames: z.array(z.string()),
  pattern: z.enum(patterns),
  kitNeeded: z.array(KitNeed),
  pictureUrl: z.string().nullable(),
  /** how many chapters show it that the asker may see, capped */
  demoCount: z.int(),
});
export type MovementInList = z.infer<typeof MovementInList>;

export const listMovements = endpoint({
  method: 'get',
  path: '/teams/:team/movements',
  may: 'readLibrary',
  summary: 'The dictionary by name; with `q` the movements that a query means, best first',
  query: PageQuery.extend({ q: z.string().max(200).optional(), pattern: z.enum(patterns).optional() }),
  response: page(MovementInList),
});

/** Names only, all of them: for typed completion. */
export const listMovementNames = endpoint({
  method: 'get',
  path: '/teams/:team/movement-names',
  may: 'readLibrary',
  summary: 'Every movement’s name and other names, for completion while typing',
  response: z.object({
    items: z.array(z.object({ id: Id, name: z.string(), otherNames: z.array(z.string()), pattern: z.enum(patterns) })),
  }),
});

export const getMovement = endpoint({
  method: 'get',
  path: '/teams/:team/movements/:movementId',
  may: 'readLibrary',
  summary:
    'A movement, its substitutions and every moment that shows it; a merged duplicate answers with what it became',
  response: z.object({
    movement: Movement,
    /** instead of it */
    substitutions: z.array(Substitution),
    /** what it stands in for */
    standsInFor: z.array(Substitution),
    moments: z.array(Moment),
  }),
});

export const createMovement = endpoint({
  method: 'post',
  path: '/teams/:team/movements',
  may: 'editMovement',
  summary: 'Add a movement',
  body: MovementFields,
  response: Movement,
  status: 201,
  errors: ['nameTaken', 'invalid'],
});

export const updateMovement = endpoint({
  method: 'put',
  path: '/teams/:team/movements/:movementId',
  may: 'editMovement',
  summary: 'Change a movement; a former name stays as another name, so that nobody’s search breaks',
  body: MovementFields.extend({ version: Version }),
  response: Movement,
  errors: ['nameTaken', 'stale', 'invalid'],
});

export const mergeMovements = endpoint({
  method: 'post',
  path: '/teams/:team/movements/:movementId/merge',
  may: 'editMovement',
  summary: 'Fold a duplicate into this movement: its names, chapters, plan lines, cues and substitutions move over',
  body: z.object({ duplicateId: Id, version: Version, duplicateVersion: Version }),
  response: Movement,
  errors: ['stale', 'invalid'],
});

export const setMovementPicture = endpoint({
  method: 'post',
  path: '/teams/:team/movements/:movementId/picture',
  may: 'editMovement',
  summary: 'A picture for a movement',
  limit: 'write',
  file: { maxBytes: limits.pictureBytes, types: ['image/jpeg', 'image/png', 'image/webp'] },
  response: Movement,
  errors: ['tooLarge', 'wrongType', 'badFile'],
});

export const removeMovementPicture = endpoint({
  method: 'delete',
  path: '/teams/:team/movements/:movementId/picture',
  may: 'editMovement',
  summary: 'Take the picture away',
  response: Movement,
});

const SubstitutionFields = z.object({
  toMovementId: Id,
  missing: z.enum(missingThings),
  missingKitItemId: Id.nullable().default(null),
  doseRule: DoseRule,
  reason: shortText(200),
});

export const addSubstitution = endpoint({
  method: 'post',
  path: '/teams/:team/movements/:movementId/substitutions',
  may: 'editMovement',
  summary: 'Say what to do instead of this movement',
  body: SubstitutionFields,
  response: Substitution,
  status: 201,
  errors: ['nameTaken', 'invalid'],
});

export const updateSubstitution = endpoint({
  method: 'put',
  path: '/teams/:team/movements/:movementId/substitutions/:substitutionId',
  may: 'editMovement',
  summary: 'Change a substitution',
  body: SubstitutionFields.extend({ version: Version }),
  response: Substitution,
  errors: ['stale', 'invalid'],
});

export const removeSubstitution = endpoint({
  method: 'delete',
  path: '/teams/:team/movements/:movementId/substitutions/:substitutionId',
  may: 'editMovement',
  summary: 'Remove a substitution',
  response: Nothing,
});
