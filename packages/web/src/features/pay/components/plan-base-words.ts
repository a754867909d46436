import type { PayPlanDto } from '@driprail/shared/contracts/pay-plans.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { shortText } from '@driprail/shared/domain/money/rounding';
import type { PayPlan } from '@driprail/shared/domain/pay/plans/pay-plan';
import { rateText } from './ledger.ts';

const percent = (value: string): string => `${shortText(exact(value))}%`;
const modeWords = { marginal: 'marginal', whole: 'on the whole' };

/** How a plan pays, in a few words: "900.00 weekly for 45 h a week". */
export function basePlanWords({ base }: PayPlan): string {
  switch (base.kind) {
    case 'hourly':
      return `${rateText(base.hourly)} an hour`;
    case 'hourly_plus_percent':
      return `${rateText(base.hourly)} an hour, ${percent(base.percent)} of each line`;
    case 'flat_with_floor':
      return `Flat per line, at least ${rateText(base.floor)} an hour`;
    case 'percent_with_floor':
      return `${percent(base.percent)} of each line, at least ${rateText(base.floor)} an hour`;
    case 'salary':
      return `${rateText(base.amount)} ${base.period} for ${shortText(exact(base.coversHours))} h a week`;
    case 'weekly_guarantee':
      return `${rateText(base.hourly)} an hour, ${percent(base.percent)}, at least ${rateText(base.weekly)} a week`;
    case 'better_of':
      return `The better of ${rateText(base.hourly)} an hour and ${percent(base.percent)}`;
    case 'draw':
      return `${percent(base.percent)} of each line, draw of ${rateText(base.weekly)} a week`;
    case 'tiered_percent': {
      const tiers = base.tiers.map((tier) => `${percent(tier.percent)} over ${rateText(tier.over)}`).join(', ');
      return `${tiers}, ${modeWords[base.mode]}, by the ${base.period}`;
    }
    case 'day_rate':
      return `${rateText(base.daily)} a day`;
    case 'job_rate':
      return `${rateText(base.perJob)} a job`;
    case 'rates':
      return 'By the dated rates';
  }
}

/** The plan of a person on a day; null where the dated rates pay. */
export function planOn(plans: readonly PayPlanDto[], personId: string, day: string): PayPlanDto | null {
  const started = plans.filter((plan) => plan.personId === personId && plan.startsOn <= day);
  const newest = started.sort((a, b) => b.startsOn.localeCompare(a.startsOn))[0];
  return newest && newest.plan.base.kind !== 'rates' ? newest : null;
}
