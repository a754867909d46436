import type { OnlineAsk } from '@driprail/shared/contracts/online-booking.contract';
import { sizeClassNames } from '@driprail/shared/contracts/fields';
import type { Coordinates } from '@driprail/shared/domain/board/travel';
import type { WantedWork } from '@driprail/shared/domain/availability/plan';
import { folded } from '@driprail/shared/domain/customer/fold';
import { companyOf, todayOf } from '../../db/company.ts';
import { unprocessable } from '../../http/errors.ts';
import type { Geocoder } from '../../integrations/maps/index.ts';
import { readOfferedServices } from './menu.queries.ts';
import type { OfferedService } from './menu.queries.ts';
import { readOnlineSettings } from './settings.queries.ts';

/** What was asked for, at the prices that were shown. */
export interface AskedWork {
  ask: OnlineAsk;
  lines: { serviceId: string; priceCents: number; minutes: number }[];
  work: WantedWork;
}

/**
 * What a stranger asks for, held against what is offered and where we go.
 * @throws 422 at the field, with whom to call
 */
export async function resolveAsk(geocoder: Geocoder | null, ask: OnlineAsk, now: Date): Promise<AskedWork> {
  const settings = await readOnlineSettings();
  const { phone } = await companyOf();
  const call = phone ? `Call us at ${phone} and we see what can be done.` : 'Ask us and we see what can be done.';
  if (!settings.isOn) throw unprocessable('online_off', `Booking online is closed just now. ${call}`);
  if (!isInArea(settings.places, ask)) {
    const message = `We do not come to ${ask.city} by this page. ${call}`;
    throw unprocessable('outside_area', message, { fields: { city: message } });
  }
  const offered = await readOfferedServices(await todayOf(now));
  const chosen = [...new Set(ask.serviceIds)].map((id) => offered.find((service) => service.id === id));
  const services = chosen.filter((service) => service !== undefined);
  if (services.length < chosen.length || services.every(({ kind }) => kind === 'add_on')) {
    const message = 'Choose a service from this page; add-ons come with one.';
    throw unprocessable('not_offered', message, { fields: { serviceIds: message } });
  }
  const lines = services.map((service) => lineOf(service, ask));
  const place = (await geocoder?.find(ask).catch(() => null)) ?? null;
  return { ask, lines, work: workOf(services, lines, ask, place) };
}

/** No places named: we go everywhere. A postcode counts by its first five signs. */
function isInArea(places: string[], { city, postcode }: OnlineAsk): boolean {
  const plain = (text: string) => folded(text).trim();
  const named = new Set(places.map(plain));
  return named.size === 0 || named.has(plain(city)) || named.has(plain(postcode).slice(0, 5));
}

function lineOf(service: OfferedService, { sizeClass }: OnlineAsk): AskedWork['lines'][number] {
  const price = service.prices.find((one) => one.sizeClass === sizeClass);
  if (!price) {
    const message = `${service.name} is not offered for ${sizeClassNames[sizeClass].toLowerCase()}. Choose another service.`;
    throw unprocessable('not_offered', message, { fields: { serviceIds: message } });
  }
  return { serviceId: service.id, priceCents: price.priceCents, minutes: price.minutes };
}

function workOf(
  services: OfferedService[],
  lines: AskedWork['lines'],
  ask: OnlineAsk,
  place: Coordinates | null,
): WantedWork {
  return {
    lineMinutes: lines.map(({ minutes }) => minutes),
    skills: [...new Set(services.flatMap(({ skills }) => skills))],
    equipment: [...new Set(services.flatMap(({ equipment }) => equipment))],
    bringsWater: !ask.hasWater && services.some(({ needsWater }) => needsWater),
    bringsPower: !ask.hasPower && services.some(({ needsPower }) => needsPower),
    place,
  };
}
