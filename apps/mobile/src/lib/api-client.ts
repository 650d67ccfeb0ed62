import type { z } from 'zod';
import { ApiProblem, offlineProblem, problemOfReply } from './api-problem.ts';

export type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';

/** The address of something in a firm: firmPath(firmId, 'cables', cableId). */
export function firmPath(firmId: string, ...parts: string[]): string {
  return ['/firms', firmId, ...parts].map((part, index) => (index === 0 ? part : encodeURIComponent(part))).join('/');
}

/** Where the browser itself fetches a file (PDF, CSV). */
export function fileAddress(path: string): string {
  return `/api/v1${path}`;
}

/** Reads something. The reply is parsed by the same schema that the server writes it with. */
export async function get<Schema extends z.ZodType>(path: string, schema: Schema, signal?: AbortSignal): Promise<z.output<Schema>> {
  return parseReply(await exchange('GET', path, undefined, signal), schema);
}

/** Changes something and reads the reply. */
export async function send<Schema extends z.ZodType>(
  method: Exclude<Method, 'GET'>,
  path: string,
  body: unknown,
  schema: Schema,
): Promise<z.output<Schema>> {
  return parseReply(await exchange(method, path, body), schema);
}

/** One exchange with the API; throws an ApiProblem for every answer that is not a success, and for none. */
export async function exchange(method: Method, path: string, body?: unknown, signal?: AbortSignal): Promise<unknown> {
  const reply = await fetch(`/api/v1${path}`, {
    method,
    credentials: 'same-origin',
    headers: { accept: 'application/json', ...(body === undefined ? {} : { 'content-type': 'application/json' }) },
    ...(body === undefined ? {} : { body: JSON.stringify(body) }),
    ...(signal ? { signal } : {}),
  }).catch((error: unknown) => {
    // A query that is no longer wanted is no problem of the connection.
    if (signal?.aborted) throw error;
    throw offlineProblem();
  });
  if (!reply.ok) throw await problemOfReply(reply);
  return reply.status === 204 ? null : reply.json();
}

function parseReply<Schema extends z.ZodType>(reply: unknown, schema: Schema): z.output<Schema> {
  const parsed = schema.safeParse(reply);
  if (parsed.success) return parsed.data;
  console.error(parsed.error);
  throw new ApiProblem(
    'failed',
    200,
    'unexpected-reply',
    'The server answered in a way that this version does not understand. Reload the page.',
  );
}
