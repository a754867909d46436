import { exact } from '../money/exact.ts';
import { centsText, shortText } from '../money/rounding.ts';
import { aLine } from './pay-line.ts';
import type {
  AdjustmentKind,
  CountedAmount,
  PayAdjustment,
  PayLine,
  PayPerson,
  PayWarning,
  SourceRef,
} from './pay-week.types.ts';
import { rateText } from './working-words.ts';
import { timeOffParts } from './time-off/time-off-pay.ts';

const KIND: Record<AdjustmentKind, { label: string; note: string; rule: string }> = {
  bonus: {
    label: 'Bonus',
    note: 'Promised or measured, so it counts in the regular rate',
    rule: '29 CFR 778.208 to 778.211',
  },
  discretionary_bonus: {
    label: 'Discretionary bonus',
    note: 'Fact and amount decided near the end and never promised, so it stays out of the regular rate',
    rule: '29 CFR 778.211',
  },
  reimbursement: { label: 'Reimbursement', note: 'Pays back an expense; not wages', rule: '29 CFR 778.217' },
  paid_time_off: {
    label: 'Paid time off',
    note: 'Not hours worked, so it stays out of the regular rate',
    rule: '29 CFR 778.218',
  },
  refund: {
    label: 'Refund to a customer',
    note: 'Lowers the commission of the week in which it became known, by the written plan; no other pay',
    rule: '29 CFR 778.121',
  },
  deduction: {
    label: 'Deduction',
    note: 'Never below the minimum wage, never out of overtime',
    rule: '29 CFR 531.35, 531.37',
  },
  correction: {
    label: 'Correction',
    note: 'Mends a line of a locked week; outside this week’s regular rate',
    rule: 'Locked weeks stay as they are',
  },
};

/** Adjustments that add to pay; bonuses alone count in the regular rate. */
export function additionLines(adjustments: readonly PayAdjustment[]): PayLine[] {
  return adjustments
    .filter((item) => item.kind !== 'refund' && !takesAway(item))
    .map((item) => adjustmentLine(item, item.amountCents));
}

export interface Takings {
  lines: PayLine[];
  warnings: PayWarning[];
}

/**
 * Deductions and corrections that take away, in their order, as far as the room reaches. What does not fit is left
 * out and said.
 * @param roomCents whole cents that may be taken in all
 */
export function takingLines(person: PayPerson, adjustments: readonly PayAdjustment[], roomCents: number): Takings {
  return taken(adjustments.filter(takesAway), roomCents, (item, wanted, most) =>
    refusal(
      person,
      `"${item.reason}" would take ${centsText(wanted)} from ${person.name}; at most ${centsText(most)} may be taken this week without cutting into the minimum wage or overtime (29 CFR 531.35, 531.37).`,
    ),
  );
}

/**
 * Customers' refunds off this week's commission, as far as it reaches; they lower the regular rate with it.
 * @param commissionCents what commission adds to this week's pay above what is promised without it
 */
export function refundLines(
  person: PayPerson,
  adjustments: readonly PayAdjustment[],
  commissionCents: number,
): Takings {
  const refunds = adjustments.filter((item) => item.kind === 'refund');
  return taken(refunds, commissionCents, (item, wanted, most) =>
    refusal(
      person,
      `The refund "${item.reason}" would take ${centsText(wanted)} from ${person.name}; this week’s commission allows ${centsText(most)}. Hourly pay, floors and overtime stay whole (29 CFR 778.121).`,
    ),
  );
}

function taken(
  adjustments: readonly PayAdjustment[],
  roomCents: number,
  refuse: (item: PayAdjustment, wanted: number, most: number) => PayWarning,
): Takings {
  const result: Takings = { lines: [], warnings: [] };
  let room = roomCents;
  for (const item of adjustments) {
    const wanted = Math.abs(item.amountCents);
    const taken = Math.min(wanted, room);
    room -= taken;
    if (taken > 0) result.lines.push(adjustmentLine(item, -taken));
    if (taken < wanted) result.warnings.push(refuse(item, wanted, taken));
  }
  return result;
}

function takesAway(item: PayAdjustment): boolean {
  return item.kind === 'deduction' || (item.kind !== 'refund' && item.amountCents < 0);
}

function refusal(person: PayPerson, message: string): PayWarning {
  return {
    code: 'deduction_refused',
    personId: person.id,
    isBlocking: false,
    message,
    entryId: null,
    jobId: null,
  };
}

function adjustmentLine(item: PayAdjustment, amountCents: number): PayLine {
  const { label, note, rule } = KIND[item.kind];
  const wanted = item.kind === 'deduction' ? -Math.abs(item.amountCents) : item.amountCents;
  const isLimited = amountCents !== wanted;
  return aLine({
    key: `${item.kind}:${item.id}`,
    personId: item.personId,
    kind: item.kind,
    label: item.reason === '' ? label : `${label}: ${item.reason}`,
    amountCents,
    inRegularRate: item.kind === 'refund' || (item.kind === 'bonus' && amountCents > 0),
    correctsLineId: item.correctsLineId,
    rule,
    working: [
      {
        label,
        note: isLimited ? `${note}. ${centsText(Math.abs(wanted))} was asked; this much may be taken` : note,
        arithmetic: item.counted ? countedText(item.counted) : centsText(wanted),
        result: centsText(amountCents),
        sources: [
          { kind: 'adjustment', id: item.id, label: item.reason },
          ...(item.counted ? [countedSource(item.counted)] : []),
        ],
      },
    ],
    ...(item.timeOff ? timeOffParts(item, item.timeOff) : {}),
  });
}

/** "42.5 miles times 0.725". */
function countedText({ unit, quantity, value }: CountedAmount): string {
  const count = shortText(exact(quantity));
  return `${count} ${count === '1' ? unit : `${unit}s`} times ${rateText(value)}`;
}

function countedSource({ rateId, value, startsOn }: CountedAmount): SourceRef {
  return { kind: 'rate', id: rateId, label: `${rateText(value)} since ${startsOn}` };
}
