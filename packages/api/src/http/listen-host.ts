/** A host as a socket takes it: an IPv6 address that came in its brackets without them. */
export function listenHost(host: string): string {
  return host.replace(/^\[(.*)\]$/, '$1');
}

/** The address of a server on this machine; an IPv6 address stands in brackets. @param host with or without brackets */
export function originOf(host: string, port: number): string {
  const bare = listenHost(host);
  return `http://${bare.includes(':') ? `[${bare}]` : bare}:${port}`;
}
