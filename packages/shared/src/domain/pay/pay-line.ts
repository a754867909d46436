import type { PayLine } from './pay-week.types.ts';

type Required = 'key' | 'personId' | 'kind' | 'label' | 'amountCents' | 'rule' | 'working';

/** A pay line with what most lines leave empty filled in: payable, outside the regular rate, tied to no job. */
export function aLine(parts: Pick<PayLine, Required> & Partial<PayLine>): PayLine {
  return {
    workedOn: null,
    hours: null,
    rate: null,
    isPayable: true,
    inRegularRate: false,
    jobId: null,
    jobNumber: null,
    visitId: null,
    correctsLineId: null,
    ...parts,
  };
}

/** Sum of lines in integer cents. */
export function totalCents(lines: readonly PayLine[]): number {
  return lines.reduce((total, line) => total + line.amountCents, 0);
}
