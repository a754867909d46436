import { dollars, fractionText, type Exact } from '../money/exact.ts';
import { centsText, decimalText, shortText, toCents, toCentsUp } from '../money/rounding.ts';
import { aLine, totalCents } from './pay-line.ts';
import type { PayLine, PayLineKind, PayPerson, PremiumRounding, SourceRef, WorkingStep } from './pay-week.types.ts';
import type { WeekPremium } from './week-premium.ts';
import { hoursAndMinutes, rateText, workedDays } from './working-words.ts';
import type { WorkSpan } from './work-spans.ts';

export interface PremiumParts {
  person: PayPerson;
  spans: readonly WorkSpan[];
  hours: Exact;
  rate: Exact;
  premium: WeekPremium;
  rounding: PremiumRounding;
  /** Exact dollars of the included lines for hours that were not worked: no part of the rate. */
  notWorked: Exact;
  /** Lines inside the regular rate, the make-up among them. */
  included: readonly PayLine[];
  /** Lines outside it, tips and all. */
  excluded: readonly PayLine[];
}

/** The overtime line with its working in the order a person would do it by hand; nothing when nothing is owed. */
export function premiumLine(parts: PremiumParts): PayLine[] {
  const { person, hours, rate, premium } = parts;
  const amountCents = parts.rounding === 'up' ? toCentsUp(premium.premium) : toCents(premium.premium);
  if (amountCents === 0) return [];
  return [
    aLine({
      key: 'overtime_premium',
      personId: person.id,
      kind: 'overtime_premium',
      label: premium.split.double.gt(0) ? 'Overtime and double time premium' : 'Overtime, half the regular rate',
      hours: fractionText(premium.split.overtime.add(premium.split.double)),
      rate: fractionText(rate),
      amountCents,
      rule: premium.inEffect
        ? '29 USC 207(g)(2); 29 CFR 778.419'
        : premium.ruleSet.key === 'us_federal'
          ? '29 USC 207(a); 29 CFR 778.109 to 778.118'
          : `${premium.ruleSet.name}; ${premium.ruleSet.source}`,
      working: [
        workedStep(parts),
        ...includedSteps(parts.included),
        ...excludedStep(parts.excluded),
        ...rateSteps(parts, hours, rate),
        ...premiumSteps(parts, amountCents),
      ],
    }),
  ];
}

function workedStep({ person, spans, hours }: PremiumParts): WorkingStep {
  const entries = [...new Map(spans.map((span) => [span.entryId, span.date])).entries()];
  return {
    label: `What ${person.name} worked`,
    note: workedDays(spans),
    arithmetic: hoursAndMinutes(hours),
    result: `${shortText(hours)} h`,
    sources: entries.map(([id, date]) => ({ kind: 'clock_entry', id, label: `Clock entry, ${date}` })),
  };
}

const INCLUDED: [PayLineKind, string][] = [
  ['salary', 'The salary of this week counts'],
  ['day_rate', 'Day rates of this week count'],
  ['flat', 'Flat amounts of this week count'],
  ['job_rate', 'Job rates of this week count'],
  ['no_show_trip', 'Trips on which nobody was home count'],
  ['commission', 'Commission of this week counts'],
  ['refund', 'Refunds to customers lower it'],
  ['plan_floor', 'What the plan adds or takes back counts'],
  ['premium_pay', 'Premiums for a role or a shift count'],
  ['rest_pay', 'Rest breaks paid apart count'],
  ['bonus', 'Bonuses of this week count'],
  ['minimum_wage_make_up', 'The make-up to the minimum wage counts'],
];

/** The included lines as they are added up: hourly lines one by one, the other kinds each as one sum. */
function includedGroups(included: readonly PayLine[]): PayLine[][] {
  const hourly = included.filter((line) => line.kind === 'hourly').map((line) => [line]);
  const others = INCLUDED.map(([kind]) => included.filter((line) => line.kind === kind));
  return [...hourly, ...others].filter((lines) => lines.length > 0);
}

function includedSteps(included: readonly PayLine[]): WorkingStep[] {
  return includedGroups(included).flatMap((lines) => {
    const label = INCLUDED.find(([kind]) => kind === lines[0]?.kind)?.[1];
    if (label === undefined) return lines.flatMap((line) => line.working.slice(-1));
    const jobs = [...new Set(lines.map((line) => line.jobNumber).filter((number) => number !== null))];
    const names = lines.map((line) => line.label).join(', ');
    return [
      {
        label,
        note: jobs.length > 0 ? `${jobs.length === 1 ? 'Job' : 'Jobs'} ${jobs.join(', ')}` : names,
        arithmetic: lines.map((line) => centsText(line.amountCents)).join(' + '),
        result: centsText(totalCents(lines)),
        sources: lines.map(lineSource),
      },
    ];
  });
}

const EXCLUDED: [PayLineKind[], string, string][] = [
  [['tip', 'tip_already_received'], 'tips', 'Tips belong to the crew'],
  [
    ['commission_settlement', 'settlement_premium'],
    'settled for other weeks',
    'A settlement belongs to the weeks in which it was earned',
  ],
  [['correction'], 'corrections', 'A correction belongs to the week it mends'],
  [['discretionary_bonus'], 'discretionary bonus', 'A discretionary bonus was never promised'],
  [['reimbursement'], 'reimbursement', 'A reimbursement pays back an expense'],
  [['paid_time_off'], 'paid time off', 'Paid time off was not worked'],
  [['show_up_pay'], 'show-up pay', 'Show-up pay is for hours that were not worked'],
];

function excludedStep(excluded: readonly PayLine[]): WorkingStep[] {
  const groups = EXCLUDED.map(([kinds, noun, reason]) => ({
    noun,
    reason,
    lines: excluded.filter((line) => kinds.includes(line.kind)),
  })).filter((group) => group.lines.length > 0);
  if (groups.length === 0) return [];
  return [
    {
      label: 'Does not count',
      note: groups.map((group) => group.reason).join('. '),
      arithmetic: groups.map((group) => `${centsText(totalCents(group.lines))} ${group.noun}`).join(', '),
      result: '',
      sources: groups.flatMap((group) => group.lines.map(lineSource)),
    },
  ];
}

function rateSteps({ included, notWorked }: PremiumParts, hours: Exact, rate: Exact): WorkingStep[] {
  const total = totalCents(included);
  const counted = dollars(total).sub(notWorked);
  const isRaised = rate.gt(counted.div(hours));
  const missing: WorkingStep[] = notWorked.gt(0)
    ? [
        {
          label: 'Less the salary for hours that were not worked',
          note: 'The rate is the salary over the hours it covers (29 CFR 778.113)',
          arithmetic: `${centsText(total)} less ${decimalText(notWorked, 4)}`,
          result: decimalText(counted, 4),
          sources: [],
        },
      ]
    : [];
  return [
    {
      label: 'Together',
      note: 'Everything that counts',
      arithmetic: includedGroups(included)
        .map((lines) => centsText(totalCents(lines)))
        .join(' + '),
      result: centsText(total),
      sources: [],
    },
    ...missing,
    {
      label: 'The regular rate',
      note: isRaised
        ? 'What an hour of this week was worth, raised to the minimum wage'
        : 'What an hour of this week was worth',
      arithmetic: `${notWorked.gt(0) ? decimalText(counted, 4) : centsText(total)} divided by ${shortText(hours)} h`,
      result: decimalText(rate, 4),
      sources: [],
    },
  ];
}

function premiumSteps({ hours, premium, rounding }: PremiumParts, amountCents: number): WorkingStep[] {
  const { ruleSet, split, rate, onBonus, inEffect } = premium;
  if (inEffect) return [inEffectStep(inEffect, premium, amountCents)];
  const isFederal = ruleSet.key === 'us_federal';
  const where = isFederal
    ? `${shortText(hours)} less ${ruleSet.weeklyHours} is ${shortText(split.overtime)} h`
    : `${ruleSet.name}: ${shortText(split.overtime)} h${split.double.gt(0) ? `, double time ${shortText(split.double)} h` : ''}`;
  const parts = [
    `half of ${decimalText(rate, 4)} times ${shortText(split.overtime)} h`,
    ...(split.double.gt(0) ? [`${decimalText(rate, 4)} times ${shortText(split.double)} h`] : []),
    ...(onBonus.gt(0) ? [`${decimalText(onBonus, 4)} on the bonus`] : []),
  ];
  const bonusNote = onBonus.gt(0)
    ? '. The bonus is left out of this rate: it is divided by the hours that were not overtime and brings one and a half times that'
    : '';
  return [
    {
      label: isFederal ? `Half of it, for the hours over ${ruleSet.weeklyHours}` : 'The premium on top',
      note: `${where}. The whole hour is in the steps above already${bonusNote}${rounding === 'up' ? '. Up to the next cent, as the company chose' : ''}`,
      arithmetic: parts.join(' + '),
      result: centsText(amountCents),
      sources: [{ kind: 'rule', id: ruleSet.key, label: ruleSet.name }],
    },
  ];
}

function inEffectStep(
  { parts, onOther }: NonNullable<WeekPremium['inEffect']>,
  { ruleSet, split }: WeekPremium,
  amountCents: number,
): WorkingStep {
  const other = onOther.gt(0) ? [`${decimalText(onOther, 4)} half time on other pay`] : [];
  return {
    label: `Half of the rate in effect, for the hours over ${ruleSet.weeklyHours}`,
    note: `${shortText(split.overtime)} h, the last of the week, each at the rate it was worked at, by an agreement made before the work`,
    arithmetic: [
      ...parts.map(({ hours, rate }) => `half of ${rateText(rate)} times ${shortText(hours)} h`),
      ...other,
    ].join(' + '),
    result: centsText(amountCents),
    sources: [{ kind: 'rule', id: 'rate_in_effect', label: 'Agreement on the rate in effect' }],
  };
}

function lineSource(line: PayLine): SourceRef {
  if (line.jobId !== null) return { kind: 'job', id: line.jobId, label: `Job ${line.jobNumber}` };
  return { kind: 'pay_line', id: line.key, label: line.label };
}
