import { z } from 'zod';
import { Id, Ms } from '../domain/values';
import { chapterKinds } from '../domain/words';
import { endpoint } from './endpoint';
import { Moment, NamedMovement } from './moments';

/** A word that was said, title, note or cue, with the words that matched. */
export const SaidLine = z.object({
  atMs: Ms,
  /** pieces of the line in order; the marked ones matched */
  pieces: z.array(z.object({ text: z.string(), marked: z.boolean() })),
});

export type SaidLine = z.infer<typeof SaidLine>;

export const Finding = z.object({
  moment: Moment,
  /** why it was found */
  why: z.enum(['demo', 'substitution', 'movement', 'said']),
  said: SaidLine.nullable(),
  /** of a substitution: why it serves, and how the dose changes */
  note: z.string().nullable(),
});
export type Finding = z.infer<typeof Finding>;

export const FindingGroup = z.object({
  /** the movement that the moments show, or stand in for; null for words that were said */
  movement: NamedMovement.nullable(),
  heading: z.enum(['demos', 'insteadOf', 'said']),
  /** whether the asker's kit is enough for the movement; null where no movement is asked for */
  inMyKit: z.boolean().nullable(),
  findings: z.array(Finding),
});
export type FindingGroup = z.infer<typeof FindingGroup>;

export const find = endpoint({
  method: 'get',
  path: '/teams/:team/find',
  may: 'readLibrary',
  summary: 'Moments for a query, grouped by movement',
  limit: 'search',
  query: z.object({
    q: z.string().trim().max(200),
    kind: z.enum(chapterKinds).optional(),
    /** `mine` leaves out what one's kit is not enough for */
    kit: z.enum(['mine', 'any']).default('any'),
  }),
  response: z.object({
    /** how the query was understood: "ring row, without rings" */
    understood: z.object({
      movements: z.array(NamedMovement),
      without: z.array(z.object({ id: Id, name: z.string() })),
    }),
    didYouMean: z.array(NamedMovement),
    groups: z.array(FindingGroup),
    /** movements that fit but nobody has filmed */
    notFilmed: z.array(NamedMovement),
    /** how many findings the kit filter hides */
    hiddenByKit: z.int(),
  }),
});

export const suggest = endpoint({
  method: 'get',
  path: '/teams/:team/suggest',
  may: 'readLibrary',
  summary: 'Movements while one types',
  limit: 'search',
  query: z.object({ q: z.string().trim().max(200) }),
  response: z.object({
    items: z.array(z.object({ movement: NamedMovement, matched: z.string(), demo: Moment.nullable() })),
  }),
});
