import { v7 as uuid } from 'uuid';
import type { Payment, Refund } from '../../db/models/index.ts';

type Fields = Refund['_creationAttributes'];
type RefundFields = Pick<Fields, 'kind' | 'state' | 'note' | 'madeAt' | 'madeBy'> &
  Partial<Pick<Fields, 'providerRef' | 'creditNoteId' | 'fault'>>;

/** Money of a payment that goes back, as a row. @param amountCents at least one cent */
export function refundRow(payment: Pick<Payment, 'id'>, amountCents: number, fields: RefundFields) {
  return { id: uuid(), paymentId: payment.id, amountCents, ...fields };
}
