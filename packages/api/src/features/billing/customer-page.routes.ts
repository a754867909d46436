import type { Request } from 'express';
import * as api from '@driprail/shared/contracts/customer-page.contract';
import { notFound } from '../../http/errors.ts';
import type { RouteTable } from '../../http/route.ts';
import { okay, publicRoute } from '../../http/route.ts';
import { readCustomerPhoto } from '../walk-round/index.ts';
import { openCardPage } from './card.service.ts';
import type { BillingParts } from './billing-parts.ts';
import { readCustomerPage, readShownPhotos } from './customer-page.queries.ts';
import { giveFeedback } from './feedback.service.ts';
import { readInvoicePdf } from './invoice-pdf.ts';
import { lookUpOpenPages } from './payment-events.service.ts';

/** Pages that a customer opens by a signed link: whoever has the link sees that one job. */
export function customerPageRoutes(table: RouteTable, { links, payments, store, baseUrlOf }: BillingParts): void {
  const jobOf = async (token: string, now: Date): Promise<string> => {
    const jobId = await links.jobOf(token, now);
    if (!jobId) throw notFound('That page');
    return jobId;
  };
  const pageUrl = (req: Request, token: string) => `${baseUrlOf(req)}/c/${token}`;

  publicRoute(table, api.getCustomerPage, async ({ params, query }, now) => {
    const jobId = await jobOf(params.token, now());
    // Just back from paying: the service's word may be slower than the browser.
    if (query.returned) await lookUpOpenPages(payments, now(), jobId);
    return { page: await readCustomerPage(jobId, now()) };
  });
  publicRoute(table, api.getCustomerInvoice, async ({ params }, now) =>
    readInvoicePdf(await jobOf(params.token, now()), now()),
  );
  publicRoute(table, api.getCustomerPhoto, async ({ params }, now, { res }) => {
    const jobId = await jobOf(params.token, now());
    const photos = await readShownPhotos(jobId);
    if (!photos.some((photo) => photo.id === params.id)) throw notFound('That photo');
    res.setHeader('cache-control', 'private, no-cache');
    res.setHeader('content-security-policy', "default-src 'none'; sandbox");
    return readCustomerPhoto(store, params.id);
  });
  publicRoute(table, api.payByCard, async ({ params, body }, now, { req }) => {
    const jobId = await jobOf(params.token, now());
    const returnUrl = `${pageUrl(req, params.token)}?returned=true`;
    return openCardPage(
      payments,
      { jobId, part: body.part, tipCents: body.tipCents, returnUrl },
      { userId: null, at: now() },
    );
  });
  publicRoute(table, api.giveFeedback, async ({ params, body }, now) => {
    await giveFeedback(await jobOf(params.token, now()), body, now());
    return okay;
  });
}
