import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import { getClockAt, getRunSheetAt } from '@driprail/shared/contracts/phone-addresses';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockStateDto } from '@driprail/shared/contracts/clock.contract';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type { recordTip } from '@driprail/shared/contracts/jobs.contract';
import type { RunSheetDto, RunVisitDto, postVisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import { actionNames } from '@driprail/shared/domain/board/progress';
import { call } from '../../../lib/call.ts';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';
import { orKept } from '../../../lib/outbox/or-kept.ts';
import { press } from '../../../lib/outbox/outbox.ts';

/** The run sheet, or in a dead zone the copy that this phone kept of it. */
export const runSheetQuery = (userId: string, day: string) =>
  queryOptions({
    queryKey: ['run-sheet', day],
    networkMode: 'always',
    retry: 0,
    queryFn: ({ signal }): Promise<RunSheetDto> =>
      orKept(`${userId}:run-sheet:${day}`, () => call(getRunSheetAt, { params: { day } }, signal)),
    refetchInterval: 60_000,
  });

export const clockQuery = (userId: string) =>
  queryOptions({
    queryKey: ['clock', 'own'],
    networkMode: 'always',
    retry: 0,
    queryFn: ({ signal }): Promise<{ clock: ClockStateDto | null }> =>
      orKept(`${userId}:clock`, () => call(getClockAt, {}, signal)),
  });

/** Puts what a dead zone will ask for on the phone: the clock and tomorrow's run sheet. */
export async function keepDays(client: QueryClient, userId: string, tomorrow: string): Promise<void> {
  await Promise.all([client.prefetchQuery(clockQuery(userId)), client.prefetchQuery(runSheetQuery(userId, tomorrow))]);
}

type VisitActionBody = NonNullable<RequestOf<typeof postVisitAction>['body']>;
/** What was pressed; the key and the time are made with it, so that sending it twice marks once. */
export type VisitPress = Omit<VisitActionBody, 'key' | 'deviceAt' | 'offsetMs'>;

const stamped = () => ({ key: uuid(), deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs() });

/** Marks a visit: kept on the phone at once, sent when there is signal. */
export function usePressVisit() {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: ({ visit, ...action }: VisitPress & { visit: RunVisitDto }) => {
      const body = { ...stamped(), ...action };
      return press(client, {
        key: body.key,
        path: 'visit',
        targetId: visit.id,
        body,
        words: `${wordsOf(action.kind)}, ${visit.customerName}`,
      });
    },
  });
}

function wordsOf(kind: VisitActionBody['kind']): string {
  if (kind === 'undo') return 'Taken back';
  return kind === 'trouble' ? 'Trouble' : actionNames[kind];
}

interface ClockPress {
  action: 'start' | 'stop';
  kind?: ClockKindName;
  /** Somebody who rides along; left out: oneself. */
  mate?: { personId: string; name: string };
}

/** Presses one's own clock, or that of somebody who rides along. */
export function usePressClock() {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: ({ mate, ...action }: ClockPress) => {
      const body = { ...stamped(), ...action, ...(mate && { forPersonId: mate.personId }) };
      const done = action.action === 'stop' ? 'Clock out' : `Clock: ${action.kind ?? 'in'}`;
      const words = mate ? `${done}, ${mate.name}` : done;
      return press(client, { key: body.key, path: 'clock', targetId: '', body, words });
    },
  });
}

export function useRecordTip(visit: RunVisitDto) {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: (tip: Omit<NonNullable<RequestOf<typeof recordTip>['body']>, 'key'>) => {
      const body = { key: uuid(), ...tip };
      return press(client, {
        key: body.key,
        path: 'tip',
        targetId: visit.jobId,
        body,
        words: `Tip, ${visit.customerName}`,
      });
    },
  });
}
