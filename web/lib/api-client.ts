import type { z } from 'zod';
import { problemSchema } from '../../shared/contracts/problem.ts';
import { ApiError } from './api-error.ts';

type QueryValue = string | number | boolean | undefined;

export interface ApiRequest {
  method?: 'GET' | 'POST' | 'PATCH' | 'PUT' | 'DELETE';
  /** Sent as JSON, or as it is when it is a form with a file. */
  body?: unknown;
  query?: Record<string, QueryValue>;
  /** For writes that the network may repeat. */
  idempotencyKey?: string;
  signal?: AbortSignal;
}

/** Calls the API and parses the answer with its contract; throws `ApiError` for everything that goes wrong. */
export async function callApi<Schema extends z.ZodType>(
  schema: Schema,
  path: string,
  request: ApiRequest = {},
): Promise<z.output<Schema>> {
  const response = await send(path, request);
  const parsed = schema.safeParse(await readJson(response));
  if (!parsed.success) {
    throw new ApiError({
      type: 'about:blank',
      title: 'The server sent something that this page does not understand. Reload the page.',
      status: response.status,
      code: 'INTERNAL',
      detail: parsed.error.issues
        .slice(0, 5)
        .map((issue) => `${issue.path.join('.')}: ${issue.message}`)
        .join('; '),
    });
  }
  return parsed.data;
}

/** Calls the API where the answer has no body. */
export async function callApiForNothing(path: string, request: ApiRequest): Promise<void> {
  await send(path, request);
}

/** Calls the API where the answer comes line by line, each of them JSON. */
export async function* callApiForLines<Schema extends z.ZodType>(
  schema: Schema,
  path: string,
  request: ApiRequest,
): AsyncGenerator<z.output<Schema>> {
  const { body } = await send(path, request);
  if (body === null) return;
  const decoder = new TextDecoder();
  let rest = '';
  for (const reader = body.getReader(); ;) {
    const { value, done } = await reader.read();
    rest += decoder.decode(value, { stream: !done });
    const lines = rest.split('\n');
    rest = done ? '' : (lines.pop() ?? '');
    for (const line of lines) if (line.trim() !== '') yield schema.parse(JSON.parse(line));
    if (done) return;
  }
}

async function send(path: string, request: ApiRequest): Promise<Response> {
  const { method = 'GET', body, query, idempotencyKey, signal } = request;
  const headers = new Headers({ Accept: 'application/json, application/problem+json' });
  if (body !== undefined && !(body instanceof FormData)) {
    headers.set('Content-Type', 'application/json');
  }
  if (idempotencyKey !== undefined) headers.set('Idempotency-Key', idempotencyKey);
  let response: Response;
  try {
    response = await fetch(`/api${path}${toQueryString(query)}`, {
      method,
      headers,
      credentials: 'same-origin',
      ...(body === undefined
        ? {}
        : { body: body instanceof FormData ? body : JSON.stringify(body) }),
      ...(signal === undefined ? {} : { signal }),
    });
  } catch (error) {
    if (signal?.aborted === true) throw error;
    throw new ApiError({
      type: 'about:blank',
      title: 'The server cannot be reached. Check the connection and try again.',
      status: 0,
      code: 'UNAVAILABLE',
    });
  }
  if (!response.ok) throw await toApiError(response);
  return response;
}

async function toApiError(response: Response): Promise<ApiError> {
  const parsed = problemSchema.safeParse(await readJson(response));
  if (parsed.success) return new ApiError(parsed.data);
  return new ApiError({
    type: 'about:blank',
    title: 'The server could not answer. Try again in a moment.',
    status: response.status,
    code: response.status === 404 ? 'NOT_FOUND' : 'INTERNAL',
  });
}

/** The body as JSON; undefined where it is empty or no JSON, which no contract accepts. */
async function readJson(response: Response): Promise<unknown> {
  const text = await response.text();
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

function toQueryString(query: Record<string, QueryValue> = {}): string {
  const parameters = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) {
    if (value !== undefined && value !== '') parameters.set(name, String(value));
  }
  const text = parameters.toString();
  return text === '' ? '' : `?${text}`;
}
