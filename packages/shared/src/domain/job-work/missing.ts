import type { WorkState } from './fold-work.ts';
import { stepKey } from './step.ts';
import type { WorkLine } from './work-plan.ts';

export interface Missing {
  /** Names what is missing, for the reason that is given to go on without. */
  key: string;
  words: string;
}

/** What a service demands before Done: the steps the owner marked, and a note where the owner asks for one. */
export function missingForDone(lines: readonly WorkLine[], state: Pick<WorkState, 'ticks' | 'notes'>): Missing[] {
  const steps = lines.flatMap((line) =>
    line.steps
      .filter((step) => step.isAlone && !state.ticks.has(stepKey({ lineId: line.lineId, stepId: step.id })))
      .map((step) => ({
        key: stepKey({ lineId: line.lineId, stepId: step.id }),
        words: line.vehicle ? `${step.words} (${line.vehicle})` : step.words,
      })),
  );
  const asking = lines.filter((line) => line.asksNote);
  if (asking.length === 0 || state.notes.length > 0) return steps;
  return [...steps, { key: 'note', words: `A note on ${asking.map((line) => line.serviceName).join(' and ')}` }];
}

/** What is still missing after somebody said why the job goes on without some of it. */
export function stillMissing(missing: readonly Missing[], wentOnWithout: readonly string[]): Missing[] {
  return missing.filter((one) => !wentOnWithout.includes(one.key));
}
