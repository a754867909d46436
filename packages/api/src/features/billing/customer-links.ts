import { createHmac, timingSafeEqual } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { parse, stringify, v7 as uuid } from 'uuid';
import { CustomerLink } from '../../db/models/index.ts';
import { select } from '../../db/sequelize.ts';

const SIGNATURE_BYTES = 16;
/** How long a customer's page stays open after it was last handed out. */
const LIVES_DAYS = 90;

/** Signs the addresses of customers' own pages: whoever has one sees that job and nothing else, without an account. */
export class CustomerLinks {
  private readonly secret: string;

  constructor(secret: string) {
    this.secret = secret;
  }

  /** The token of a job's page; made anew it is the same, and good for another while. */
  async tokenFor(tx: Transaction, jobId: string, now: Date): Promise<string> {
    const expiresAt = new Date(now.getTime() + LIVES_DAYS * 86_400_000);
    const [link] = await select<{ id: string }>(
      `INSERT INTO customer_links (id, job_id, created_at, expires_at) VALUES (:id, :jobId, :now, :expiresAt)
       ON CONFLICT (job_id) DO UPDATE SET expires_at = excluded.expires_at, revoked_at = NULL RETURNING id`,
      { id: uuid(), jobId, now, expiresAt },
      tx,
    );
    if (!link) throw new Error('an upsert answers its row');
    const id = Buffer.from(parse(link.id));
    return Buffer.concat([id, this.sign(id)]).toString('base64url');
  }

  /** The job of a token; null for one that was not signed here, has run out or was taken back. */
  async jobOf(token: string, now: Date): Promise<string | null> {
    const bytes = Buffer.from(token, 'base64url');
    if (bytes.length !== 16 + SIGNATURE_BYTES) return null;
    const id = bytes.subarray(0, 16);
    if (!timingSafeEqual(bytes.subarray(16), this.sign(id))) return null;
    const link = await CustomerLink.findByPk(stringify(id));
    if (!link || link.revokedAt || link.expiresAt <= now) return null;
    return link.jobId;
  }

  private sign(id: Buffer): Buffer {
    return createHmac('sha256', this.secret).update('customer-page').update(id).digest().subarray(0, SIGNATURE_BYTES);
  }
}
