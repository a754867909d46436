import { useMutation } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import type { z } from 'zod';
import { moveVisits } from '@driprail/shared/contracts/board.contract';
import type { BoardDto, acceptBody } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { Move } from '@driprail/shared/domain/board/plan';
import { dayBounds } from '@driprail/shared/domain/time/zone-instants';
import { call } from '../../../lib/call.ts';
import { boardQuery } from './board.queries.ts';

export interface MoveOrder {
  day: string;
  moves: (Move & { planVersion: number })[];
  accept?: z.input<typeof acceptBody>[];
}

/** Saves moves: shown at once, put back with the API's reason when refused. Everything sent is in the variables. */
export function useMoveVisits() {
  return useMutation({
    mutationKey: ['board', 'move'],
    mutationFn: ({ moves, accept = [] }: MoveOrder) => call(moveVisits, { body: { moves, accept } }),
    onMutate: async ({ day, moves }, { client }) => {
      const { queryKey } = boardQuery(day);
      await client.cancelQueries({ queryKey });
      const before = client.getQueryData(queryKey);
      if (before) client.setQueryData(queryKey, guess(before, moves));
      return { before };
    },
    onError: (_error, { day }, saved, { client }) => {
      if (saved?.before) client.setQueryData(boardQuery(day).queryKey, saved.before);
    },
    onSuccess: ({ visits }, { day }, _saved, { client }) => {
      client.setQueryData(boardQuery(day).queryKey, (board) => board && takeIn(board, visits));
    },
    onSettled: (_data, _error, _order, _saved, { client }) => settle(client),
  });
}

/** Only the last of several saves refetches: an earlier one would undo the guess of a later. */
function settle(client: QueryClient): Promise<void> | undefined {
  return client.isMutating({ mutationKey: ['board', 'move'] }) === 1
    ? client.invalidateQueries({ queryKey: ['board'] })
    : undefined;
}

function guess(board: BoardDto, moves: Move[]): BoardDto {
  const moved = [...board.visits, ...board.unplaced].flatMap((visit) => {
    const move = moves.find((m) => m.visitId === visit.id);
    if (!move) return [];
    const isPlaced = move.vanId !== null && move.from !== null && move.to !== null;
    const progress = isPlaced
      ? visit.progress === 'unplaced'
        ? ('placed' as const)
        : visit.progress
      : ('unplaced' as const);
    return [{ ...visit, vanId: move.vanId, from: move.from, to: move.to, progress }];
  });
  return takeIn(board, moved);
}

/** Puts visits where they now belong on this day's board, or off it. */
function takeIn(board: BoardDto, visits: VisitDto[]): BoardDto {
  const { startsAt, endsAt } = dayBounds(board.day, board.zone);
  const isOther = (visit: VisitDto) => !visits.some((v) => v.id === visit.id);
  const isHere = ({ from }: VisitDto) =>
    from !== null && Date.parse(from) >= Date.parse(startsAt) && Date.parse(from) < Date.parse(endsAt);
  return {
    ...board,
    visits: [...board.visits.filter(isOther), ...visits.filter(isHere)],
    unplaced: [...board.unplaced.filter(isOther), ...visits.filter((visit) => visit.progress === 'unplaced')],
  };
}
