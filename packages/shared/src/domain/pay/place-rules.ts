import { exact, greatest, hoursOf, sum, type Exact } from '../money/exact.ts';
import { overtimeRuleSet, type OvertimeRuleSet } from './overtime-rule-sets.ts';
import type { PayRules, PersonPlace } from './pay-week.types.ts';
import type { WorkSpan } from './work-spans.ts';

/** What runs beside the federal rules for one person in one week. */
export interface PlaceRules {
  ruleSet: OvertimeRuleSet;
  /** Dollars an hour; where the wage rises inside the week, its average over the hours worked. */
  minimumWage: Exact;
}

/**
 * The rules of the place a person works in, or the company's. Of the company's and the place's minimum wage the higher
 * holds, each hour at the wage of its own day (29 USC 218(a)).
 */
export function placeRules(rules: PayRules, place: PersonPlace | null, spans: readonly WorkSpan[]): PlaceRules {
  const company = exact(rules.minimumWage);
  if (place === null) return { ruleSet: overtimeRuleSet(rules.overtimeRuleSet), minimumWage: company };
  const wages = new Map<string, Exact>();
  const wageOn = (date: string): Exact => {
    const known = wages.get(date) ?? greatest(company, wageOf(place, date));
    wages.set(date, known);
    return known;
  };
  const hours = hoursOf(spans.reduce((total, span) => total + span.to - span.from, 0));
  const floor = sum(spans.map((span) => wageOn(span.date).mul(hoursOf(span.to - span.from))));
  return { ruleSet: place.ruleSet, minimumWage: hours.gt(0) ? floor.div(hours) : company };
}

function wageOf({ minimumWages }: PersonPlace, date: string): Exact {
  let amount = exact(0);
  let since = '';
  for (const wage of minimumWages) {
    if (wage.startsOn > date || wage.startsOn < since) continue;
    since = wage.startsOn;
    amount = exact(wage.amount);
  }
  return amount;
}
