import { z } from 'zod';
import { type Endpoint, type Input, type Output, paramsOf } from '../../shared/contracts/endpoint';
import type { ErrorCode, FieldErrors } from '../../shared/errors';

// compiled checks would need `unsafe-eval` in the content security policy
z.config({ jitless: true });

/** A refusal as the server said it, or what kept it from answering (`offline`). */
export class ApiError extends Error {
  constructor(
    readonly code: ErrorCode | 'offline' | 'odd',
    message: string,
    readonly status: number,
    readonly fields: FieldErrors = {},
    readonly requestId: string | null = null,
    /** with `stale`: the state that the server has */
    readonly current: unknown = undefined,
    readonly retryAfterSeconds: number | null = null,
  ) {
    super(message);
    this.name = 'ApiError';
  }
}

type Options = {
  signal?: AbortSignal;
  /** `kept` for a request that goes on when the page is left */
  afterPage?: 'dropped' | 'kept';
};

/**
 * Calls a declared operation. Path parameters are taken out of the input; the rest goes into the query of a GET or DELETE,
 * else into the body. The answer is parsed by the endpoint's own schema.
 * @throws ApiError
 */
export async function call<E extends Endpoint>(
  endpoint: E,
  input: Input<E>,
  options: Options = {},
): Promise<Output<E>> {
  const { path, rest } = fill(endpoint.path, input as Record<string, unknown>);
  const inQuery = endpoint.method === 'get' || endpoint.method === 'delete';
  const query = inQuery ? queryOf(rest) : '';
  return send(endpoint, path + query, inQuery ? undefined : JSON.stringify(rest), options);
}

/** Calls an operation that takes a file; the input's other fields go beside it. @throws ApiError */
export async function callWithFile<E extends Endpoint>(
  endpoint: E,
  input: Input<E>,
  file: File,
  options: Options = {},
): Promise<Output<E>> {
  const { path, rest } = fill(endpoint.path, input as Record<string, unknown>);
  const form = new FormData();
  for (const [name, value] of Object.entries(rest)) form.append(name, String(value));
  form.append('file', file, file.name);
  return send(endpoint, path, form, options);
}

/** The address of an operation that a browser opens by itself: a download, a track, a stream. */
export function addressOf<E extends Endpoint>(endpoint: E, input: Input<E>): string {
  const { path, rest } = fill(endpoint.path, input as Record<string, unknown>);
  return `/api${path}${queryOf(rest)}`;
}

async function send<E extends Endpoint>(
  endpoint: E,
  path: string,
  body: string | FormData | undefined,
  { signal, afterPage = 'dropped' }: Options,
): Promise<Output<E>> {
  let response: Response;
  try {
    response = await fetch(`/api${path}`, {
      method: endpoint.method.toUpperCase(),
      credentials: 'same-origin',
      keepalive: afterPage === 'kept',
      headers: typeof body === 'string' ? { 'Content-Type': 'application/json' } : {},
      ...(body === undefined ? {} : { body }),
      ...(signal ? { signal } : {}),
    });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new ApiError('offline', 'Tapeline cannot be reached. Check the connection; what you wrote is still here.', 0);
  }
  if (!response.ok) throw await refusal(response);
  const answer = endpoint.answers === 'text/vtt' ? await response.text() : await response.json().catch(() => undefined);
  const read = endpoint.response.safeParse(answer);
  if (!read.success) throw new ApiError('odd', 'Tapeline was updated meanwhile. Load the page again.', response.status);
  return read.data as Output<E>;
}

const Refusal = z.object({
  error: z.object({
    code: z.string(),
    message: z.string(),
    fields: z.record(z.string(), z.string()).optional(),
    current: z.unknown().optional(),
    requestId: z.string().optional(),
  }),
});

async function refusal(response: Response): Promise<ApiError> {
  const read = Refusal.safeParse(await response.json().catch(() => null));
  const after = Number(response.headers.get('Retry-After'));
  if (!read.success)
    return new ApiError('broken', 'Something broke on our side. Try again in a moment.', response.status);
  const { code, message, fields, current, requestId } = read.data.error;
  return new ApiError(
    code as ErrorCode,
    message,
    response.status,
    fields,
    requestId ?? null,
    current,
    after > 0 ? after : null,
  );
}

function fill(path: string, input: Record<string, unknown>) {
  const rest = { ...input };
  let filled = path;
  for (const name of paramsOf(path)) {
    filled = filled.replace(`:${name}`, encodeURIComponent(String(rest[name])));
    delete rest[name];
  }
  return { path: filled, rest };
}

function queryOf(values: Record<string, unknown>): string {
  const query = new URLSearchParams();
  for (const [name, value] of Object.entries(values))
    if (value !== undefined && value !== null) query.set(name, String(value));
  const text = query.toString();
  return text ? `?${text}` : '';
}
