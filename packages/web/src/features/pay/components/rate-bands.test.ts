import { describe, expect, test } from 'vitest';
import type { PayRulesDto, RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import { planWords, ratesOn, rulesOn } from './plan-words.ts';
import { rateRows, ruleRows } from './rate-bands.ts';
import { timeAxis } from './time-axis.ts';

const aRate = (parts: Partial<RateDto>): RateDto => ({
  id: 'r',
  kind: 'hourly',
  personId: 'sefa',
  personName: 'Sefa Lund',
  serviceId: null,
  serviceName: null,
  clockKind: null,
  value: '19.5',
  startsOn: '2026-03-01',
  setBy: 'Rowan Tern',
  ...parts,
});
const company = { personId: null, personName: null };
const polish = { kind: 'commission_percent' as const, serviceId: 'polish', serviceName: 'One-step polish' };
const rates = [
  aRate({ id: 'old', value: '18.6', startsOn: '2025-09-01' }),
  aRate({ id: 'now' }),
  aRate({ id: 'next', value: '20', startsOn: '2026-07-01' }),
  aRate({ ...polish, ...company, id: 'six', value: '6' }),
  aRate({ ...polish, id: 'eight', value: '8' }),
  aRate({ id: 'other', personId: 'idris' }),
];

describe('bands', () => {
  test('each starts where the one before stops, and knows whether it is past, now or to come', () => {
    const [hourly] = rateRows(rates, 'sefa', '2026-05-14');
    expect(hourly?.bands.map(({ value, from, to, state }) => [value, from, to, state])).toEqual([
      ['18.60', '2025-09-01', '2026-03-01', 'past'],
      ['19.50', '2026-03-01', '2026-07-01', 'now'],
      ['20.00', '2026-07-01', null, 'next'],
    ]);
  });

  test('a person’s rows come first, the company’s after, and nobody else’s', () => {
    expect(rateRows(rates, 'sefa', '2026-05-14').map((row) => [row.title, row.note])).toEqual([
      ['By the hour', 'all worked time'],
      ['Commission', 'One-step polish'],
      ['Commission', 'One-step polish, company-wide'],
    ]);
    expect(rateRows(rates, null, '2026-05-14')).toHaveLength(1);
  });

  test('a rule that did not change makes no new band', () => {
    const rule = (startsOn: string, minimumWage: string): PayRulesDto => ({
      id: startsOn,
      startsOn,
      overtimeRuleSet: 'us_federal',
      minimumWage,
      crewSplit: 'equal',
      mealBreakMinutes: 30,
      punchRoundingMinutes: null,
      premiumRounding: 'half_up' as const,
      commissionEarned: 'done' as const,
      tipsGoTo: 'crew' as const,
      tipCardFeePercent: '0',
      workweekStartsOn: 1,
      workweekStartsAt: '00:00',
      setBy: '',
    });
    const rules = [rule('2025-01-01', '7.25'), rule('2026-01-01', '12')];
    const rows = ruleRows(rules, '2026-05-14', '12');
    expect(rows.find((row) => row.key === 'minimum')?.bands.map((band) => band.value)).toEqual(['7.25', '12.00']);
    expect(rows.find((row) => row.key === 'split')?.bands).toHaveLength(1);
    expect(rows.find((row) => row.key === 'week')?.bands[0]?.value).toBe('Monday 12:00 am');
    expect(rulesOn(rules, '2024-05-14')?.minimumWage).toBe('7.25');
  });
});

describe('how a person is paid, in words', () => {
  test('one’s own rates go before the company’s', () => {
    expect(planWords(rates, 'sefa', '2026-05-14')).toBe('19.50 an hour, 8% on 1 service');
    expect(planWords(rates, 'idris', '2026-05-14', true)).toBe('Hourly, 6% on 1 service');
    expect(planWords(rates, 'nobody', '2025-01-01')).toBe('No hourly rate');
  });

  test('the newest that has started is in force', () => {
    expect(ratesOn(rates, '2026-05-14').map((rate) => rate.id)).toEqual(['now', 'six', 'eight', 'other']);
  });
});

describe('the axis', () => {
  test('runs by quarters around today', () => {
    const axis = timeAxis(['2025-09-01', '2026-07-01'], '2026-05-14');
    expect([axis.from, axis.to]).toEqual(['2025-07-01', '2027-01-01']);
    expect(axis.ticks.map((tick) => tick.label)).toEqual(['Jul 2025', 'Oct', 'Jan 2026', 'Apr', 'Jul', 'Oct']);
    expect([axis.at('2025-07-01'), axis.at('2027-01-01'), axis.at('2030-01-01')]).toEqual([0, 100, 100]);
  });

  test('goes back two years at most', () => {
    expect(timeAxis(['2019-01-01'], '2026-05-14').from).toBe('2024-04-01');
  });
});
