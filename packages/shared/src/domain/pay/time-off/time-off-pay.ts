import { exact } from '../../money/exact.ts';
import { centsText, shortText, toCents } from '../../money/rounding.ts';
import { formatDay } from '../../time/format.ts';
import type { PayAdjustment, PayLine, WorkingStep } from '../pay-week.types.ts';
import { rateText } from '../working-words.ts';
import { timeOffKindNames, type TimeOffKind } from './time-off-rule.ts';

/** What stands beside the amount of an adjustment that pays hours off. */
export interface TimeOffTaken {
  kind: TimeOffKind;
  /** Exact hours, "n/d" or "n". */
  hours: string;
  /** Company-zone date. */
  on: string;
  /** Dollars an hour, decimal or "n/d". */
  rate: string;
  ruleId: string;
  /** The rule and the rate as they stood when the hours were taken, in words. */
  ruleWords: string;
  rateWords: string;
}

const TIME_OFF_RULE = '29 CFR 778.218, 778.219';

/** Hours times the rate, rounded once, half up. */
export function timeOffCents({ hours, rate }: Pick<TimeOffTaken, 'hours' | 'rate'>): number {
  return toCents(exact(hours).mul(exact(rate)));
}

/** What a pay line of hours off shows beside what every adjustment shows. */
export function timeOffParts(
  { id, amountCents }: PayAdjustment,
  { kind, hours, on, rate, ruleId, ruleWords, rateWords }: TimeOffTaken,
): Pick<PayLine, 'label' | 'workedOn' | 'hours' | 'rate' | 'rule' | 'working'> {
  const name = timeOffKindNames[kind];
  const taken = `${shortText(exact(hours))} h`;
  const working: WorkingStep[] = [
    {
      label: `${name} hours taken`,
      note: `${formatDay(on)}. By the rule: ${ruleWords}`,
      arithmetic: taken,
      result: taken,
      sources: [{ kind: 'rule', id: ruleId, label: ruleWords }],
    },
    {
      label: 'At this much an hour',
      note: `${rateWords}. Not hours worked: outside the regular rate, overtime and the minimum wage`,
      arithmetic: `${taken} times ${rateText(rate)}`,
      result: centsText(amountCents),
      sources: [{ kind: 'adjustment', id, label: `${name}, ${formatDay(on)}` }],
    },
  ];
  return { label: `Paid time off, ${name.toLowerCase()}`, workedOn: on, hours, rate, rule: TIME_OFF_RULE, working };
}
