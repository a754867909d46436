import type { Request } from 'express';
import { getHealth, getOpenApi } from '@driprail/shared/contracts/health.contract';
import { listLocalMail } from '@driprail/shared/contracts/mail.contract';
import { select } from './db/sequelize.ts';
import { accessRoutes, loginsRoutes, pushRoutes } from './features/access/index.ts';
import type { PushRules } from './features/access/index.ts';
import { billingRoutes } from './features/billing/index.ts';
import type { BillingParts } from './features/billing/index.ts';
import { boardRoutes } from './features/board/index.ts';
import { jobsRoutes } from './features/booking/index.ts';
import { clockRoutes } from './features/clock/index.ts';
import { customersRoutes } from './features/customers/index.ts';
import { jobWorkRoutes } from './features/job-work/index.ts';
import { messagesRoutes } from './features/messages/index.ts';
import type { DeliveryParts, HookSecrets } from './features/messages/index.ts';
import { onlineBookingRoutes } from './features/online-booking/index.ts';
import { payRoutes } from './features/pay/index.ts';
import { peopleRoutes } from './features/people/index.ts';
import { recordsRoutes } from './features/records/index.ts';
import { runSheetRoutes } from './features/run-sheet/index.ts';
import { servicesRoutes } from './features/service-menu/index.ts';
import type { SetUpCode } from './features/settings/index.ts';
import { settingsRoutes } from './features/settings/index.ts';
import { walkRoundRoutes } from './features/walk-round/index.ts';
import { notFound } from './http/errors.ts';
import { openApiOf } from './http/openapi.ts';
import type { RouteTable } from './http/route.ts';
import { publicRoute, route } from './http/route.ts';
import type { Geocoder } from './integrations/maps/index.ts';
import type { FileStore } from './integrations/storage/index.ts';
import type { TakenText } from './integrations/texts/index.ts';
import type { TakenMail } from './mail/transport.ts';

export interface RouteParts {
  hasLocalMail: boolean;
  setUpCode: SetUpCode;
  localMail: (() => TakenMail[]) | null;
  localTexts: (() => TakenText[]) | null;
  deliveries: DeliveryParts;
  hookSecrets: HookSecrets;
  store: FileStore;
  geocoder: Geocoder | null;
  push: PushRules | null;
  payments: BillingParts['payments'];
  links: BillingParts['links'];
  baseUrlOf: (req: Request) => string;
}

/** The table of routes: every feature mounts its own here. */
export function mountRoutes(table: RouteTable, parts: RouteParts): void {
  publicRoute(table, getHealth, async () => {
    await select('SELECT 1');
    return { status: 'ok' } as const;
  });
  publicRoute(table, getOpenApi, () => Promise.resolve(openApiOf(table.endpoints)));
  route(table, listLocalMail, () => {
    if (!parts.localMail) throw notFound('Local mail');
    return Promise.resolve({ mails: parts.localMail(), texts: parts.localTexts?.() ?? [] });
  });
  accessRoutes(table, parts);
  loginsRoutes(table, parts);
  pushRoutes(table, parts.push);
  payRoutes(table, parts);
  billingRoutes(table, parts);
  onlineBookingRoutes(table, parts);
  walkRoundRoutes(table, parts.store);
  customersRoutes(table, parts);
  messagesRoutes(table, parts);
  settingsRoutes(table, { code: parts.setUpCode, hasLocalMail: parts.hasLocalMail });
  for (const mount of [
    peopleRoutes,
    servicesRoutes,
    jobsRoutes,
    boardRoutes,
    runSheetRoutes,
    jobWorkRoutes,
    clockRoutes,
    recordsRoutes,
  ]) {
    mount(table);
  }
}
