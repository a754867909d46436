import type { PayLine, WorkingStep } from '@driprail/shared/domain/pay/pay-week.types';

/** How the engine names the step that shares work or a tip in a crew, and how it writes a share. */
const SHARE_STEP = 'The share of ';
const SHARE_WORDS = /^(half|1 of \d+ equal shares|\S+ of \S+ (minutes|parts)) of -?[\d,]+\.\d\d$/;

/**
 * A line of shared work as its own person may carry it away: the own share, without the whole amount and the others'
 * weights or minutes, from which their pay could be worked out.
 */
export function ownPart(line: PayLine): PayLine {
  const share = line.working.findIndex((step) => step.label.startsWith(SHARE_STEP));
  return { ...line, working: line.working.slice(Math.max(0, share)).map(withoutOthers) };
}

function withoutOthers(step: WorkingStep): WorkingStep {
  if (!SHARE_WORDS.test(step.arithmetic)) return step;
  return { ...step, note: 'Shared in the crew', arithmetic: 'own share' };
}

/** How a locked line was worked, in words and figures; ids of the records behind it stay inside. */
export function workingOf(line: PayLine) {
  const { key, kind, label, workedOn, jobNumber, amountCents, isPayable, rule } = line;
  const steps = ownPart(line).working.map(({ sources: _inside, ...step }) => step);
  return { key, kind, label, workedOn, jobNumber, amountCents, isPayable, rule, steps };
}
