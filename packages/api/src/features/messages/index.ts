export { sendDueMessages, takeUpLeft } from './deliver.service.ts';
export type { DeliveryParts } from './deliver.service.ts';
export { eraseMessages, moveMessages } from './erase.service.ts';
export { queueMessage } from './queue-message.service.ts';
export type { MessageEvent } from './queue-message.service.ts';
export { queueWindow } from './queue-window.service.ts';
export { StopTokens } from './stop-tokens.ts';
