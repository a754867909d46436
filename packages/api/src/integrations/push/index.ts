export { pushKeys } from './keys.ts';
export type { PushKeys } from './keys.ts';
export { sendPush } from './send.ts';
export type { PushTarget } from './send.ts';
