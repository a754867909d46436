import type { Transaction } from 'sequelize';
import { v7 as uuid } from 'uuid';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import { sizeClassNames } from '@driprail/shared/contracts/fields';
import { JobLine, Vehicle } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';
import { unprocessable } from '../../http/errors.ts';

export interface LineFields {
  id?: string | undefined;
  serviceId: string;
  vehicleId: string | null;
  sizeClass: SizeClass;
  priceCents?: number | undefined;
  minutes?: number | undefined;
}

export interface PricedLine extends Omit<LineFields, 'priceCents' | 'minutes'> {
  priceCents: number;
  minutes: number;
}

/** Fills in the menu's price and minutes of the day where the order names none. @throws 422 at the line that is not sold */
export async function priceLines(
  tx: Transaction,
  lines: LineFields[],
  on: string,
  customerId: string,
): Promise<PricedLine[]> {
  const prices = await select<{ serviceId: string; sizeClass: string; priceCents: number; minutes: number }>(
    `SELECT DISTINCT ON (service_id, size_class) service_id AS "serviceId", size_class AS "sizeClass", price_cents AS "priceCents", minutes
       FROM service_prices WHERE service_id IN (:ids) AND starts_on <= :on ORDER BY service_id, size_class, starts_on DESC`,
    { ids: lines.map((line) => line.serviceId), on },
    tx,
  );
  await refuseForeignVehicles(tx, lines, customerId);
  return lines.map((line, index) => {
    const menu = prices.find((p) => p.serviceId === line.serviceId && p.sizeClass === line.sizeClass);
    const priceCents = line.priceCents ?? menu?.priceCents;
    const minutes = line.minutes ?? menu?.minutes;
    if (priceCents === undefined || minutes === undefined) {
      const message = `This is not on the menu for ${sizeClassNames[line.sizeClass].toLowerCase()}. Choose another size class or service.`;
      throw unprocessable('not_on_menu', message, { fields: { [`lines.${index}.serviceId`]: message } });
    }
    return { ...line, priceCents, minutes };
  });
}

async function refuseForeignVehicles(tx: Transaction, lines: LineFields[], customerId: string): Promise<void> {
  const own = new Set((await Vehicle.findAll({ where: { customerId }, transaction: tx })).map((vehicle) => vehicle.id));
  const index = lines.findIndex((line) => line.vehicleId !== null && !own.has(line.vehicleId));
  if (index < 0) return;
  const message = 'Choose one of this customer’s vehicles.';
  throw unprocessable('foreign_vehicle', message, { fields: { [`lines.${index}.vehicleId`]: message } });
}

/** Adds, changes and drops lines; finished ones stay as they are. @returns the ids in order, with those that are new */
export async function keepLines(
  tx: Transaction,
  jobId: string,
  lines: PricedLine[],
): Promise<{ ids: string[]; newIds: string[]; goneIds: string[] }> {
  const known = new Map((await JobLine.findAll({ where: { jobId }, transaction: tx })).map((line) => [line.id, line]));
  const ids: string[] = [];
  const newIds: string[] = [];
  for (const [position, { id, ...fields }] of lines.entries()) {
    const line = id ? known.get(id) : undefined;
    if (line) {
      await line.update(line.finishedAt ? { position } : { ...fields, position }, { transaction: tx });
      known.delete(line.id);
      ids.push(line.id);
    } else {
      const made = await JobLine.create({ id: uuid(), jobId, ...fields, position }, { transaction: tx });
      ids.push(made.id);
      newIds.push(made.id);
    }
  }
  const gone = [...known.values()];
  if (gone.some((line) => line.finishedAt))
    throw unprocessable('finished_line', 'A finished line stays on the job. Give a discount instead.');
  for (const line of gone) await line.destroy({ transaction: tx });
  return { ids, newIds, goneIds: gone.map((line) => line.id) };
}
