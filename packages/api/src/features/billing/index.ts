export { readBill } from './bill.presenter.ts';
export { billingRoutes } from './billing.routes.ts';
export type { BillingParts } from './billing-parts.ts';
export { CustomerLinks } from './customer-links.ts';
export { eraseFromBills } from './erase-customer.service.ts';
export { issueDueInvoices } from './issue-invoice.service.ts';
export { lookUpOpenPages } from './payment-events.service.ts';
export { settleAskedRefunds } from './refunds.service.ts';
