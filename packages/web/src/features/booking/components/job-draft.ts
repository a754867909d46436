import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { JobBody, JobDto } from '@driprail/shared/contracts/jobs.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { clockOf, dayOf } from '@driprail/shared/domain/time/zone';
import { instantOf } from '@driprail/shared/domain/time/zone-instants';
import { parseMoney } from '../../../lib/format.ts';

export interface LineDraft {
  id?: string;
  serviceId: string;
  vehicleId: string;
  sizeClass: SizeClass;
  /** Typed; empty means the menu's. */
  price: string;
  isFinished: boolean;
}
/** A job as it is being typed: text stays text until it is saved. */
export interface JobDraft {
  customerId: string;
  addressId: string;
  windowDay: string;
  windowFrom: string;
  windowTo: string;
  notes: string;
  discount: string;
  discountReason: string;
  lines: LineDraft[];
}

export function emptyDraft(day: string): JobDraft {
  return {
    customerId: '',
    addressId: '',
    windowDay: day,
    windowFrom: '',
    windowTo: '',
    notes: '',
    discount: '',
    discountReason: '',
    lines: [],
  };
}

export function draftOf(job: JobDto, zone: string, isCopy: boolean, day: string): JobDraft {
  const hasWindow = job.windowFrom !== null && job.windowTo !== null && !isCopy;
  return {
    customerId: job.customerId,
    addressId: job.addressId,
    windowDay: hasWindow && job.windowFrom ? dayOf(job.windowFrom, zone) : day,
    windowFrom: hasWindow && job.windowFrom ? clockOf(job.windowFrom, zone) : '',
    windowTo: hasWindow && job.windowTo ? clockOf(job.windowTo, zone) : '',
    notes: job.notes,
    discount: job.discountCents === 0 || isCopy ? '' : (job.discountCents / 100).toFixed(2),
    discountReason: isCopy ? '' : job.discountReason,
    lines: job.lines.map((line) => ({
      ...(!isCopy && { id: line.id }),
      serviceId: line.serviceId,
      vehicleId: line.vehicleId ?? '',
      sizeClass: line.sizeClass,
      price: isCopy ? '' : (line.priceCents / 100).toFixed(2),
      isFinished: line.isFinished && !isCopy,
    })),
  };
}

/** The draft as the API takes it, or sentences at the fields that can't be read. */
export function bodyOf(draft: JobDraft, zone: string): { body: JobBody } | { fields: Record<string, string> } {
  const fields: Record<string, string> = {};
  const discount = draft.discount.trim() === '' ? 0 : parseMoney(draft.discount);
  if (discount === null) fields['discountCents'] = 'Give an amount like 15.00.';
  if (draft.customerId === '') fields['customerId'] = 'Choose a customer, or add a new one.';
  if (draft.lines.length === 0) fields['lines'] = 'Add at least one service.';
  if ((draft.windowFrom === '') !== (draft.windowTo === ''))
    fields['windowTo'] = 'Give both ends of the window, or none.';
  const lines = draft.lines.map((line, index) => {
    const priceCents = line.price.trim() === '' ? undefined : parseMoney(line.price);
    if (priceCents === null) fields[`lines.${index}.priceCents`] = 'Give an amount like 240.00.';
    if (line.serviceId === '') fields[`lines.${index}.serviceId`] = 'Choose a service.';
    return {
      ...(line.id && { id: line.id }),
      serviceId: line.serviceId,
      vehicleId: line.vehicleId || null,
      sizeClass: line.sizeClass,
      ...(typeof priceCents === 'number' && { priceCents }),
    };
  });
  if (Object.keys(fields).length > 0) return { fields };
  const at = (clock: string) => (clock === '' ? null : instantOf(draft.windowDay, clock, zone));
  return {
    body: {
      customerId: draft.customerId,
      addressId: draft.addressId,
      windowFrom: at(draft.windowFrom),
      windowTo: at(draft.windowTo),
      notes: draft.notes,
      discountCents: discount ?? 0,
      discountReason: draft.discountReason,
      lines,
    },
  };
}

export function withCustomer(draft: JobDraft, customer: CustomerDto): JobDraft {
  const vehicle = customer.vehicles[0];
  return {
    ...draft,
    customerId: customer.id,
    addressId: customer.addresses[0]?.id ?? '',
    lines: draft.lines.map((line) => ({
      ...line,
      vehicleId: vehicle?.id ?? '',
      sizeClass: vehicle?.sizeClass ?? line.sizeClass,
    })),
  };
}

/** What the menu asks for a line, in cents; null when it is not sold for that size class. */
export function menuPrice(services: ServiceDto[], line: LineDraft): { priceCents: number; minutes: number } | null {
  return services.find((s) => s.id === line.serviceId)?.prices.find((p) => p.sizeClass === line.sizeClass) ?? null;
}
