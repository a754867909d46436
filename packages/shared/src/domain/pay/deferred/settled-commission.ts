import { centsText } from '../../money/rounding.ts';
import { formatDay } from '../../time/format.ts';
import { aLine, totalCents } from '../pay-line.ts';
import type {
  PayLine,
  PayPerson,
  PayWeekInput,
  PersonWeek,
  SettledCommission,
  WorkingStep,
} from '../pay-week.types.ts';
import { paidFor } from './waiting-commission.ts';

type WeekOf = (input: PayWeekInput, personId: string) => PersonWeek | undefined;

const RULE = '29 CFR 778.119: late commission belongs to the week in which it was earned';

/**
 * Commission that customers' payments settle into the week of the work: that week worked out once more with these
 * lines paid, less what it came to before. So a floor or a make-up that stood in for the commission is not paid twice,
 * and the overtime it causes is the week's own (29 CFR 778.119). Both stay outside this week's regular rate; what was
 * paid is never taken back.
 */
export function settledCommissionLines(person: PayPerson, settled: SettledCommission, weekOf: WeekOf): PayLine[] {
  const known = new Set(settled.lineIds);
  const { input } = settled;
  const before = weekOf(input, person.id);
  const after = weekOf(
    { ...input, doneLines: input.doneLines.map((line) => (known.has(line.lineId) ? paidFor(line) : line)) },
    person.id,
  );
  if (!before || !after) return [];
  return [...settlement(person, settled, before, after), ...settledPremium(person, settled, before, after)];
}

/** Everything but overtime, so that floors, make-up and percentages of all earnings follow the commission. */
function settlement(person: PayPerson, settled: SettledCommission, before: PersonWeek, after: PersonWeek): PayLine[] {
  const [was, is] = [before, after].map((week) => totalCents(week.lines.filter(isEarning)));
  const amountCents = Math.max(0, (is ?? 0) - (was ?? 0));
  if (amountCents === 0) return [];
  const numbers = jobNumbers(settled);
  return [
    aLine({
      key: `commission_settlement:${settled.startsOn}`,
      personId: person.id,
      kind: 'commission_settlement',
      label: `Commission now paid for, ${numbers}`,
      amountCents,
      rule: RULE,
      working: [
        weekStep(settled, 'Earned in that week as it was paid', was ?? 0),
        ...commissionSteps(settled, before, after),
        {
          label: 'The same week with these jobs paid',
          note: 'A floor or a make-up that stood in for the commission falls away as far as the commission reaches',
          arithmetic: centsText(is ?? 0),
          result: centsText(is ?? 0),
          sources: [],
        },
        lessStep(was ?? 0, is ?? 0, amountCents),
      ],
    }),
  ];
}

function settledPremium(
  person: PayPerson,
  settled: SettledCommission,
  before: PersonWeek,
  after: PersonWeek,
): PayLine[] {
  const { overtimePremium: was } = before.totals;
  const { overtimePremium: is } = after.totals;
  const amountCents = Math.max(0, is - was);
  if (amountCents === 0) return [];
  return [
    aLine({
      key: `settlement_premium:${settled.startsOn}`,
      personId: person.id,
      kind: 'settlement_premium',
      label: `Overtime on commission now paid for, ${jobNumbers(settled)}`,
      amountCents,
      rule: RULE,
      working: [
        weekStep(settled, 'Overtime premium of that week as it was paid', was),
        {
          label: 'Overtime premium at the regular rate with the commission',
          note: 'The commission raises the regular rate of the week in which it was earned',
          arithmetic: centsText(is),
          result: centsText(is),
          sources: [],
        },
        lessStep(was, is, amountCents),
      ],
    }),
  ];
}

function isEarning(line: PayLine): boolean {
  return line.inRegularRate || line.kind === 'percentage_bonus';
}

function jobNumbers({ input, lineIds }: SettledCommission): string {
  const numbers = input.doneLines.filter((line) => lineIds.includes(line.lineId)).map((line) => line.jobNumber);
  const unique = [...new Set(numbers)].sort((a, b) => a - b);
  return `${unique.length === 1 ? 'job' : 'jobs'} ${unique.join(', ')}`;
}

function weekStep({ startsOn, number }: SettledCommission, label: string, cents: number): WorkingStep {
  return {
    label,
    note: `Week ${number}, from ${formatDay(startsOn)}`,
    arithmetic: centsText(cents),
    result: centsText(cents),
    sources: [],
  };
}

/** The commission lines that the payments bring, each with the arithmetic it would have had in its own week. */
function commissionSteps({ input, lineIds }: SettledCommission, before: PersonWeek, after: PersonWeek): WorkingStep[] {
  const paid = new Map(before.lines.map((line) => [line.key, line.amountCents]));
  const jobs = input.doneLines.filter((line) => lineIds.includes(line.lineId));
  return after.lines
    .filter((line) => line.kind === 'commission' && line.amountCents !== paid.get(line.key))
    .map((line) => {
      const last = line.working.at(-1);
      return {
        label: line.jobNumber === null ? line.label : `${line.label}, job ${line.jobNumber}`,
        note: last?.note ?? '',
        arithmetic: last?.arithmetic ?? centsText(line.amountCents),
        result: centsText(line.amountCents),
        sources: jobs
          .filter((job) => line.jobId === null || job.jobId === line.jobId)
          .map((job) => ({ kind: 'job' as const, id: job.jobId, label: `Job ${job.jobNumber}` })),
      };
    });
}

function lessStep(was: number, is: number, amountCents: number): WorkingStep {
  return {
    label: 'What it adds',
    note: 'Outside this week’s regular rate',
    arithmetic: `${centsText(is)} less ${centsText(was)}`,
    result: centsText(amountCents),
    sources: [],
  };
}
