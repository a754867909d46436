import { centsText } from '../money/rounding.ts';
import { aLine } from './pay-line.ts';
import type { AdjustmentKind, PayAdjustment, PayLine, PayPerson, PayWarning } from './pay-week.types.ts';
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
  return adjustments.filter((item) => !takesAway(item)).map((item) => adjustmentLine(item, item.amountCents));
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
  const result: Takings = { lines: [], warnings: [] };
  let room = roomCents;
  for (const item of adjustments.filter(takesAway)) {
    const wanted = Math.abs(item.amountCents);
    const taken = Math.min(wanted, room);
    room -= taken;
    if (taken > 0) result.lines.push(adjustmentLine(item, -taken));
    if (taken < wanted) result.warnings.push(refusal(person, item, wanted, taken));
  }
  return result;
}

function takesAway(item: PayAdjustment): boolean {
  return item.kind === 'deduction' || item.amountCents < 0;
}

function refusal(person: PayPerson, item: PayAdjustment, wanted: number, taken: number): PayWarning {
  return {
    code: 'deduction_refused',
    personId: person.id,
    isBlocking: false,
    message: `"${item.reason}" would take ${centsText(wanted)} from ${person.name}; at most ${centsText(taken)} may be taken this week without cutting into the minimum wage or overtime (29 CFR 531.35, 531.37).`,
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
    inRegularRate: item.kind === 'bonus' && amountCents > 0,
    correctsLineId: item.correctsLineId,
    rule,
    working: [
      {
        label,
        note: isLimited ? `${note}. ${centsText(Math.abs(wanted))} was asked; this much may be taken` : note,
        arithmetic: centsText(wanted),
        result: centsText(amountCents),
        sources: [{ kind: 'adjustment', id: item.id, label: item.reason }],
      },
    ],
    ...(item.timeOff ? timeOffParts(item, item.timeOff) : {}),
  });
}
