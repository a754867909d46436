import { z } from 'zod';
import { decimal } from '../../../contracts/fields.ts';

/**
 * Pay for a day cut short, and for a trip to a door that nobody opened. Reporting time is the law of states and towns,
 * so hours and amounts are the owner's to enter; the federal rule only says how they count (29 CFR 778.220).
 */
export const showUpRule = z.discriminatedUnion('pays', [
  /** Up to so many hours on a day a person came and worked less. */
  z.strictObject({
    pays: z.literal('show_up'),
    hours: decimal
      .refine((value) => Number(value) > 0, 'Give hours above zero.')
      .refine((value) => Number(value) <= 12, 'At most 12 hours.'),
  }),
  /** A fixed amount for a visit called off after arrival because nobody was home: each person's, or shared. */
  z.strictObject({
    pays: z.literal('no_show_trip'),
    dollars: decimal.refine((value) => Number(value) > 0, 'Give an amount above zero.'),
    isShared: z.boolean(),
  }),
  /** No such pay from this start on. */
  z.strictObject({ pays: z.literal('nothing'), of: z.enum(['show_up', 'no_show_trip']) }),
]);
export type ShowUpRule = z.infer<typeof showUpRule>;
export type ShowUpPayKind = 'show_up' | 'no_show_trip';

export interface DatedShowUpRule {
  id: string;
  /** Null for the company's; a place's own goes before it. */
  placeId: string | null;
  startsOn: string;
  rule: ShowUpRule;
}

export function showUpKindOf(rule: ShowUpRule): ShowUpPayKind {
  return rule.pays === 'nothing' ? rule.of : rule.pays;
}

/** The rule of a kind on a day: the place's before the company's, then the latest that had started; null for none. */
export function showUpRuleOn<K extends ShowUpPayKind>(
  rules: readonly DatedShowUpRule[],
  kind: K,
  placeId: string | null,
  on: string,
): (DatedShowUpRule & { rule: Extract<ShowUpRule, { pays: K }> }) | null {
  const answers = rules
    .filter((own) => showUpKindOf(own.rule) === kind && own.startsOn <= on)
    .filter((own) => own.placeId === null || own.placeId === placeId)
    .sort((a, b) => rank(b).localeCompare(rank(a)));
  const [best] = answers;
  return best?.rule.pays === kind ? (best as DatedShowUpRule & { rule: Extract<ShowUpRule, { pays: K }> }) : null;
}

function rank({ placeId, startsOn, id }: DatedShowUpRule): string {
  return `${placeId === null ? 0 : 1} ${startsOn} ${id}`;
}

export function showUpRuleWords(rule: ShowUpRule): string {
  switch (rule.pays) {
    case 'show_up':
      return `Up to ${rule.hours} h for a day with less work`;
    case 'no_show_trip':
      return `${rule.dollars} a trip, ${rule.isShared ? 'shared in the crew' : 'to each of the crew'}`;
    case 'nothing':
      return 'None';
  }
}
