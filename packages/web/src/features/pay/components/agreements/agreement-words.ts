import type { AgreementDto, RefundReasonDto } from '@driprail/shared/contracts/pay-agreements.contract';

export const agreementWords: Record<AgreementDto['kind'], { label: string; caution: string }> = {
  refunds: {
    label: 'Refunds lower commission',
    caution:
      'A refund may lower only the commission of the week it becomes known in, by a plan signed before (29 CFR 778.121). California asks for a signed copy of every commission plan (Labor Code 2751).',
  },
  rate_in_effect: {
    label: 'Overtime by the rate in effect',
    caution:
      'Overtime then is one and a half times the rate of the work done in the overtime hours, by an agreement made before that work (29 USC 207(g)(2)). It holds for people paid by dated hourly rates under the federal rules alone, and only where every rate is at least the minimum wage.',
  },
};

/** Of each name the row that holds on a day. */
export function reasonsOn(reasons: readonly RefundReasonDto[], day: string): RefundReasonDto[] {
  const newest = new Map<string, RefundReasonDto>();
  for (const reason of [...reasons].sort((a, b) => a.startsOn.localeCompare(b.startsOn)))
    if (reason.startsOn <= day) newest.set(reason.name.toLowerCase(), reason);
  return [...newest.values()].sort((a, b) => a.name.localeCompare(b.name));
}
