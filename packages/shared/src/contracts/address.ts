import type { Endpoint, Method } from './endpoint.ts';

/**
 * Where an endpoint is, without its schemas, which weigh more than a phone may load before its first screen. The type
 * keeps what the endpoint takes and gives; the server checks both.
 */
export interface Address<E extends Endpoint = Endpoint> {
  method: Method;
  path: Endpoint['path'];
  /** For the types alone. */
  readonly endpoint?: E;
}

export function addressOf<E extends Endpoint>(method: E['method'], path: E['path']): Address<E> {
  return { method, path };
}
