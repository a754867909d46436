import type { Transaction } from 'sequelize';
import type { ServiceNeeds } from '@driprail/shared/domain/menu/service-needs';
import { Service, ServiceInclude } from '../../db/models/index.ts';
import { unprocessable } from '../../http/errors.ts';

/** Facts of a service that stay as they were when they are left out. */
export interface MenuFacts {
  needs?: ServiceNeeds | undefined;
  cureHours?: number | undefined;
  intervalDays?: number | null | undefined;
  depositPercent?: number | undefined;
  /** What a package holds, by id. */
  includes?: string[] | undefined;
}

/** Without what was left out. */
export function given<T extends object>(fields: T): { [K in keyof T]: Exclude<T[K], undefined> } {
  const entries = Object.entries(fields).filter(([, value]) => value !== undefined);
  return Object.fromEntries(entries) as { [K in keyof T]: Exclude<T[K], undefined> };
}

export function needColumns(needs: ServiceNeeds | undefined) {
  if (!needs) return {};
  return {
    ...{ needsWater: needs.water, needsPower: needs.power, needsDry: needs.dry, needsDaylight: needs.daylight },
    ...{ coldestTenths: needs.coldestTenths, hottestTenths: needs.hottestTenths },
  };
}

/** @throws 422 at the list for the package itself, another package, or what is not on the menu */
export async function keepIncludes(tx: Transaction, serviceId: string, includes: string[] | undefined): Promise<void> {
  if (!includes) return;
  const ids = [...new Set(includes)];
  const parts = await Service.findAll({ where: { id: ids }, transaction: tx });
  if (parts.length !== ids.length || ids.includes(serviceId) || parts.some((part) => part.kind === 'package')) {
    const message = 'A package holds single services and add-ons of the menu.';
    throw unprocessable('bad_package', message, { fields: { includes: message } });
  }
  await ServiceInclude.destroy({ where: { serviceId }, transaction: tx });
  await ServiceInclude.bulkCreate(
    ids.map((includedId, position) => ({ serviceId, includedId, position })),
    { transaction: tx },
  );
}
