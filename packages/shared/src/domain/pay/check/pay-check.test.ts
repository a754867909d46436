import { describe, expect, it } from 'vitest';
import { checkPay } from './pay-check.ts';

function errorOf(kind: string, inputs: unknown): string {
  const [answer] = checkPay([{ id: 'x', kind, inputs }]);
  if (!answer || 'result' in answer) throw new Error(`Worked out: ${JSON.stringify(answer)}`);
  return answer.error;
}

function resultOf(kind: string, inputs: unknown): Record<string, unknown> {
  const [answer] = checkPay([{ id: 'x', kind, inputs }]);
  if (!answer || 'error' in answer) throw new Error(answer?.error);
  return answer.result;
}

const hourly = { type: 'hourly', hours: '46', rate: '12.00' };

describe('inputs that make no sense', () => {
  it.each([
    ['negative hours', 'week_pay', { hours_worked: '-46', lines: [hourly] }, 'hours_worked may not be negative.'],
    ['words for hours', 'week_pay', { hours_worked: 'forty', lines: [] }, 'hours_worked "forty" is not a number.'],
    [
      'more hours than a week has',
      'week_pay',
      { hours_worked: '169', lines: [hourly] },
      'hours_worked is more than the 168 hours of a week.',
    ],
    [
      'overtime without hours',
      'week_pay',
      { hours_worked: '0', overtime_hours: '5', lines: [] },
      'overtime_hours is more than the hours worked.',
    ],
    [
      'pay for work without hours',
      'week_pay',
      { hours_worked: '0', lines: [{ type: 'piece', amount: '100' }] },
      'hours_worked is 0 though the lines hold pay for work: a regular rate needs hours.',
    ],
    [
      'more hourly hours than worked',
      'week_pay',
      { hours_worked: '40', lines: [hourly] },
      'The hourly lines hold more hours than were worked.',
    ],
    ['an unknown place', 'daily_overtime', { jurisdiction: 'US-ZZ', hours_by_day: ['9'] }, /"US-ZZ" is not known here/],
    [
      'eight days',
      'daily_overtime',
      { jurisdiction: 'US-CA', hours_by_day: Array(8).fill('1') },
      'hours_by_day has more than 7 days.',
    ],
    [
      'a day of 25 hours',
      'daily_overtime',
      { jurisdiction: 'US-CA', hours_by_day: ['25'] },
      'hours_by_day.0 is more than the 24 hours of a day.',
    ],
    [
      'a pay line of no known kind',
      'week_pay',
      { hours_worked: '40', lines: [{ type: 'luck', amount: '5' }] },
      /"luck" is no kind of pay known here/,
    ],
    [
      'a negative wage',
      'week_pay',
      { hours_worked: '40', lines: [{ type: 'hourly', amount: '-5' }] },
      'lines.0.amount may not be negative for "hourly".',
    ],
    [
      'a salary for no hours',
      'salary_rate',
      { salary_weekly: '400', hours_salary_covers: '0' },
      'hours_salary_covers must be more than 0.',
    ],
    [
      'more overtime than work',
      'deferred_allocation',
      { amount: '5', weeks: [{ hours_worked: '5', overtime_hours: '6' }] },
      'A week has more overtime hours than hours worked.',
    ],
    [
      'parts that do not add up',
      'percentage_bonus',
      { hourly_rate: '10', hours_worked: '50', straight_hours: '40', overtime_hours: '5', bonus_percent: '1' },
      'straight_hours and overtime_hours do not add up to hours_worked.',
    ],
    [
      'a shift without length',
      'hours',
      { clock_in: '08:00', clock_out: '08:00' },
      'The shift starts and ends at the same time.',
    ],
    [
      'a break longer than the shift',
      'hours',
      { clock_in: '08:00', clock_out: '09:00', unpaid_meal_minutes: '90' },
      'The breaks are longer than the shift.',
    ],
    [
      'a time that no clock shows',
      'hours',
      { clock_in: '25:00', clock_out: '09:00' },
      'clock_in "25:00" is not a clock time.',
    ],
    [
      'a punch without its other',
      'hours',
      { days: [{ punches: ['08:00', '12:00', '13:00'] }] },
      'days.0.punches has a clock-in without a clock-out.',
    ],
    [
      'segments at the same time',
      'hours',
      {
        segments: [
          { type: 'job', start: '08:00', end: '10:00' },
          { type: 'job', start: '09:00', end: '11:00' },
        ],
      },
      'The segment "job" overlaps another.',
    ],
    ['rounding to the half hour', 'rounding_time', { rounding_minutes: '30', minutes: ['1'] }, /at most 15/],
    [
      'no hours for the minimum wage',
      'minimum_wage_test',
      { amount: '300', hours_worked: '0' },
      'hours_worked is 0: a rate needs hours.',
    ],
    ['a fee above the tip', 'tips', { card_tip: '20', card_fee_percent: '300' }, 'card_fee_percent is more than 100.'],
    [
      'rest as long as the work',
      'ca_piece_rest',
      { piece_pay: '5', hours_worked: '1', rest_minutes: '60' },
      'rest_minutes is as long as the hours worked.',
    ],
    [
      'a bonus over no hours',
      'ca_flat_bonus',
      { hourly_rate: '5', non_overtime_hours: '0', flat_sum_bonus: '5' },
      /non_overtime_hours is 0/,
    ],
    ['an unknown kind', 'constructor', {}, /The kind "constructor" is not known/],
    ['inputs that are no object', 'week_pay', [], 'The scenario needs inputs.'],
  ])('says what is wrong with %s', (_name, kind, inputs, message) => {
    expect(errorOf(kind, inputs)).toMatch(
      typeof message === 'string' ? new RegExp(`^${message.replace(/[.*+?^${}()|[\]\\]/g, '\\$&')}$`) : message,
    );
  });

  it('answers every scenario in its place, whatever the others are', () => {
    expect(
      checkPay([7, { id: 'b', kind: 'workweek_hours', inputs: { weeks: [{ hours_worked: '45' }] } }, { id: 'c' }]),
    ).toMatchObject([
      { id: '#1', error: 'The scenario is no object of id, kind and inputs.' },
      { id: 'b', result: { overtime_hours_by_week: ['5.00'] } },
      { id: 'c', error: 'The scenario needs a kind.' },
    ]);
  });
});

describe('inputs told another way', () => {
  it('reads hours as "h:mm", numbers as numbers, and works out amounts that are left out', () => {
    expect(
      resultOf('week_pay', { hours_worked: '46:30', lines: [{ type: 'hourly', hours: 46.5, rate: 12 }] }),
    ).toMatchObject({ straight_time_total: '558.00', gross_total: '597.00' });
  });

  it('decides by the kind of pay what belongs in the regular rate (29 CFR 778.208, 531.60; 29 USC 207(e))', () => {
    const lines = [
      hourly,
      { type: 'service_charge', amount: '46' },
      { type: 'tips', amount: '80' },
      { type: 'reimbursement', amount: '20' },
    ];
    expect(resultOf('week_pay', { lines })).toMatchObject({
      regular_rate: '13.0000',
      excluded_total: '100.00',
      gross_total: '737.00',
    });
  });

  it('credits a true premium that was paid, once (29 USC 207(h), figures ours)', () => {
    const lines = [
      { type: 'hourly', hours: '50', rate: '20' },
      { type: 'daily_overtime_premium', amount: '60' },
    ];
    expect(resultOf('week_pay', { lines })).toMatchObject({
      credit: '60.00',
      overtime_premium: '40.00',
      gross_total: '1100.00',
    });
  });

  it('tops a week up to the minimum wage that is named (figures ours)', () => {
    expect(
      resultOf('week_pay', {
        hours_worked: '44',
        minimum_wage: '7.25',
        lines: [{ type: 'job_flat', rate: '60', quantity: '5' }],
      }),
    ).toMatchObject({ top_up: '19.00', gross_total: '333.50' });
  });

  it('goes back an hour in autumn, by the offset or by date and zone (elapsed time, figures ours)', () => {
    const shift = { local_start: '23:00', local_end: '07:30', unpaid_meal_minutes: '30' };
    expect(resultOf('hours', { ...shift, utc_offset_change_minutes: '-60' })).toMatchObject({ hours_worked: '9.00' });
    expect(resultOf('hours', { ...shift, date: '2026-10-31', zone: 'America/New_York' })).toMatchObject({
      hours_worked: '9.00',
    });
    expect(resultOf('hours', { ...shift, date: '2026-03-07', zone: 'America/New_York' })).toMatchObject({
      hours_worked: '7.00',
    });
  });

  it('29 CFR 785.38: the way home from the last job is not worked', () => {
    expect(
      resultOf('hours', { required_to_return_to_premises: false, last_job_end: '20:00', back_at_premises: '21:00' }),
    ).toEqual({ work_ends: '20:00' });
  });

  it('29 CFR 778.119: a commission traced to its weeks brings half time to those weeks (figures ours)', () => {
    const weeks = [
      { hours_worked: '50', commission: '100' },
      { hours_worked: '45', commission: '60' },
    ];
    expect(resultOf('deferred_allocation', { allocation: 'identified', weeks })).toMatchObject({
      additional_overtime_by_week: ['10.00', '3.33'],
      additional_overtime: '13.33',
    });
  });

  it('California Labor Code 510: seven days in a row (figures ours)', () => {
    const hours_by_day = ['10', '10', '10', '10', '10', '10', '14'];
    expect(resultOf('daily_overtime', { jurisdiction: 'US-CA', hours_by_day })).toMatchObject({
      straight_hours: '40.00',
      overtime_hours: '28.00',
      double_time_hours: '6.00',
    });
  });

  it('NRS 608.018: no daily overtime at 1.5 times the minimum wage (figures ours)', () => {
    const week = { jurisdiction: 'US-NV', hours_by_day: ['10', '10'], state_minimum_wage: '12.00' };
    expect(resultOf('daily_overtime', { ...week, hourly_rate: '18.00' })).toMatchObject({ overtime_hours: '0.00' });
    expect(resultOf('daily_overtime', { ...week, hourly_rate: '17.99' })).toMatchObject({ overtime_hours: '4.00' });
  });

  it('29 USC 207(g)(2): without an agreement before the work the weighted average stands (figures ours)', () => {
    const lines = [
      { type: 'hourly', hours: '30', rate: '10' },
      { type: 'hourly', hours: '20', rate: '12' },
    ];
    expect(resultOf('rate_in_effect', { agreement_before_work: true, lines })).toMatchObject({
      overtime_rate: '18.0000',
      gross_total: '600.00',
    });
    expect(resultOf('rate_in_effect', { agreement_before_work: false, lines })).toMatchObject({
      overtime_rate: '16.2000',
      gross_total: '594.00',
    });
  });

  it('DOL Fact Sheet #15B: managers and managing owners have no share of a pool (figures ours)', () => {
    const crew = [
      { role: 'technician' },
      { role: 'manager' },
      { role: 'owner' },
      { ownership_percent: '10', actively_manages: true },
    ];
    expect(resultOf('tips', { tip_pool: '10.01', crew })).toEqual({
      shares: ['5.01', '0.00', '0.00', '5.00'],
      may_share: [true, false, false, true],
    });
  });

  it('29 CFR 778.209: a percentage of straight time alone needs its own half time (figures ours)', () => {
    const inputs = {
      hourly_rate: '20',
      straight_hours: '40',
      overtime_hours: '10',
      bonus_percent_straight: '10',
      bonus_percent_overtime: '10',
    };
    expect(resultOf('percentage_bonus', inputs)).toMatchObject({
      bonus: '100.00',
      additional_overtime_on_bonus: '10.00',
    });
  });
});
