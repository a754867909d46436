import type { OutgoingText, Texts } from './texts.ts';

export interface TakenText extends OutgoingText {
  at: string;
}

const KEPT = 100;

/** The local fake: takes each key once and keeps the last hundred. */
export function localTexts(now: () => Date): Texts & { taken: () => TakenText[] } {
  const taken: TakenText[] = [];
  return {
    send(text) {
      if (!taken.some(({ key }) => key === text.key)) taken.unshift({ ...text, at: now().toISOString() });
      taken.length = Math.min(taken.length, KEPT);
      return Promise.resolve();
    },
    taken: () => taken,
  };
}
