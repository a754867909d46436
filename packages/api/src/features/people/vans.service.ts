import { v7 as uuid } from 'uuid';
import type { VanDto } from '@driprail/shared/contracts/people.contract';
import { audit } from '../../db/audit.ts';
import { Van } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';

export type VanFields = Omit<VanDto, 'id' | 'version'>;

export function createVan({ actor, now }: Ctx, fields: VanFields, id = uuid()): Promise<VanDto> {
  return inTransaction(async (tx) => {
    const van = await Van.create({ id, ...fields }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'van', id, 'added');
    hintAfterCommit(tx, ['desk'], 'van', id);
    return toVanDto(van);
  });
}

export function updateVan(
  { actor, now }: Ctx,
  id: string,
  { version, ...fields }: VanFields & { version: number },
): Promise<VanDto> {
  return inTransaction(async (tx) => {
    const van = await Van.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!van) throw notFound('That van');
    if (van.version !== version)
      throw conflict('stale', `Somebody changed ${van.name} meanwhile. Reload and try again.`);
    await van.update({ ...fields, version: version + 1 }, { transaction: tx });
    await audit(tx, { userId: actor.userId, at: now() }, 'van', id, 'changed');
    hintAfterCommit(tx, ['everyone'], 'van', id, van.version);
    return toVanDto(van);
  });
}

export function toVanDto(van: Van): VanDto {
  const { id, name, plate, equipment, notes, position, isActive, version } = van;
  return {
    id,
    name,
    plate,
    equipment: equipment as VanDto['equipment'],
    notes,
    position,
    isActive,
    version: version ?? 0,
  };
}
