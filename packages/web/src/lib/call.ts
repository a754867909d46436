import type { Address } from '@driprail/shared/contracts/address';
import type { ErrorBody, ErrorHint } from '@driprail/shared/contracts/error.contract';
import type { Endpoint, OutputOf, RequestOf } from '@driprail/shared/contracts/endpoint';
import { noteServerTime } from './device-clock.ts';

/** A refusal of the API, in its own words. Status 0 means that it was not reached. */
export class ApiError extends Error {
  readonly status: number;
  readonly code: string;
  readonly fields: Record<string, string>;
  readonly hint: ErrorHint;

  constructor(
    status: number,
    code: string,
    message: string,
    fields: Record<string, string> = {},
    hint: ErrorHint = {},
  ) {
    super(message);
    this.status = status;
    this.code = code;
    this.fields = fields;
    this.hint = hint;
  }
}

/**
 * Asks an endpoint, by its whole description or by its address alone. With the description the answer is checked here
 * too; the server has checked it either way.
 * @throws ApiError
 */
export async function call<E extends Endpoint>(
  endpoint: E | Address<E>,
  request: RequestOf<E> = {},
  signal?: AbortSignal,
): Promise<OutputOf<E>> {
  const response = await send(endpoint, request, signal);
  noteServerTime(response.headers.get('x-now'));
  const json: unknown = await response.json().catch(() => null);
  if (response.ok) return ('response' in endpoint ? endpoint.response.parse(json) : json) as OutputOf<E>;
  if (!isRefusal(json))
    throw new ApiError(response.status, 'unknown', 'The server answered with something unreadable. Try again.');
  const { code, message, fields, hint } = json.error;
  if (hint?.endedFor) await (await import('./outbox/forget-user.ts')).forgetUser(hint.endedFor).catch(() => undefined);
  throw new ApiError(response.status, code, message, fields, hint);
}

function isRefusal(json: unknown): json is ErrorBody {
  if (typeof json !== 'object' || json === null || !('error' in json)) return false;
  const { error } = json;
  return (
    typeof error === 'object' &&
    error !== null &&
    'code' in error &&
    'message' in error &&
    typeof error.code === 'string' &&
    typeof error.message === 'string'
  );
}

/** Bytes go as they are, all else as JSON. */
function bodyOf(body: unknown): RequestInit {
  if (body === undefined) return {};
  if (body instanceof Blob) return { body, headers: { 'content-type': 'application/octet-stream' } };
  return { body: JSON.stringify(body), headers: { 'content-type': 'application/json' } };
}

async function send(endpoint: Address, request: RequestOf<Endpoint>, signal?: AbortSignal): Promise<Response> {
  const params = (request.params ?? {}) as Record<string, string>;
  const path = endpoint.path.replace(/:(\w+)/g, (_all, name: string) => encodeURIComponent(params[name] ?? ''));
  const query = new URLSearchParams(request.query as Record<string, string> | undefined).toString();
  try {
    return await fetch(query ? `${path}?${query}` : path, {
      method: endpoint.method.toUpperCase(),
      ...bodyOf(request.body),
      ...(signal && { signal }),
    });
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new ApiError(
      0,
      'offline',
      'The server can’t be reached. What you entered is kept; try again when there is signal.',
    );
  }
}
