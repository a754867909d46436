export { localTexts } from './local-texts.ts';
export type { TakenText } from './local-texts.ts';
export type { OutgoingText, Texts } from './texts.ts';
