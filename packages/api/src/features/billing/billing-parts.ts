import type { Request } from 'express';
import type { Payments } from '../../integrations/payments/index.ts';
import type { FileStore } from '../../integrations/storage/index.ts';
import type { CustomerLinks } from './customer-links.ts';

/** What the routes of bills and of customers' pages stand on. */
export interface BillingParts {
  payments: Payments;
  links: CustomerLinks;
  /** Where photos are kept. */
  store: FileStore;
  baseUrlOf: (req: Request) => string;
}
