import * as api from '@driprail/shared/contracts/run-sheet.contract';
import type { RouteTable } from '../../http/route.ts';
import { route } from '../../http/route.ts';
import { readRunSheet } from './run-sheet.queries.ts';
import { actOnVisit } from './visit-actions.service.ts';

export function runSheetRoutes(table: RouteTable): void {
  route(table, api.getRunSheet, ({ params }, ctx) => readRunSheet(ctx, params.day));
  route(table, api.postVisitAction, ({ params, body }, ctx) => actOnVisit(ctx, params.id, body));
}
