import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';

const SHARE = 'The share of ';

/**
 * A line of shared work as its own person may carry it away: the own share, without the whole amount and the others'
 * weights or minutes, from which their pay could be worked out.
 */
export function ownPart(line: PayLine): PayLine {
  const share = line.working.findIndex((step) => step.label.startsWith(SHARE));
  if (share < 0) return line;
  return {
    ...line,
    working: line.working
      .slice(share)
      .map((step, index) => (index > 0 ? step : { ...step, note: 'Shared in the crew', arithmetic: 'own share' })),
  };
}

/** How a locked line was worked, in words and figures; ids of the records behind it stay inside. */
export function workingOf(line: PayLine) {
  const { key, kind, label, workedOn, jobNumber, amountCents, isPayable, rule } = line;
  const steps = ownPart(line).working.map(({ sources: _inside, ...step }) => step);
  return { key, kind, label, workedOn, jobNumber, amountCents, isPayable, rule, steps };
}
