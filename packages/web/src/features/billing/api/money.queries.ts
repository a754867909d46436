import { infiniteQueryOptions, queryOptions, useMutation } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import type { BillDto } from '@driprail/shared/contracts/bill.dto';
import {
  billFee,
  creditBill,
  getBill,
  issueInvoice,
  listHeld,
  listInvoices,
  openPayLink,
  recordPayment,
  refundPayment,
} from '@driprail/shared/contracts/billing.contract';
import type { OutputOf, RequestOf } from '@driprail/shared/contracts/endpoint';
import { listAgreements } from '@driprail/shared/contracts/pay-agreements.contract';
import { call } from '../../../lib/call.ts';

export type InvoiceAsk = Pick<NonNullable<RequestOf<typeof listInvoices>['query']>, 'state' | 'find'>;
export type InvoiceRow = OutputOf<typeof listInvoices>['invoices'][number];

/** Invoices as found, newest first, more of them on request. */
export const invoicesQuery = (ask: InvoiceAsk) =>
  infiniteQueryOptions({
    queryKey: ['money', 'invoices', ask],
    queryFn: ({ pageParam, signal }) =>
      call(listInvoices, { query: { ...ask, ...(pageParam !== null && { before: pageParam }) } }, signal),
    initialPageParam: null as number | null,
    getNextPageParam: (last, pages) => {
      const shown = pages.reduce((count, page) => count + page.invoices.length, 0);
      return shown < (pages[0]?.total ?? 0) ? (last.invoices.at(-1)?.number ?? null) : null;
    },
    placeholderData: (before) => before,
  });

/** What is owed in all, whatever the list shows. */
export const owedQuery = queryOptions({
  queryKey: ['money', 'owed'],
  queryFn: ({ signal }) => call(listInvoices, { query: { state: 'unpaid', limit: 1 } }, signal),
});

/** Called-off jobs that hold money. */
export const heldQuery = queryOptions({
  queryKey: ['money', 'held'],
  queryFn: ({ signal }) => call(listHeld, {}, signal),
});

export const billQuery = (jobId: string) =>
  queryOptions({
    queryKey: ['bills', 'job', jobId],
    queryFn: ({ signal }) => call(getBill, { params: { id: jobId } }, signal),
  });

/** Reasons for giving back, each with what it does to commission; for owners. */
export const refundReasonsQuery = queryOptions({
  queryKey: ['pay', 'agreements'],
  queryFn: ({ signal }) => call(listAgreements, {}, signal),
});

async function keepBill(client: QueryClient, data: { bill: BillDto }): Promise<void> {
  client.setQueryData(billQuery(data.bill.jobId).queryKey, data);
  await Promise.all(
    ['money', 'customers', 'bills'].map((key) => client.invalidateQueries({ queryKey: [key], refetchType: 'active' })),
  );
}

export function useBillFee(jobId: string) {
  return useMutation({
    mutationFn: (body: NonNullable<RequestOf<typeof billFee>['body']>) =>
      call(billFee, { params: { id: jobId }, body }),
    onSuccess: (data, _vars, _saved, { client }) => keepBill(client, data),
  });
}

export function useIssueInvoice(jobId: string) {
  return useMutation({
    mutationFn: () => call(issueInvoice, { params: { id: jobId } }),
    onSuccess: (data, _v, _h, { client }) => keepBill(client, data),
  });
}

type PaymentBody = NonNullable<RequestOf<typeof recordPayment>['body']>;
export function useRecordPayment(jobId: string) {
  return useMutation({
    mutationFn: (body: PaymentBody) => call(recordPayment, { params: { id: jobId }, body }),
    onSuccess: (data, _v, _h, { client }) => keepBill(client, data),
  });
}

type RefundBody = NonNullable<RequestOf<typeof refundPayment>['body']>;
type CreditBody = NonNullable<RequestOf<typeof creditBill>['body']>;
/** Money of a payment goes back, or lines are credited without any. */
export type GiveBack = { paymentId: string; body: RefundBody } | { jobId: string; body: CreditBody };
export function useGiveBack() {
  return useMutation({
    mutationFn: (order: GiveBack) =>
      'paymentId' in order
        ? call(refundPayment, { params: { id: order.paymentId }, body: order.body })
        : call(creditBill, { params: { id: order.jobId }, body: order.body }),
    onSuccess: (data, _v, _h, { client }) => keepBill(client, data),
  });
}

export function useOpenPayLink(jobId: string) {
  return useMutation({ mutationFn: () => call(openPayLink, { params: { id: jobId } }) });
}
