import type { CompanySettings, Message } from '../../db/models/index.ts';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { PlaceholderValues } from '@driprail/shared/domain/messages/placeholders';
import { centsText } from '@driprail/shared/domain/money/rounding';
import { formatClock, formatDay, formatSpan } from '@driprail/shared/domain/time/format';
import { addMinutes, dayOf } from '@driprail/shared/domain/time/zone';

/** A crew that leaves after its planned start is expected so much later. The house's guess, no source. */
const LATE_MINUTES = 15;

export interface ValueFacts {
  company: CompanySettings;
  customer: { name: string; isCompany: boolean };
  visit: VisitDto | null;
  vanName: string;
  link: string;
  amountCents: number;
  now: Date;
}

/** What a template's placeholders become. Neither a street nor a code is among them, and no phone but the company's. */
export function messageValues(facts: ValueFacts): PlaceholderValues {
  const { company, customer, visit, link } = facts;
  const { zone, clock } = company;
  const { windowFrom = null, windowTo = null, from = null } = visit ?? {};
  const start = windowFrom ?? from;
  const crew = (visit?.crew ?? []).map(({ name }) => firstName(name));
  return {
    name: customer.isCompany ? customer.name : firstName(customer.name),
    company: company.name,
    phone: company.phone === '' ? company.name : company.phone,
    window: windowFrom && windowTo ? formatSpan(windowFrom, windowTo, zone, clock) : 'a time to be agreed',
    day: start ? formatDay(dayOf(start, zone)) : 'a day to be agreed',
    services: [...new Set((visit?.lines ?? []).map(({ serviceName }) => serviceName))].join('\n'),
    crew: crew.length > 0 ? listed(crew) : 'Our crew',
    van: facts.vanName === '' ? 'of the company' : facts.vanName,
    link,
    amount: centsText(facts.amountCents),
    estimate: formatClock(expectedAt(from, facts.now), zone, clock),
  };
}

/** The visit's own amount, or what is owed where none was noted. */
export function amountOf(message: Pick<Message, 'amountCents'>, owedCents: number): number {
  return message.amountCents ?? Math.max(0, owedCents);
}

function expectedAt(planned: string | null, now: Date): string {
  const late = addMinutes(now.toISOString(), LATE_MINUTES);
  return planned && Date.parse(planned) > now.getTime() ? planned : late;
}

function firstName(name: string): string {
  return name.trim().split(/\s+/)[0] ?? '';
}

function listed(names: string[]): string {
  return names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
}
