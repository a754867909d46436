import { useQueryClient } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import type { RequestOf } from '@driprail/shared/contracts/endpoint';
import type { postPhoto, postWalkAddition, postWalkRound } from '@driprail/shared/contracts/walk-round.contract';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';
import { press } from '../../../lib/outbox/outbox.ts';

type Body<E extends typeof postPhoto | typeof postWalkAddition | typeof postWalkRound> = NonNullable<
  RequestOf<E>['body']
>;
type Stamp = 'key' | 'deviceAt' | 'offsetMs';
type Unstamped<T> = T extends unknown ? Omit<T, Stamp> : never;

const stamped = () => ({ key: uuid(), deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs() });

/** Presses of a walk-round: each is kept on the phone first, and sent when there is signal. @throws when it can't be kept */
export function useWalkPress({ visitId, customerName }: { visitId: string; customerName: string }) {
  const client = useQueryClient();
  return {
    finish: (facts: Unstamped<Body<typeof postWalkRound>>) => {
      const body = { ...stamped(), ...facts };
      return press(client, {
        key: body.key,
        path: 'walk',
        targetId: visitId,
        body,
        words: `Walk-round, ${customerName}`,
      });
    },
    add: (facts: Unstamped<Body<typeof postWalkAddition>>) => {
      const body = { ...stamped(), ...facts };
      const what = facts.kind === 'mark' ? 'Mark' : 'Second look';
      return press(client, {
        key: body.key,
        path: 'walk_addition',
        targetId: visitId,
        body,
        words: `${what}, ${customerName}`,
      });
    },
    /** Made apart from keeping it: a try again keeps the very same photo. */
    photo: (facts: Unstamped<Body<typeof postPhoto>>, blob: Blob, words: string) => {
      const body = { ...stamped(), ...facts };
      return () =>
        press(
          client,
          { key: body.key, path: 'photo', targetId: visitId, body, words: `${words}, ${customerName}` },
          blob,
        );
    },
  };
}
