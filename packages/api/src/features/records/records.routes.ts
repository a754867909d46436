import { listAudit } from '@driprail/shared/contracts/records.contract';
import type { RouteTable } from '../../http/route.ts';
import { route } from '../../http/route.ts';
import { readAudit } from './audit.queries.ts';

export function recordsRoutes(table: RouteTable): void {
  route(table, listAudit, ({ query }) => readAudit(query));
}
