import type { Transaction } from 'sequelize';
import type { OfferedDays, OnlineSettingsDto } from '@driprail/shared/contracts/online-booking.contract';
import { findPlace } from '@driprail/shared/domain/availability/find-place';
import { keepPromises, openWindows } from '@driprail/shared/domain/availability/open-windows';
import type { FoundPlace, FreeVan, Span, WantedWork } from '@driprail/shared/domain/availability/plan';
import { addDays, addMinutes, dayOf, isBefore, minutesBetween } from '@driprail/shared/domain/time/zone';
import { dayBounds, instantOf } from '@driprail/shared/domain/time/zone-instants';
import { companyOf } from '../../db/company.ts';
import type { CompanySettings } from '../../db/models/index.ts';
import { readOnlineSettings } from './settings.queries.ts';
import { readVanDays } from './van-days.queries.ts';

/** Whose own hold or visits stand in nobody's way. */
export interface Own {
  hold?: string | null;
  job?: string | null;
}

/** Days that may be booked, each window free or not; a day whose windows have all gone by is left out. */
export async function readWindows(work: WantedWork, now: Date, own: Own = {}): Promise<OfferedDays> {
  const [company, settings] = [await companyOf(), await readOnlineSettings()];
  const days = bookableDays(settings, company, now);
  const [first, last] = [days[0], days.at(-1)];
  if (!first || !last) return [];
  const hours = (day: string) => hoursOf(day, company);
  const { vans, promises } = await readVanDays(asked(first.day, last.day, company, now, own));
  const left = keepPromises(vans, promises, (instant) => hours(dayOf(instant, company.zone)));
  const vansOn = byDay(left, company.zone);
  return days.map(({ day, windows }) => {
    const open = hours(day);
    return {
      day,
      windows: openWindows(vansOn(day), work, windows, open).map(({ from, to, place }) => ({
        ...{ from, to, isFree: place !== null },
        minutes: place && minutesBetween(place.from, place.to),
      })),
    };
  });
}

/** The place on a van that keeps the window that starts at `from`; null when it is gone, or none that we offer. */
export async function findOpenPlace(
  tx: Transaction,
  work: WantedWork,
  from: string,
  now: Date,
  own: Own = {},
): Promise<{ window: Span; place: FoundPlace } | null> {
  const [company, settings] = [await companyOf(tx), await readOnlineSettings(tx)];
  const windows = bookableDays(settings, company, now).flatMap((one) => one.windows);
  const window = windows.find((one) => one.from === from);
  if (!window) return null;
  const place = await findPlaceIn(tx, work, window, now, own);
  return place && { window, place };
}

/** The same for a window that was promised before, although it may be too near by now to be offered. */
export async function findPlaceIn(
  tx: Transaction,
  work: WantedWork,
  window: Span,
  now: Date,
  own: Own,
): Promise<FoundPlace | null> {
  const company = await companyOf(tx);
  const day = dayOf(window.from, company.zone);
  const { vans, promises } = await readVanDays(asked(day, day, company, now, own), tx);
  const open = hoursOf(day, company);
  return findPlace(
    keepPromises(vans, promises, () => open),
    work,
    window,
    open,
  );
}

function asked(first: string, last: string, { zone }: CompanySettings, now: Date, own: Own) {
  return {
    ...{ from: dayBounds(first, zone).startsAt, to: dayBounds(last, zone).endsAt, now: now.toISOString() },
    ...{ ownHold: own.hold ?? null, ownJob: own.job ?? null },
  };
}

function hoursOf(day: string, { dayStartsAt, dayEndsAt, zone }: CompanySettings): Span {
  return { from: instantOf(day, dayStartsAt, zone), to: instantOf(day, dayEndsAt, zone) };
}

function bookableDays(
  { noticeHours, farthestDays, starts, windowMinutes }: OnlineSettingsDto,
  { zone }: CompanySettings,
  now: Date,
): { day: string; windows: Span[] }[] {
  const today = dayOf(now.toISOString(), zone);
  const earliest = addMinutes(now.toISOString(), noticeHours * 60);
  const days = Array.from({ length: farthestDays + 1 }, (_, ahead) => addDays(today, ahead));
  return days
    .map((day) => ({
      day,
      windows: starts
        .map((start) => instantOf(day, start, zone))
        .map((from) => ({ from, to: addMinutes(from, windowMinutes) }))
        .filter(({ from }) => !isBefore(from, earliest)),
    }))
    .filter(({ windows }) => windows.length > 0);
}

/** What touches a day, and no more, is looked at for each of its windows; each instant is read once. */
function byDay(vans: readonly FreeVan[], zone: string): (day: string) => FreeVan[] {
  const read = vans.map((van) => ({ ...van, crew: van.crew.map(inTime), busy: van.busy.map(inTime) }));
  return (day) => {
    const { startsAt, endsAt } = dayBounds(day, zone);
    const [start, end] = [Date.parse(startsAt), Date.parse(endsAt)];
    const near = <T extends Span>(spans: Timed<T>[]) =>
      spans.filter(({ begins, ends }) => begins < end && ends > start).map(({ span }) => span);
    return read.map((van) => ({ ...van, crew: near(van.crew), busy: near(van.busy) }));
  };
}

interface Timed<T extends Span> {
  span: T;
  begins: number;
  ends: number;
}

function inTime<T extends Span>(span: T): Timed<T> {
  return { span, begins: Date.parse(span.from), ends: Date.parse(span.to) };
}
