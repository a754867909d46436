import type { OnlineMenuDto } from '@driprail/shared/contracts/online-booking.contract';
import { companyOf, todayOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';
import { readOnlineSettings } from './settings.queries.ts';

export interface OfferedService {
  id: string;
  name: string;
  kind: OnlineMenuDto['services'][number]['kind'];
  description: string;
  skills: string[];
  equipment: string[];
  needsWater: boolean;
  needsPower: boolean;
  prices: OnlineMenuDto['services'][number]['prices'];
}

/** What is offered online with the prices of a day; a service without a price on it is left out. */
export async function readOfferedServices(on: string): Promise<OfferedService[]> {
  return select<OfferedService>(
    `SELECT s.id, s.name, s.kind, s.description, to_json(s.skills) AS skills, to_json(s.equipment) AS equipment,
            s.needs_water AS "needsWater", s.needs_power AS "needsPower", p.list AS prices
       FROM online_services o JOIN services s ON s.id = o.service_id AND s.is_active
      CROSS JOIN LATERAL (SELECT json_agg(json_build_object('sizeClass', size_class, 'priceCents', price_cents, 'minutes', minutes)) AS list
        FROM (SELECT DISTINCT ON (size_class) size_class, price_cents, minutes FROM service_prices
               WHERE service_id = s.id AND starts_on <= :on ORDER BY size_class, starts_on DESC) now) p
      WHERE p.list IS NOT NULL ORDER BY s.position, s.name`,
    { on },
  );
}

/** What a stranger sees; while it is off, only whom to call. */
export async function readOnlineMenu(now: Date): Promise<OnlineMenuDto> {
  const company = await companyOf();
  const settings = await readOnlineSettings();
  const { policyVersion: version, policyWords: words, freeUntilHours, lateFeeCents } = settings;
  return {
    ...{ isOn: settings.isOn, companyName: company.name, companyPhone: company.phone },
    ...{ zone: company.zone, clock: company.clock },
    services: settings.isOn ? await readOfferedServices(await todayOf(now)) : [],
    policy: { version, words: settings.isOn ? words : '', freeUntilHours, lateFeeCents },
  };
}
