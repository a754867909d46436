import type { OnlineAsk, OnlineMenuDto } from '@driprail/shared/contracts/online-booking.contract';
import type { SizeClass } from '@driprail/shared/contracts/fields';

export const bookSteps = ['car', 'work', 'place', 'time', 'you', 'code'] as const;
export type BookStep = (typeof bookSteps)[number];

interface Window {
  from: string;
  to: string;
}

/** What somebody has filled in so far; kept in this tab until it is booked. */
export interface BookDraft {
  sizeClass: SizeClass | null;
  serviceIds: string[];
  line: string;
  city: string;
  postcode: string;
  hasWater: boolean;
  hasPower: boolean;
  hold: (Window & { id: string; expiresAt: string }) | null;
  vehicle: string;
  name: string;
  phone: string;
  email: string;
  notes: string;
  /** The version of the terms that was accepted; 0 for none. */
  accepted: number;
  isCodeSent: boolean;
  booked: (Window & { jobNumber: number; path: string }) | null;
}

export const emptyDraft: BookDraft = {
  ...{ sizeClass: null, serviceIds: [], line: '', city: '', postcode: '', hasWater: true, hasPower: true },
  ...{ hold: null, vehicle: '', name: '', phone: '', email: '', notes: '', accepted: 0 },
  ...{ isCodeSent: false, booked: null },
};

type Service = OnlineMenuDto['services'][number];
export interface PricedService extends Service {
  priceCents: number;
  minutes: number;
}

/** What is offered for a size, with its price. */
export function servicesFor(menu: OnlineMenuDto, sizeClass: SizeClass | null): PricedService[] {
  return menu.services.flatMap((service) => {
    const price = service.prices.find((one) => one.sizeClass === sizeClass);
    return price ? [{ ...service, priceCents: price.priceCents, minutes: price.minutes }] : [];
  });
}

export function chosenServices(menu: OnlineMenuDto, draft: BookDraft): PricedService[] {
  return servicesFor(menu, draft.sizeClass).filter(({ id }) => draft.serviceIds.includes(id));
}

/** The first step that is still to be done, at or before the one asked for: nobody lands past what is missing. */
export function reachable(wanted: BookStep, menu: OnlineMenuDto, draft: BookDraft): BookStep {
  const done: Record<BookStep, boolean> = {
    car: draft.sizeClass !== null,
    work: chosenServices(menu, draft).some(({ kind }) => kind !== 'add_on'),
    place: draft.line.trim() !== '' && draft.city.trim() !== '',
    time: draft.hold !== null,
    you: draft.isCodeSent,
    code: false,
  };
  return bookSteps.find((step) => step === wanted || !done[step]) ?? 'car';
}

/** What is asked of the server; null while the size is missing. */
export function askOf(menu: OnlineMenuDto, draft: BookDraft): OnlineAsk | null {
  const { sizeClass, line, city, postcode, hasWater, hasPower } = draft;
  if (!sizeClass) return null;
  const serviceIds = chosenServices(menu, draft).map(({ id }) => id);
  return { sizeClass, serviceIds, line, city, postcode, hasWater, hasPower };
}
