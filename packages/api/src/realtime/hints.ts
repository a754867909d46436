import type { Transaction } from 'sequelize';
import type { HintEntity } from '@driprail/shared/realtime/hints';
import { afterCommit } from '../db/sequelize.ts';
import type { Audience } from './hub.ts';
import { hub } from './hub.ts';

/** Tells open screens of a change once it has committed. A hint may be lost: clients refetch on reconnect. */
export function hintAfterCommit(
  tx: Transaction,
  audiences: Audience[],
  entity: HintEntity,
  id: string,
  version = 0,
): void {
  afterCommit(
    tx,
    () => hub.hint(audiences, entity, id, version),
    () => undefined,
  );
}
