/** Sums of one job's ledger, integer cents, none negative. Tips are the crew's and never in it. */
export interface LedgerSums {
  invoicedCents: number;
  creditedCents: number;
  /** Received towards the job: deposits and payments. */
  paidCents: number;
  /** Given back of what was received. */
  refundedCents: number;
}

/** What is owed on a job: above zero by the customer, below zero to the customer. */
export function owedCents({ invoicedCents, creditedCents, paidCents, refundedCents }: LedgerSums): number {
  return invoicedCents - creditedCents - (paidCents - refundedCents);
}
