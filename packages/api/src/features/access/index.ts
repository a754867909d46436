export { accessRoutes, begin } from './access.routes.ts';
export type { AccessOptions } from './access.routes.ts';
export { loginsRoutes } from './logins.routes.ts';
export { printLinks } from './announce.ts';
export { hashPassword, useCheapHashes } from './passwords.ts';
export { registerLocalStrategy } from './sign-in.ts';
export { pushRoutes } from './push.routes.ts';
export { wakePhones } from './push.service.ts';
export type { PushRules } from './push.service.ts';
