import * as api from '@driprail/shared/contracts/board.contract';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { RouteTable } from '../../http/route.ts';
import { okay, route } from '../../http/route.ts';
import { readBoard, readBoardWeek } from './board.queries.ts';
import { moveVisits } from './moves.service.ts';
import { settleTrouble } from './trouble.service.ts';

export function boardRoutes(table: RouteTable): void {
  // The contract's response parse turns the row into the DTO.
  route(table, api.getBoard, ({ params }, { now }) => readBoard(params.day, now()) as Promise<BoardDto>);
  route(table, api.getBoardWeek, ({ params }) => readBoardWeek(params.day));
  route(table, api.moveVisits, async ({ body }, ctx) => ({ visits: await moveVisits(ctx, body.moves, body.accept) }));
  route(table, api.settleTrouble, async ({ params, body }, ctx) => {
    await settleTrouble(ctx, params.id, body.outcome);
    return okay;
  });
}
