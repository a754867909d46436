import type { Transaction } from 'sequelize';
import { exact } from '@driprail/shared/domain/money/exact';
import { toCents } from '@driprail/shared/domain/money/rounding';
import { rateInForce } from '@driprail/shared/domain/pay/dated-rates';
import type { CountedAmount } from '@driprail/shared/domain/pay/pay-week.types';
import { Person, RefundReason } from '../../db/models/index.ts';
import { unprocessable } from '../../http/errors.ts';
import { hasAgreement } from './agreements/agreements.service.ts';
import { listRates } from './rates.service.ts';

export interface CountedFields {
  unit: CountedAmount['unit'];
  quantity: string;
  /** The day whose rate counts. */
  on: string;
}

const RATE_OF = { mile: 'mileage', review: 'per_review' } as const;

/** A count times the rate in force on its day, rounded once, half up. @throws 422 without a rate */
export async function countedAmount(
  personId: string,
  { unit, quantity, on }: CountedFields,
  tx: Transaction,
): Promise<{ amountCents: number; counted: CountedAmount }> {
  const question = { kind: RATE_OF[unit], personId, serviceId: null, clockKind: null, date: on };
  const rate = rateInForce(await listRates(null, tx), question);
  if (rate === null) {
    const message = `No rate for a ${unit} had started on that day. Set one under Rates and rules first.`;
    throw unprocessable('no_rate', message, { fields: { 'counted.quantity': message } });
  }
  const { id: rateId, value, startsOn } = rate;
  const amountCents = toCents(exact(quantity).mul(exact(value)));
  return { amountCents, counted: { unit, quantity, rateId, value, startsOn } };
}

/**
 * A customer's refund lowers commission only for a reason that the owner marked so, and only by a plan the person signed
 * (29 CFR 778.121; the place may ask for more).
 * @throws 422 at the field
 */
export async function refuseRefund(
  personId: string,
  refundReasonId: string,
  weekStartsOn: string,
  tx: Transaction,
): Promise<void> {
  const reason = await RefundReason.findByPk(refundReasonId, { transaction: tx });
  if (!reason?.lowersCommission) {
    const message = 'This reason does not touch commission. Choose one that the owner marked as lowering it.';
    throw unprocessable('untouched', message, { fields: { refundReasonId: message } });
  }
  if (await hasAgreement(personId, 'refunds', weekStartsOn, tx)) return;
  const person = await Person.findByPk(personId, { transaction: tx });
  const message = `No signed plan lets refunds lower the commission of ${person?.name ?? 'this person'} in this week. Record it under Rates and rules first.`;
  throw unprocessable('no_agreement', message, { fields: { kind: message } });
}
