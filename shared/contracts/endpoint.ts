import { z } from 'zod';
import type { Action } from '../domain/permissions';
import type { ErrorCode } from '../errors';

/**
 * One operation, declared once: the router, the client, the OpenAPI document and the role matrix read the same object.
 * Paths are written below `/api`; `:team` is a team's slug, every other parameter that ends in `Id` is a UUID.
 */

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** `anyone` needs no sign-in, `signedIn` needs one but no team; everything else is a row of the permissions table. */
export type May = 'anyone' | 'signedIn' | Action;

/** Named buckets; their numbers are in server/middleware/limits.ts. */
export type RateLimit = 'read' | 'write' | 'signIn' | 'mail' | 'search';

export type UploadedFile = {
  maxBytes: number;
  /** content types as told by the file itself, not by its name */
  types: readonly string[];
};

type Shape = z.ZodObject | z.ZodDiscriminatedUnion;

type Definition<
  P extends string,
  Q extends z.ZodObject | undefined,
  B extends Shape | undefined,
  R extends z.ZodType,
> = {
  method: Method;
  path: P;
  may: May;
  summary: string;
  query?: Q;
  body?: B;
  /** a multipart request with one file in the field `file`, the body's fields beside it */
  file?: UploadedFile;
  /** what a good answer holds; for `answers` other than JSON the text itself */
  response: R;
  answers?: 'application/json' | 'text/vtt' | 'text/event-stream';
  status?: 200 | 201 | 202 | 204;
  limit?: RateLimit;
  errors?: readonly ErrorCode[];
};

type ParamNames<P extends string> = P extends `${string}:${infer Name}/${infer Rest}`
  ? Name | ParamNames<`/${Rest}`>
  : P extends `${string}:${infer Name}`
    ? Name
    : never;

export type Params<P extends string> = { [K in ParamNames<P>]: string };

export function endpoint<
  const P extends string,
  R extends z.ZodType,
  Q extends z.ZodObject | undefined = undefined,
  B extends Shape | undefined = undefined,
>(definition: Definition<P, Q, B, R>) {
  return definition;
}

// biome-ignore lint/suspicious/noExplicitAny: the shape of any endpoint, whatever its types
export type Endpoint = Definition<string, any, any, z.ZodType>;

type InputOf<T> = [T] extends [z.ZodType] ? z.input<T> : unknown;
type OutputOf<T> = [T] extends [z.ZodType] ? z.output<T> : undefined;

// biome-ignore-start lint/suspicious/noExplicitAny: only one part of the definition is looked at
type BodySchema<E extends Endpoint> = E extends Definition<any, any, infer B, any> ? B : never;
type QuerySchema<E extends Endpoint> = E extends Definition<any, infer Q, any, any> ? Q : never;
// biome-ignore-end lint/suspicious/noExplicitAny: above

/** What a caller gives: path parameters, query and body side by side. */
export type Input<E extends Endpoint> = Params<E['path']> & InputOf<QuerySchema<E>> & InputOf<BodySchema<E>>;
export type Body<E extends Endpoint> = OutputOf<BodySchema<E>>;
export type Query<E extends Endpoint> = OutputOf<QuerySchema<E>>;
export type Output<E extends Endpoint> = z.output<E['response']>;

/** The names of a path's parameters, in order. */
export function paramsOf(path: string): string[] {
  return [...path.matchAll(/:([A-Za-z]+)/g)].map((match) => match[1] as string);
}

/** For an answer without content. */
export const Nothing = z.object({});

/** A page of a list, and where the next one starts. */
export const page = <T extends z.ZodType>(item: T) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });

export const PageQuery = z.object({
  cursor: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(100).default(50),
});
