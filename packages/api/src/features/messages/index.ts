export { sendDueMessages, takeUpLeft } from './deliver.service.ts';
export type { DeliveryParts } from './deliver.service.ts';
export { queueTimely } from './due.service.ts';
export { eraseMessages, moveMessages } from './erase.service.ts';
export { messagesRoutes } from './messages.routes.ts';
export type { HookSecrets } from './messages.routes.ts';
export { queueMessage } from './queue-message.service.ts';
export { queueWindow } from './queue-window.service.ts';
export { StopTokens } from './stop-tokens.ts';
