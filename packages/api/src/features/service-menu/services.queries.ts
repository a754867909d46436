import type { Transaction } from 'sequelize';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { select } from '../../db/sequelize.ts';

/** The menu with the prices in force on a day; `id` narrows to one service. */
export function listServices(on: string, id: string | null = null, tx?: Transaction): Promise<ServiceDto[]> {
  return select<ServiceDto>(
    `SELECT s.id, s.name, s.kind, s.description, s.skills, s.equipment, s.photo_set AS "photoSet",
            json_build_object('water', s.needs_water, 'power', s.needs_power, 'dry', s.needs_dry, 'daylight', s.needs_daylight,
              'coldestTenths', s.coldest_tenths, 'hottestTenths', s.hottest_tenths) AS needs,
            s.cure_hours AS "cureHours", s.interval_days AS "intervalDays", s.deposit_percent AS "depositPercent",
            coalesce((SELECT json_agg(i.included_id ORDER BY i.position) FROM service_includes i WHERE i.service_id = s.id), '[]') AS includes, s.tax_class AS "taxClass", s.is_active AS "isActive", s.position, s.version,
            coalesce((SELECT json_agg(p ORDER BY array_position(ARRAY['coupe','sedan','small_suv','large_suv','van'], p."sizeClass")) FROM (
              SELECT DISTINCT ON (size_class) size_class AS "sizeClass", price_cents AS "priceCents", minutes, starts_on AS "startsOn"
                FROM service_prices WHERE service_id = s.id AND starts_on <= :on ORDER BY size_class, starts_on DESC) p), '[]') AS prices
       FROM services s WHERE (:id::uuid IS NULL OR s.id = :id::uuid) ORDER BY s.is_active DESC, s.position, s.name`,
    { on, id },
    tx,
  );
}
