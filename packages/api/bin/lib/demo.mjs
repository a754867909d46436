/**
 * Whether an empty database gets the demo company. Its sign-ins are printed for everybody to read, so it
 * belongs only where nobody else can come in: in the private database, on an address of this machine
 * alone - unless somebody asks for it by name.
 * @param {{ demo?: boolean, empty?: boolean, isPrivate: boolean, host: string }} start
 *   `demo` and `empty` are the switches of npm start
 * @returns {boolean}
 */
export function wantsDemo({ demo, empty, isPrivate, host }) {
  if (demo || empty) return Boolean(demo);
  return isPrivate && isLoopback(host);
}

function isLoopback(host) {
  return host === 'localhost' || host === '::1' || /^127(\.\d{1,3}){3}$/.test(host);
}
