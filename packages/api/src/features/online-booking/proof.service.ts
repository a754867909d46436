import { randomInt } from 'node:crypto';
import { addMinutes, dayOf } from '@driprail/shared/domain/time/zone';
import { formatDay, formatSpan } from '@driprail/shared/domain/time/format';
import { companyOf } from '../../db/company.ts';
import { inTransaction, run } from '../../db/sequelize.ts';
import { conflict, unprocessable } from '../../http/errors.ts';
import { queueMail } from '../../outbox/mails.ts';
import type { Contact } from './hold-rows.ts';
import { HOLD_MINUTES, codeHash, lockHold } from './hold-rows.ts';
import { readOnlineSettings } from './settings.queries.ts';

/** A mistyped address, a mail that got lost: after these somebody calls. */
const MOST_CODES = 3;

export interface ProofAsk extends Omit<Contact, 'acceptedAt'> {
  email: string;
  website: string;
}

/**
 * Keeps who books, and sends a code to the address; the place is kept for another ten minutes.
 * @throws 409 when the hold is over or the terms are new, 422 after too many codes
 */
export function sendCode(holdId: string, { email, website, ...contact }: ProofAsk, now: Date): Promise<string> {
  return inTransaction(async (tx) => {
    const hold = await lockHold(tx, holdId, now);
    const expiresAt = addMinutes(now.toISOString(), HOLD_MINUTES);
    // A program filled in what no person sees: it hears nothing of it, and no mail goes out.
    if (website !== '') return expiresAt;
    const { policyVersion } = await readOnlineSettings(tx);
    if (policyVersion !== contact.policyVersion)
      throw conflict('new_terms', 'The terms have changed meanwhile. Read them again and accept the newer ones.');
    if (hold.codesSent >= MOST_CODES)
      throw unprocessable('too_many_codes', 'Three codes were sent already. Choose a time again, or call us.');
    const code = String(randomInt(1_000_000)).padStart(6, '0');
    await run(
      `UPDATE booking_holds SET email = :email, contact = :contact, code_hash = :hash, tries = 0, codes_sent = codes_sent + 1,
              expires_at = :expiresAt WHERE id = :holdId`,
      {
        ...{ holdId, email, hash: codeHash(holdId, code), expiresAt },
        contact: JSON.stringify({ ...contact, acceptedAt: now.toISOString() } satisfies Contact),
      },
      tx,
    );
    const { name, zone, clock } = await companyOf(tx);
    const when = `${formatDay(dayOf(hold.from, zone))}, ${formatSpan(hold.from, hold.to, zone, clock)}`;
    await queueMail(tx, now, {
      to: email,
      subject: `${code} is your code at ${name}`,
      body: `Somebody, we think you, is booking with ${name}: ${when}.\n\nType this code on the page to book it:\n\n${code}\n\nIt is good for ten minutes. If it was not you, do nothing: without the code nothing is booked.\n`,
    });
    return expiresAt;
  });
}
