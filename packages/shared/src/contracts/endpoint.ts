import { z } from 'zod';
import type { Role } from '../authz/actor.ts';

type Part = z.ZodType;
export type Method = 'get' | 'post' | 'put' | 'patch' | 'delete';

/** One description of a request and its answer, used by the route, the web client and the form. */
export interface Endpoint<P extends Part = Part, Q extends Part = Part, B extends Part = Part, R extends Part = Part> {
  method: Method;
  path: `/api/${string}`;
  /** Who may ask at all; rows and fields are decided by the abilities. */
  roles: readonly Role[] | 'public';
  summary: string;
  params: P;
  query: Q;
  body: B;
  response: R;
  /** `csv` answers text, `pdf`, `zip` and `jpeg` bytes; the response schema then describes those. */
  format: 'json' | 'csv' | 'pdf' | 'zip' | 'jpeg';
}

export type InputOf<E extends Endpoint> = {
  params: z.infer<E['params']>;
  query: z.infer<E['query']>;
  body: z.infer<E['body']>;
};
export type OutputOf<E extends Endpoint> = z.infer<E['response']>;
/** What a caller sends: before defaults are filled in. */
export type RequestOf<E extends Endpoint> = {
  params?: z.input<E['params']>;
  query?: z.input<E['query']>;
  body?: z.input<E['body']>;
};

const nothing = z.object({});

export function endpoint<
  R extends Part,
  P extends Part = typeof nothing,
  Q extends Part = typeof nothing,
  B extends Part = z.ZodUnknown,
>(description: {
  method: Method;
  path: `/api/${string}`;
  roles: readonly Role[] | 'public';
  summary: string;
  params?: P;
  query?: Q;
  body?: B;
  response: R;
  format?: Endpoint['format'];
}): Endpoint<P, Q, B, R> {
  return {
    params: nothing as unknown as P,
    query: nothing as unknown as Q,
    body: z.unknown() as unknown as B,
    format: 'json',
    ...description,
  };
}
