import { queryOptions } from '@tanstack/react-query';
import { getBoard, getBoardWeek } from '@driprail/shared/contracts/board.contract';
import { call } from '../../../lib/call.ts';

export const boardQuery = (day: string) =>
  queryOptions({
    queryKey: ['board', day],
    queryFn: ({ signal }) => call(getBoard, { params: { day } }, signal),
    // Progress arrives by hints; once a minute the "now" of lateness is renewed as well.
    refetchInterval: 60_000,
  });

export const boardWeekQuery = (day: string) =>
  queryOptions({
    queryKey: ['board', 'week', day],
    queryFn: ({ signal }) => call(getBoardWeek, { params: { day } }, signal),
  });
