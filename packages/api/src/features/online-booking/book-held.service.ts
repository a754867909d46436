import type { Transaction } from 'sequelize';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import { inTransaction, run } from '../../db/sequelize.ts';
import type { Doer } from '../../http/context.ts';
import { conflict, unprocessable } from '../../http/errors.ts';
import type { CustomerLinks } from '../billing/index.ts';
import { placeVisit } from '../board/index.ts';
import { orderJob } from '../booking/index.ts';
import { customerFor } from '../customers/index.ts';
import type { Contact, HoldRow } from './hold-rows.ts';
import { codeHash, lockHold, takeTurn } from './hold-rows.ts';
import { findPlaceIn } from './windows.queries.ts';

const MOST_TRIES = 5;

/** A stranger who has proved an e-mail address, and may do nothing but this. */
export const online = (now: Date): Doer => ({
  actor: { userId: null, role: 'customer' },
  name: 'Booked online',
  now: () => now,
});

export interface Booked {
  jobNumber: number;
  from: string;
  to: string;
  path: string;
}

/**
 * Books what is held: customer, job at the prices shown, and the visit on a van that keeps the window. If dispatch has used
 * the place meanwhile and no other van is free, the visit is on Unplaced with its promise, marked for dispatch.
 * @throws 409 when the hold is over, 422 at the code
 */
export async function bookHeld(links: CustomerLinks, holdId: string, code: string, now: Date): Promise<Booked> {
  const outcome = await inTransaction(async (tx) => {
    await takeTurn(tx);
    const hold = await lockHold(tx, holdId, now);
    if (!hold.contact || !hold.email || !hold.codeHash)
      throw conflict('no_code', 'Say who you are first; the code comes by mail.');
    if (hold.tries >= MOST_TRIES) throw wrongCode('Five wrong codes. Have another code sent.');
    if (hold.codeHash === codeHash(holdId, code))
      return book(tx, links, hold, { ...hold.contact, email: hold.email }, now);
    // Kept although the press is refused: guessing ends.
    await run('UPDATE booking_holds SET tries = tries + 1 WHERE id = :holdId', { holdId }, tx);
    return null;
  });
  if (!outcome) throw wrongCode('That is not the code. Look at the latest mail and type its six digits.');
  return outcome;
}

function wrongCode(message: string) {
  return unprocessable('wrong_code', message, { fields: { code: message } });
}

async function book(
  tx: Transaction,
  links: CustomerLinks,
  { id, from, to, asked }: HoldRow,
  contact: Contact & { email: string },
  now: Date,
): Promise<Booked> {
  const { ask, lines, work } = asked;
  const doer = online(now);
  const place = await findPlaceIn(tx, work, { from, to }, now, { hold: id });
  const { customerId, addressId, vehicleId } = await customerFor(tx, doer, {
    ...{ name: contact.name, phone: contact.phone, email: contact.email },
    address: {
      ...{ line: ask.line, city: ask.city, postcode: ask.postcode, area: '', gateCode: '', accessNotes: '' },
      ...{ lat: work.place?.lat ?? null, lng: work.place?.lng ?? null, hasWater: ask.hasWater, hasPower: ask.hasPower },
    },
    vehicle: { label: contact.vehicle, color: '', plate: '', sizeClass: ask.sizeClass, notes: '' },
  });
  const said = [
    place
      ? 'Booked online.'
      : 'Booked online, and the place that was held is gone: find another in the promised window.',
    contact.notes,
  ];
  const job = await orderJob(tx, doer, {
    ...{ customerId, addressId, windowFrom: from, windowTo: to, discountCents: 0, discountReason: '' },
    notes: said.filter(Boolean).join('\n'),
    lines: lines.map((line) => ({ ...line, vehicleId, sizeClass: ask.sizeClass })),
  });
  if (place) await placeVisit(tx, doer, firstVisit(job), place);
  await run(
    'INSERT INTO online_bookings (job_id, policy_version, accepted_at) VALUES (:jobId, :version, :acceptedAt)',
    { jobId: job.id, version: contact.policyVersion, acceptedAt: contact.acceptedAt },
    tx,
  );
  await run('DELETE FROM booking_holds WHERE id = :id', { id }, tx);
  return { jobNumber: job.number, from, to, path: `/c/${await links.tokenFor(tx, job.id, now)}` };
}

function firstVisit({ visits }: JobDto): string {
  const [visit] = visits;
  if (!visit) throw new Error('an ordered job has a visit');
  return visit.id;
}
