import { z } from 'zod/v4';

const faultSchema = z.object({ path: z.string(), message: z.string() });

/** The members of an RFC 9457 problem body that the pages use; further ones stay in `body`. */
const problemSchema = z.looseObject({
  title: z.string(),
  detail: z.string().default(''),
  errors: z.array(faultSchema).default([]),
  requestId: z.string().optional(),
});

export type ApiFault = z.infer<typeof faultSchema>;

/**
 * A request that did not succeed, in words for the person. `status` 0 means that no answer came.
 */
export class ApiError extends Error {
  override readonly name = 'ApiError';
  readonly status: number;
  readonly title: string;
  readonly detail: string;
  readonly errors: readonly ApiFault[];
  readonly requestId: string | null;
  /** The whole problem body, for members of one kind of problem. */
  readonly body: Readonly<Record<string, unknown>>;

  constructor(
    status: number,
    title: string,
    detail: string,
    more: {
      errors?: readonly ApiFault[];
      requestId?: string | null;
      body?: Record<string, unknown>;
      cause?: unknown;
    } = {},
  ) {
    super(`${title}: ${detail}`, { cause: more.cause });
    this.status = status;
    this.title = title;
    this.detail = detail;
    this.errors = more.errors ?? [];
    this.requestId = more.requestId ?? null;
    this.body = more.body ?? {};
  }
}

/** What to say about an answer that carries no problem body of ours. */
function wordsForStatus(status: number): [title: string, detail: string] {
  if (status === 413) return ['Too large', 'The server does not take that much at once.'];
  if (status === 401) return ['Not signed in', 'Sign in again; what you typed is still here.'];
  if (status >= 500) return ['The server could not answer', 'Nothing was changed. Try again.'];
  return ['The request was refused', `The server answered with status ${status}.`];
}

/** Turns the text of a refusal into an error; any body will do. */
export function errorFromAnswer(status: number, text: string): ApiError {
  let value: unknown = null;
  try {
    value = JSON.parse(text);
  } catch {
    // Not one of our problem bodies; the status alone has to speak.
  }
  const problem = problemSchema.safeParse(value);
  if (!problem.success) return new ApiError(status, ...wordsForStatus(status));
  const { title, detail, errors, requestId } = problem.data;
  return new ApiError(status, title, detail, {
    errors,
    requestId: requestId ?? null,
    body: problem.data,
  });
}

export function noAnswer(cause: unknown): ApiError {
  return new ApiError(
    0,
    'No answer from the server',
    'The connection broke or the server is away. Check the network and try again.',
    { cause },
  );
}

/** The words of anything thrown, as an ApiError. */
export function asApiError(error: unknown): ApiError {
  return error instanceof ApiError ? error : noAnswer(error);
}

export interface ApiRequest {
  method?: 'GET' | 'POST' | 'PUT' | 'DELETE';
  /** Sent as JSON. */
  json?: unknown;
  signal?: AbortSignal;
}

/**
 * Asks our own server and reads JSON.
 *
 * @typeParam Answer the shape of a successful answer, as its contract says
 * @throws ApiError for every refusal, and with status 0 when no answer came
 */
export async function requestJson<Answer>(path: string, request: ApiRequest = {}): Promise<Answer> {
  const { method = 'GET', json, signal } = request;
  let response: Response;
  let text: string;
  try {
    response = await fetch(path, {
      method,
      credentials: 'same-origin',
      headers: {
        accept: 'application/json',
        ...(json === undefined ? {} : { 'content-type': 'application/json' }),
      },
      ...(json === undefined ? {} : { body: JSON.stringify(json) }),
      ...(signal ? { signal } : {}),
    });
    text = await response.text();
  } catch (error) {
    throw noAnswer(error);
  }
  if (!response.ok) throw errorFromAnswer(response.status, text);
  return (text === '' ? null : JSON.parse(text)) as Answer;
}
