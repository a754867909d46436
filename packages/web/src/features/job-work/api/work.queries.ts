import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';
import type { QueryClient } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type { DayWorkDto, WorkActionBody, postJobChange } from '@driprail/shared/contracts/job-work.contract';
import { getDayWorkAt } from '@driprail/shared/contracts/phone-addresses';
import type { WorkKind } from '@driprail/shared/domain/job-work/fold-work';
import { call } from '../../../lib/call.ts';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';
import { orKept } from '../../../lib/outbox/or-kept.ts';
import { press } from '../../../lib/outbox/outbox.ts';

/** A day's steps and must-knows, or in a dead zone the copy that this phone kept of them. */
export const dayWorkQuery = (userId: string, day: string) =>
  queryOptions({
    queryKey: ['work', 'day', day],
    networkMode: 'always',
    retry: 0,
    queryFn: ({ signal }): Promise<DayWorkDto> =>
      orKept(`${userId}:work:${day}`, () => call(getDayWorkAt, { params: { day } }, signal)),
    refetchInterval: 60_000,
  });

/** Brings days onto the phone before they are needed, for a dead zone. */
export async function keepWork(client: QueryClient, userId: string, days: string[]): Promise<void> {
  await Promise.all(days.map((day) => client.prefetchQuery(dayWorkQuery(userId, day))));
}

const stamped = () => ({ key: uuid(), deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs() });

const kindWords: Record<WorkKind, string> = {
  confirm: 'Must-knows confirmed',
  tick: 'Ticked',
  untick: 'Tick taken back',
  start_line: 'Timer started',
  stop_line: 'Timer stopped',
  used: 'Used',
  note: 'Note',
  go_on: 'Going on without',
  key_taken: 'Key taken',
  key_back: 'Key handed back',
};

export interface AtVisit {
  visitId: string;
  customerName: string;
}

export type WorkPress = Omit<WorkActionBody, 'key' | 'deviceAt' | 'offsetMs'>;

/** A press at the car: kept on the phone at once, sent when there is signal. */
export function usePressWork({ visitId, customerName }: AtVisit) {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: async (presses: WorkPress | WorkPress[]) => {
      for (const action of Array.isArray(presses) ? presses : [presses]) {
        const body = { ...stamped(), ...action };
        const words = `${kindWords[action.kind]}, ${customerName}`;
        await press(client, { key: body.key, path: 'work', targetId: visitId, body, words });
      }
    },
  });
}

/** Done, from the job's own page; the run sheet's outbox carries it like any mark. */
export function usePressDone({ visitId, customerName }: AtVisit) {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: () => {
      const body = { ...stamped(), kind: 'finish' };
      return press(client, { key: body.key, path: 'visit', targetId: visitId, body, words: `Done, ${customerName}` });
    },
  });
}

export type ChangePress = Omit<
  NonNullable<RequestOf<typeof postJobChange>['body']>,
  'key' | 'deviceAt' | 'offsetMs' | 'saidYes'
> & { saidYesBy: string };

export function usePressChange({ visitId, customerName }: AtVisit) {
  const client = useQueryClient();
  return useMutation({
    networkMode: 'always',
    mutationFn: ({ saidYesBy, ...change }: ChangePress) => {
      const stamps = stamped();
      const body = { ...stamps, ...change, saidYes: { by: saidYesBy, at: stamps.deviceAt } };
      const words = `Change of the job, ${customerName}`;
      return press(client, { key: body.key, path: 'change', targetId: visitId, body, words });
    },
  });
}
