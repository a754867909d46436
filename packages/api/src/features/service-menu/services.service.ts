import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import type { TaxClass } from '@driprail/shared/domain/billing/tax-rates';
import type { PhotoSet } from '@driprail/shared/domain/walk-round/views';
import { usualPhotoSet } from '@driprail/shared/domain/walk-round/views';
import { audit } from '../../db/audit.ts';
import { todayOf } from '../../db/company.ts';
import { Service, ServicePrice } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import type { MenuFacts } from './menu-facts.ts';
import { given, keepIncludes, needColumns } from './menu-facts.ts';
import { listServices } from './services.queries.ts';

export type ServiceFields = Pick<
  ServiceDto,
  'name' | 'kind' | 'description' | 'skills' | 'equipment' | 'isActive' | 'position'
> &
  MenuFacts & {
    /** Left out: the usual one of its kind. */
    photoSet?: PhotoSet | undefined;
    /** Left out: taxed, or as it was. */
    taxClass?: TaxClass | undefined;
  };
export interface PriceFields {
  sizeClass: SizeClass;
  priceCents: number;
  minutes: number;
}

export function createService(
  ctx: Ctx,
  { prices, startsOn, needs, includes, ...fields }: ServiceFields & { prices: PriceFields[]; startsOn: string },
  id = uuid(),
): Promise<ServiceDto> {
  return inTransaction(async (tx) => {
    const photoSet = fields.photoSet ?? usualPhotoSet(fields.kind);
    const columns = { ...given(fields), ...needColumns(needs), photoSet };
    await Service.create({ id, ...columns }, { transaction: tx });
    await keepIncludes(tx, id, includes);
    await putPrices(tx, id, startsOn, prices);
    return saved(tx, ctx, id, 'added');
  });
}

export function updateService(
  ctx: Ctx,
  id: string,
  { version, needs, includes, ...fields }: ServiceFields & { version: number },
): Promise<ServiceDto> {
  return inTransaction(async (tx) => {
    const service = await Service.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!service) throw notFound('That service');
    if (service.version !== version)
      throw conflict('stale', `Somebody changed ${service.name} meanwhile. Reload and try again.`);
    await service.update({ ...given(fields), ...needColumns(needs), version: version + 1 }, { transaction: tx });
    await keepIncludes(tx, id, includes);
    return saved(tx, ctx, id, 'changed');
  });
}

/** New prices from a date on; jobs keep the price they were quoted. */
export function setServicePrices(ctx: Ctx, id: string, startsOn: string, prices: PriceFields[]): Promise<ServiceDto> {
  return inTransaction(async (tx) => {
    const service = await Service.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!service) throw notFound('That service');
    await putPrices(tx, id, startsOn, prices);
    await service.update({ version: service.version + 1 }, { transaction: tx });
    return saved(tx, ctx, id, 'prices set');
  });
}

async function putPrices(tx: Transaction, serviceId: string, startsOn: string, prices: PriceFields[]): Promise<void> {
  await ServicePrice.bulkCreate(
    prices.map((price) => ({ serviceId, startsOn, ...price })),
    { transaction: tx, updateOnDuplicate: ['priceCents', 'minutes'] },
  );
}

async function saved(tx: Transaction, { actor, now }: Ctx, id: string, action: string): Promise<ServiceDto> {
  await audit(tx, { userId: actor.userId, at: now() }, 'service', id, action);
  const [service] = await listServices(await todayOf(now(), tx), id, tx);
  if (!service) throw notFound('That service');
  hintAfterCommit(tx, ['desk'], 'service', id, service.version);
  return service;
}
