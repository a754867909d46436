import { createHmac, timingSafeEqual } from 'node:crypto';
import { parse, stringify } from 'uuid';
import { messageGroups } from '@driprail/shared/domain/messages/kinds';
import type { MessageGroup } from '@driprail/shared/domain/messages/kinds';

const ID_BYTES = 16;
const SIGNATURE_BYTES = 16;

/** Signs the links by which a customer stops a group of mails. They have no end: a mail may lie for years. */
export class StopTokens {
  private readonly secret: string;

  constructor(secret: string) {
    this.secret = secret;
  }

  tokenFor(customerId: string, group: MessageGroup): string {
    const said = Buffer.concat([Buffer.from(parse(customerId)), Buffer.from([messageGroups.indexOf(group)])]);
    return Buffer.concat([said, this.sign(said)]).toString('base64url');
  }

  /** Whose link it is and what it stops; null for one that was not signed here. */
  read(token: string): { customerId: string; group: MessageGroup } | null {
    const bytes = Buffer.from(token, 'base64url');
    if (bytes.length !== ID_BYTES + 1 + SIGNATURE_BYTES) return null;
    const said = bytes.subarray(0, ID_BYTES + 1);
    if (!timingSafeEqual(bytes.subarray(ID_BYTES + 1), this.sign(said))) return null;
    const group = messageGroups[said[ID_BYTES] ?? -1];
    return group ? { customerId: stringify(said.subarray(0, ID_BYTES)), group } : null;
  }

  private sign(said: Buffer): Buffer {
    return createHmac('sha256', this.secret).update('message-stop').update(said).digest().subarray(0, SIGNATURE_BYTES);
  }
}
