import type { Request, Response, Router } from 'express';
import type { Endpoint, InputOf, OutputOf } from '@driprail/shared/contracts/endpoint';
import { abilityFor } from '@driprail/shared/authz/ability';
import type { Clock } from '../clock.ts';
import type { Ctx } from './context.ts';
import { AppError, forbidden, unauthorized } from './errors.ts';

export interface SignedIn {
  id: string;
  name: string;
  email: string;
  role: 'owner' | 'dispatcher' | 'technician';
  personId: string | null;
}

declare global {
  // How Express is told of the signed-in user.
  namespace Express {
    interface User extends SignedIn {
      readonly kind: 'user';
    }
  }
}

export interface HttpExchange {
  req: Request;
  res: Response;
}
type Handle<E extends Endpoint> = (input: InputOf<E>, ctx: Ctx, exchange: HttpExchange) => Promise<OutputOf<E>>;
type PublicHandle<E extends Endpoint> = (input: InputOf<E>, now: Clock, exchange: HttpExchange) => Promise<OutputOf<E>>;

/** The answer of what only had to be done. */
export const okay = { ok: true } as const;

/** Every endpoint that was mounted, for the list of routes. */
export interface RouteTable {
  router: Router;
  endpoints: Endpoint[];
  now: Clock;
}

/** Mounts an endpoint for signed-in roles: 401, then 403 by role, then 400, then the handler's own refusals. */
export function route<E extends Endpoint>(table: RouteTable, endpoint: E, handle: Handle<E>): void {
  mount(table, endpoint, (req, res) => {
    const ctx = contextOf(req, endpoint, table.now);
    return handle(parse(endpoint, req), ctx, { req, res });
  });
}

/** Mounts an endpoint that anybody may ask. */
export function publicRoute<E extends Endpoint>(table: RouteTable, endpoint: E, handle: PublicHandle<E>): void {
  mount(table, endpoint, (req, res) => handle(parse(endpoint, req), table.now, { req, res }));
}

function mount<E extends Endpoint>(
  table: RouteTable,
  endpoint: E,
  answer: (req: Request, res: Response) => Promise<OutputOf<E>>,
): void {
  table.endpoints.push(endpoint);
  table.router[endpoint.method](endpoint.path, async (req, res) => {
    const output = endpoint.response.parse(await answer(req, res));
    if (endpoint.format === 'csv') res.type('text/csv').send(output);
    else if (endpoint.format === 'pdf') res.type('application/pdf').send(output);
    else if (endpoint.format === 'zip') res.type('application/zip').send(output);
    else if (endpoint.format === 'jpeg') res.type('image/jpeg').send(output);
    else res.json(output);
  });
}

function contextOf(req: Request, endpoint: Endpoint, now: Clock): Ctx {
  const user = req.user;
  if (!user) throw unauthorized(req.session.endedFor);
  if (endpoint.roles !== 'public' && !endpoint.roles.includes(user.role)) throw forbidden();
  const actor = { userId: user.id, personId: user.personId, role: user.role };
  return { actor, name: user.name, ability: abilityFor(actor), now };
}

function parse<E extends Endpoint>(endpoint: E, req: Request): InputOf<E> {
  const fields: Record<string, string> = {};
  const part = (schema: E['params'], value: unknown): unknown => {
    const parsed = schema.safeParse(value ?? {});
    if (parsed.success) return parsed.data;
    for (const issue of parsed.error.issues) fields[issue.path.join('.')] ??= issue.message;
    return undefined;
  };
  const input = {
    params: part(endpoint.params, req.params),
    query: part(endpoint.query, req.query),
    body: part(endpoint.body, req.body),
  };
  if (Object.keys(fields).length > 0) {
    throw new AppError(400, 'bad_request', Object.values(fields)[0] ?? 'Something is missing.', { fields });
  }
  return input as InputOf<E>;
}
