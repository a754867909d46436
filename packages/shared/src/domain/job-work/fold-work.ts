import { isBefore } from '../time/zone.ts';
import type { StepRef } from './step.ts';
import { stepKey } from './step.ts';

export const workKinds = [
  'confirm',
  'tick',
  'untick',
  'start_line',
  'stop_line',
  'used',
  'note',
  'go_on',
  'key_taken',
  'key_back',
] as const;
export type WorkKind = (typeof workKinds)[number];

/** One press at the car. Nothing is overwritten: the state is what these add up to. */
export interface WorkEvent {
  id: string;
  kind: WorkKind;
  /** When it was pressed, by the corrected clock of the phone. */
  at: string;
  by: string;
  steps: StepRef[];
  lineId: string | null;
  /** For a confirmation its must-knows, for going on without what is missing that. */
  keys: string[];
  /** What was used, noted, or the reason. */
  words: string;
}

export interface Mark {
  at: string;
  by: string;
}

export interface WorkState {
  /** By step key: who ticked it first, and when. */
  ticks: Map<string, Mark>;
  confirmedKeys: string[];
  confirmed: Mark | null;
  /** Spans of each line's timer; an open one has no end. */
  runs: Map<string, { from: string; to: string | null }[]>;
  used: (Mark & { lineId: string | null; words: string })[];
  notes: (Mark & { words: string })[];
  wentOn: (Mark & { keys: string[]; words: string }) | null;
  /** Null when no key is out. */
  keyOut: (Mark & { words: string }) | null;
}

interface Frame {
  /** When Start work was pressed; null before. */
  startedAt: string | null;
  /** The step keys of each line, to know when it is through. */
  stepsOf: ReadonlyMap<string, readonly string[]>;
}

/**
 * What has been done at a visit, from its presses in the order in which they were pressed, whichever phone sent first.
 * A line's timer runs from its start, or from when the line before ended, until its last step is ticked or it is stopped.
 */
export function foldWork(events: readonly WorkEvent[], { startedAt, stepsOf }: Frame): WorkState {
  const state: WorkState = {
    ...{ ticks: new Map(), confirmedKeys: [], confirmed: null, runs: new Map(), used: [], notes: [] },
    ...{ wentOn: null, keyOut: null },
  };
  let freeSince = startedAt;
  const isRunning = (lineId: string) => state.runs.get(lineId)?.at(-1)?.to === null;
  const start = (lineId: string, from: string) => {
    if (!isRunning(lineId)) state.runs.set(lineId, [...(state.runs.get(lineId) ?? []), { from, to: null }]);
  };
  const stop = (lineId: string, at: string) => {
    const run = state.runs.get(lineId)?.at(-1);
    if (run?.to !== null) return;
    run.to = at;
    freeSince = at;
  };
  const tick = (ref: StepRef, mark: Mark) => {
    if (state.ticks.has(stepKey(ref))) return;
    start(ref.lineId, freeSince ?? mark.at);
    state.ticks.set(stepKey(ref), mark);
    if ((stepsOf.get(ref.lineId) ?? []).every((key) => state.ticks.has(key))) stop(ref.lineId, mark.at);
  };
  for (const event of inOrder(events)) {
    const mark = { at: event.at, by: event.by };
    if (event.kind === 'tick') for (const ref of event.steps) tick(ref, mark);
    if (event.kind === 'untick') for (const ref of event.steps) state.ticks.delete(stepKey(ref));
    if (event.kind === 'start_line' && event.lineId) start(event.lineId, event.at);
    if (event.kind === 'stop_line' && event.lineId) stop(event.lineId, event.at);
    if (event.kind === 'confirm') {
      state.confirmedKeys = [...new Set([...state.confirmedKeys, ...event.keys])];
      state.confirmed = mark;
    }
    if (event.kind === 'used') state.used.push({ ...mark, lineId: event.lineId, words: event.words });
    if (event.kind === 'note') state.notes.push({ ...mark, words: event.words });
    if (event.kind === 'go_on') state.wentOn = { ...mark, keys: event.keys, words: event.words };
    if (event.kind === 'key_taken') state.keyOut = { ...mark, words: event.words };
    if (event.kind === 'key_back') state.keyOut = null;
  }
  return state;
}

function inOrder(events: readonly WorkEvent[]): WorkEvent[] {
  return [...events].sort((a, b) => (a.at === b.at ? 0 : isBefore(a.at, b.at) ? -1 : 1));
}

/** Minutes a line's timer has run, rounded down. */
export function minutesRun(runs: readonly { from: string; to: string | null }[] | undefined, now: string): number {
  const ms = (runs ?? []).reduce((sum, run) => sum + Date.parse(run.to ?? now) - Date.parse(run.from), 0);
  return Math.max(0, Math.floor(ms / 60_000));
}
