import { centsText } from '../money/rounding.ts';
import { dayOf } from '../time/zone.ts';
import { isShared, shareTip, shareWords } from './crew-shares.ts';
import { aLine } from './pay-line.ts';
import type { CrewSplit, PayLine, PayPerson, PayTip, WorkingStep } from './pay-week.types.ts';

/**
 * A person's part of each tip. Tips are outside the regular rate (29 CFR 531.60); cash kept on the spot is shown and
 * adds nothing to what is to be paid.
 */
export function tipLines(person: PayPerson, tips: readonly PayTip[], split: CrewSplit, zone: string): PayLine[] {
  return tips.flatMap((tip) => {
    const shares = shareTip(tip.amountCents, tip.crew, split);
    const amountCents = shares.find((item) => item.personId === person.id)?.cents ?? 0;
    if (amountCents === 0) return [];
    const source: WorkingStep['sources'] = [{ kind: 'tip', id: tip.id, label: `Tip on job ${tip.jobNumber}` }];
    const working: WorkingStep[] = [
      {
        label: 'The tip',
        note: `Job ${tip.jobNumber}, ${METHOD_WORDS[tip.method]}. Tips belong to the crew`,
        arithmetic: centsText(tip.amountCents),
        result: centsText(tip.amountCents),
        sources: source,
      },
    ];
    if (isShared(shares)) {
      working.push({
        label: `The share of ${person.name}`,
        note: `Shared by the ${shares.length} who may have a part`,
        arithmetic: `${shareWords(shares, person.id, split)} of ${centsText(tip.amountCents)}`,
        result: centsText(amountCents),
        sources: source,
      });
    }
    return [
      aLine({
        key: `tip:${tip.id}`,
        personId: person.id,
        kind: tip.alreadyReceived ? 'tip_already_received' : 'tip',
        label: `Tip, job ${tip.jobNumber}, ${METHOD_WORDS[tip.method]}`,
        workedOn: dayOf(tip.receivedAt, zone),
        amountCents,
        isPayable: !tip.alreadyReceived,
        jobId: tip.jobId,
        jobNumber: tip.jobNumber,
        rule: 'Tips belong to the crew; 29 USC 203(m)(2)(B), 29 CFR 531.60',
        working,
      }),
    ];
  });
}

const METHOD_WORDS: Record<PayTip['method'], string> = {
  card: 'by card',
  cash: 'in cash',
  invoice: 'with the invoice',
};
