/** Why what was invoiced on a day is not what was received on it, in the order of the sheet. */
export const differenceKinds = ['owed', 'credited', 'paid_before', 'for_earlier', 'for_unbilled'] as const;
export type DifferenceKind = (typeof differenceKinds)[number];
export const differenceNames: Record<DifferenceKind, string> = {
  owed: 'Still owed on the day’s invoices at its end',
  credited: 'Credited on the day’s invoices',
  paid_before: 'Paid on them before the day, deposits',
  for_earlier: 'Received for invoices of earlier days',
  for_unbilled: 'Received for jobs that were not billed yet',
};

/** Integer cents. "Of the day" are jobs with an invoice of that day; receipts are less what was given back. */
export interface DayFlows {
  invoiced: number;
  creditedOnThem: number;
  /** Receipts on jobs of the day, before it and on it. */
  receivedBeforeOnThem: number;
  receivedOnThem: number;
  receivedForEarlier: number;
  receivedForUnbilled: number;
}

/** The lines from what was received on the day to what was invoiced on it: their sum is exactly invoiced less received. */
export function dayDifference(flows: DayFlows): { kind: DifferenceKind; cents: number }[] {
  const { invoiced, creditedOnThem, receivedBeforeOnThem, receivedOnThem } = flows;
  const cents: Record<DifferenceKind, number> = {
    owed: invoiced - creditedOnThem - receivedBeforeOnThem - receivedOnThem,
    credited: creditedOnThem,
    paid_before: receivedBeforeOnThem,
    for_earlier: -flows.receivedForEarlier,
    for_unbilled: -flows.receivedForUnbilled,
  };
  return differenceKinds.map((kind) => ({ kind, cents: cents[kind] || 0 }));
}
