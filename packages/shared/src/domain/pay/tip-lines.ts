import { dollars, ZERO, type Exact } from '../money/exact.ts';
import { centsText, shortText, toCentsUp } from '../money/rounding.ts';
import { dayOf } from '../time/zone.ts';
import { isShared, shareTip, shareWords } from './crew-shares.ts';
import type { OvertimeRuleSet } from './overtime-rule-sets.ts';
import { aLine } from './pay-line.ts';
import type { CrewShare, CrewSplit, PayLine, PayPerson, PayTip, TipRules, WorkingStep } from './pay-week.types.ts';
import { leastCardTip } from './tip-rules.ts';

export interface TipTerms {
  split: CrewSplit;
  zone: string;
  goTo: TipRules['goTo'];
  /** Exact percent. */
  cardFeePercent: Exact;
  place: OvertimeRuleSet;
}

/**
 * A person's part of each tip. Tips are outside the regular rate (29 CFR 531.60); cash kept on the spot is shown and
 * adds nothing to what is to be paid.
 */
export function tipLines(person: PayPerson, tips: readonly PayTip[], terms: TipTerms): PayLine[] {
  const { split, zone } = terms;
  return tips.flatMap((tip) => {
    const shares = shareTip(tip.amountCents, ownersOf(tip, terms), split);
    const shareCents = shares.find((item) => item.personId === person.id)?.cents ?? 0;
    if (shareCents === 0) return [];
    const fee = tip.method === 'card' ? terms.cardFeePercent : ZERO;
    const amountCents = toCentsUp(leastCardTip(dollars(shareCents), fee, terms.place));
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
        result: centsText(shareCents),
        sources: source,
      });
    }
    if (amountCents < shareCents) {
      working.push({
        label: 'Less the card fee',
        note: 'What the card really costs, where the place allows it; up to the next cent (DOL Fact Sheet #15)',
        arithmetic: `${centsText(shareCents)} less ${shortText(fee)} %`,
        result: centsText(amountCents),
        sources: [],
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

/** A tip meant for one of the crew is that person's alone, where the rule says so. */
function ownersOf({ crew, forPersonId }: PayTip, { goTo }: TipTerms): readonly CrewShare[] {
  const named = goTo === 'person' ? crew.filter((member) => member.personId === forPersonId) : [];
  return named.length > 0 ? named : crew;
}

const METHOD_WORDS: Record<PayTip['method'], string> = {
  card: 'by card',
  cash: 'in cash',
  invoice: 'with the invoice',
};
