import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import type { recordPayment } from '@driprail/shared/contracts/billing.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import { getDayBillsAt, openPayLinkAt } from '@driprail/shared/contracts/phone-addresses';
import { call } from '../../../lib/call.ts';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';
import { orKept } from '../../../lib/outbox/or-kept.ts';
import { press } from '../../../lib/outbox/outbox.ts';

/** The bills of a crew's day, or in a dead zone the copy that this phone kept of them. */
export const dayBillsQuery = (userId: string, day: string) =>
  queryOptions({
    queryKey: ['bills', 'day', day],
    networkMode: 'always',
    retry: 0,
    queryFn: ({ signal }): Promise<{ bills: BillDto[] }> =>
      orKept(`${userId}:bills:${day}`, () => call(getDayBillsAt, { params: { day } }, signal)),
    refetchInterval: 30_000,
  });

/** Brings a day's bills onto the phone before they are needed. */
export function keepBills(client: QueryClient, userId: string, day: string): Promise<void> {
  return client.prefetchQuery(dayBillsQuery(userId, day));
}

/** The customer's own page, to be scanned or sent; asked for only with signal. */
export const payLinkQuery = (jobId: string) =>
  queryOptions({
    queryKey: ['pay-link', jobId],
    queryFn: ({ signal }) => call(openPayLinkAt, { params: { id: jobId } }, signal),
    staleTime: Infinity,
  });

type Handed = Omit<NonNullable<RequestOf<typeof recordPayment>['body']>, 'key' | 'deviceAt' | 'offsetMs'>;

/** What was handed over at the car: kept on the phone at once, sent when there is signal. */
export function usePressPayment(bill: BillDto) {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: (handed: Handed) => {
      const body = { key: uuid(), deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs(), ...handed };
      const words = `${handed.method === 'cash' ? 'Cash' : 'Check'} taken, ${bill.customerName}`;
      return press(client, { key: body.key, path: 'payment', targetId: bill.jobId, body, words });
    },
  });
}
