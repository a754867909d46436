import { addDays } from '../../../time/zone.ts';
import type { DatedTimeOffRule } from '../time-off-rule.ts';
import type { LedgerInput } from '../time-off-ledger.ts';

/** Plain fractions of whole numbers, written apart from the product's exact numbers. */
type Plain = readonly [n: bigint, d: bigint];

function gcd(a: bigint, b: bigint): bigint {
  return b === 0n ? (a < 0n ? -a : a) : gcd(b, a % b);
}

function plain(n: bigint, d: bigint): Plain {
  const by = gcd(n, d) || 1n;
  return [n / by, d / by];
}

function read(text: string): Plain {
  const [top = '0', bottom = '1'] = text.split('/');
  const [whole = '0', part = ''] = top.split('.');
  return plain(BigInt(whole + part), BigInt(bottom) * 10n ** BigInt(part.length));
}

const add = ([a, b]: Plain, [c, d]: Plain): Plain => plain(a * d + c * b, b * d);
const over = ([a, b]: Plain, [c, d]: Plain): Plain => plain(a * d, b * c);
const isMore = ([a, b]: Plain, [c, d]: Plain): boolean => a * d > c * b;
const negative = ([a, b]: Plain): Plain => [-a, b];

/** The balance at each week's end, worked out day by day as somebody would on paper. */
export function naiveBalances({ rules, kind, personId, weeks, taken, adjustments }: LedgerInput): string[] {
  const ruleOn = (on: string): DatedTimeOffRule | undefined => {
    const started = rules.filter((rule) => rule.kind === kind && rule.startsOn <= on);
    const own = started.filter((rule) => rule.personId === personId);
    const list = own.length > 0 ? own : started.filter((rule) => rule.personId === null);
    return list.sort((a, b) => (a.startsOn + a.id < b.startsOn + b.id ? 1 : -1))[0];
  };
  let balance: Plain = [0n, 1n];
  const comeIn = (hours: Plain, on: string): void => {
    const cap = ruleOn(on)?.rule.capHours ?? null;
    const next = add(balance, hours);
    if (cap === null || !isMore(next, read(cap))) balance = next;
    else if (!isMore(balance, read(cap))) balance = read(cap);
  };
  return weeks.map((week, index) => {
    for (let on = week.startsOn; on <= week.endsOn; on = addDays(on, 1)) {
      const rule = ruleOn(on)?.rule;
      if (rule && on.slice(5) === rule.yearStartsOn) {
        if (rule.carryHours !== null && isMore(balance, read(rule.carryHours))) balance = read(rule.carryHours);
        if (rule.earning.by === 'year') comeIn(read(rule.earning.hours), on);
      }
      if (rule?.earning.by === 'holidays')
        for (const date of rule.earning.dates) if (date.on === on) comeIn(read(rule.earning.hours), on);
      const isFirst = index === 0 && on === week.startsOn;
      for (const move of adjustments)
        if (move.on === on || (isFirst && move.on < on)) balance = add(balance, read(move.hours));
      for (const move of taken) if (move.on === on) balance = add(balance, negative(read(move.hours)));
      if (on === week.endsOn) {
        const earning = ruleOn(week.startsOn)?.rule.earning;
        if (earning?.by === 'hours_worked') comeIn(over(read(week.hoursWorked), read(earning.perHours)), on);
      }
    }
    return balance[1] === 1n ? String(balance[0]) : `${balance[0]}/${balance[1]}`;
  });
}
