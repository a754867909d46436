import type { Progress } from '../board/progress.ts';
import type { MessageKind } from './kinds.ts';

/** What a message looks at just before it goes out. */
export interface MessageStanding {
  kind: MessageKind;
  /** Of the visit it is about, or of the job's visits together; null where none is left. */
  progress: Progress | null;
  windowFrom: string | null;
  windowTo: string | null;
  /** The window that a booked or moved message told last. */
  told: { windowFrom: string | null; windowTo: string | null } | null;
  /** Whether the press or record that caused it has been taken back. */
  isUndone: boolean;
  hasFeedback: boolean;
  lastMoment: string | null;
}

/** Why a message is no longer true and must not go out, in a sentence; null: it may. */
export function overtakenBy(now: string, s: MessageStanding): string | null {
  if (s.isUndone) return 'It was taken back before it went out.';
  if (s.kind !== 'called_off' && s.progress === 'called_off' && aboutTheVisit.includes(s.kind))
    return 'The visit was called off.';
  if (s.kind === 'on_the_way' && s.progress !== 'on_the_way') return 'The crew had arrived already.';
  if (s.kind === 'called_off' && s.progress !== 'called_off') return 'The visit stands again.';
  if (s.kind === 'reminder' && s.progress !== null && !['unplaced', 'placed'].includes(s.progress))
    return 'The visit had begun already.';
  if ((s.kind === 'booked' || s.kind === 'moved') && !s.windowFrom) return 'The arrival window was taken away.';
  if (s.kind === 'moved' && s.told && isSame(s.told, s)) return 'The customer knows this time already.';
  if (s.kind === 'feedback' && s.hasFeedback) return 'The customer has said how it went.';
  if (s.lastMoment && Date.parse(now) >= Date.parse(s.lastMoment)) return 'It was too late to be of use.';
  return null;
}

const aboutTheVisit: MessageKind[] = ['booked', 'moved', 'reminder', 'on_the_way', 'feedback'];

function isSame(a: { windowFrom: string | null; windowTo: string | null }, b: typeof a): boolean {
  return time(a.windowFrom) === time(b.windowFrom) && time(a.windowTo) === time(b.windowTo);
}

const time = (instant: string | null) => (instant ? Date.parse(instant) : null);
