import type { Transaction } from 'sequelize';
import { Op } from 'sequelize';
import { afterQuiet } from '@driprail/shared/domain/messages/quiet-hours';
import { overtakenBy } from '@driprail/shared/domain/messages/standing';
import type { MessageStanding } from '@driprail/shared/domain/messages/standing';
import { companyOf } from '../../db/company.ts';
import { Message, MessageSettings } from '../../db/models/index.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import type { OutgoingText, Texts } from '../../integrations/texts/index.ts';
import type { OutgoingMail, SendMail } from '../../mail/transport.ts';
import { RETRY_SECONDS } from '../../outbox/retry.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { noteBounce } from './bounces.service.ts';
import { closedBecause, readReach } from './reach.queries.ts';
import { renderMessage } from './render.ts';
import type { RenderParts } from './render.ts';
import { readShownVisit, readStanding } from './standing.queries.ts';

export interface DeliveryParts extends RenderParts {
  sendMail: SendMail;
  /** Null: no text service is set up. */
  texts: Texts | null;
  /** Whether a mail that is handed over twice under one id goes out once. SMTP servers do not promise it. */
  mailKnowsRepeats: boolean;
}

/** What is claimed longer than this was left by a server that stopped. */
const LEFT_MINUTES = 15;
const SETTLING_SECONDS = 60;

type Claimed = { message: Message; hand: () => Promise<void> } | 'decided';

/**
 * Sends what is due. A message is claimed and committed before it is handed over, so that a crash between the two never
 * sends it again by itself; what was left so is judged by `takeUpLeft`.
 * @returns how many were handed over
 */
export async function sendDueMessages(parts: DeliveryParts, now: () => Date): Promise<number> {
  let sent = 0;
  for (;;) {
    const claimed = await inTransaction((tx) => claimNext(tx, parts, now()));
    if (!claimed) return sent;
    if (claimed === 'decided') continue;
    const fault = await claimed.hand().then(
      () => null,
      (error: unknown) => faultOf(error),
    );
    await inTransaction((tx) => settle(tx, claimed.message.id, fault, now()));
    if (!fault) sent += 1;
  }
}

/** Takes the next that is due, drops or puts off what may not go now. @returns null when nothing is due */
async function claimNext(tx: Transaction, parts: DeliveryParts, now: Date): Promise<Claimed | null> {
  const [row] = await select<{ id: string }>(
    `SELECT id FROM messages WHERE state = 'waiting' AND next_try_at <= :now ORDER BY next_try_at, id LIMIT 1 FOR UPDATE SKIP LOCKED`,
    { now },
    tx,
  );
  if (!row) return null;
  const message = await Message.findByPk(row.id, { transaction: tx, rejectOnEmpty: true });
  const visit = await readShownVisit(tx, message);
  const [standing, reach] = [await readStanding(tx, message, visit), await readReach(tx, message.jobId, message.kind)];
  const reason =
    (message.channel === 'text' && !parts.texts ? 'No text service is set up.' : null) ??
    closedBecause(reach, message.kind, message.channel) ??
    overtakenBy(now.toISOString(), standing);
  if (reason) {
    await message.update({ state: 'dropped', reason }, { transaction: tx });
    tell(tx, message);
    return 'decided';
  }
  const laterAt = standing.isUnsettled
    ? new Date(now.getTime() + SETTLING_SECONDS * 1000)
    : await quietUntil(tx, message, standing, now);
  if (laterAt) {
    await message.update({ nextTryAt: laterAt }, { transaction: tx });
    return 'decided';
  }
  const { mail, text } = await renderMessage(tx, parts, message, { reach, visit, now });
  const isMail = message.channel === 'mail';
  await message.update(
    {
      ...{ state: 'sending', claimedAt: now, tries: message.tries + 1 },
      ...{ recipient: isMail ? mail.to : reach.phone, subject: isMail ? mail.subject : '' },
      body: isMail ? mail.text : text,
      ...{ toldFrom: dateOf(standing.windowFrom), toldTo: dateOf(standing.windowTo) },
    },
    { transaction: tx },
  );
  const sendText = async (text: OutgoingText) => parts.texts?.send(text);
  const whole: OutgoingMail = { id: message.id, ...mail };
  const hand = () => (isMail ? parts.sendMail(whole) : sendText({ to: reach.phone, body: text, key: message.id }));
  return { message, hand };
}

/** Texts wait for the end of the quiet hours; one that says the crew is coming goes within the promised window. */
async function quietUntil(
  tx: Transaction,
  { channel, kind }: Message,
  { windowFrom, windowTo }: MessageStanding,
  now: Date,
): Promise<Date | null> {
  if (channel === 'mail') return null;
  const isPromised =
    windowFrom !== null && windowTo !== null && now >= new Date(windowFrom) && now < new Date(windowTo);
  if (kind === 'on_the_way' && isPromised) return null;
  const [{ zone }, settings] = [
    await companyOf(tx),
    await MessageSettings.findByPk(1, { transaction: tx, rejectOnEmpty: true }),
  ];
  const until = new Date(afterQuiet(now.toISOString(), { from: settings.quietFrom, to: settings.quietTo }, zone));
  return until > now ? until : null;
}

interface Fault {
  words: string;
  /** The receiving server said that it never will take it. */
  isFinal: boolean;
}

async function settle(tx: Transaction, id: string, fault: Fault | null, now: Date): Promise<void> {
  const message = await Message.findOne({
    where: { id, state: 'sending' },
    transaction: tx,
    lock: tx.LOCK.UPDATE,
  });
  // Erased meanwhile.
  if (!message) return;
  if (!fault) {
    await message.update({ state: 'sent', sentAt: now, claimedAt: null, lastError: '' }, { transaction: tx });
  } else {
    const wait = fault.isFinal ? undefined : RETRY_SECONDS[message.tries - 1];
    await message.update(
      {
        ...{ state: wait === undefined ? 'dead' : 'waiting', claimedAt: null, lastError: fault.words },
        nextTryAt: new Date(now.getTime() + (wait ?? 0) * 1000),
      },
      { transaction: tx },
    );
    if (fault.isFinal && message.channel === 'mail') await noteBounce(tx, message, fault.words, now);
  }
  tell(tx, message);
}

/**
 * What a server that stopped had claimed. Where the service knows a repeat by its key it is sent again; a mail by SMTP
 * may have gone out, so it rests until somebody at the desk decides.
 */
export async function takeUpLeft(parts: Pick<DeliveryParts, 'mailKnowsRepeats'>, now: Date): Promise<void> {
  await inTransaction(async (tx) => {
    const left = await Message.findAll({
      where: { state: 'sending', claimedAt: { [Op.lt]: new Date(now.getTime() - LEFT_MINUTES * 60_000) } },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    });
    for (const message of left) {
      const isSafe = message.channel === 'text' || parts.mailKnowsRepeats;
      await message.update(
        isSafe
          ? { state: 'waiting', claimedAt: null, nextTryAt: now }
          : {
              ...{ state: 'dead', claimedAt: null },
              lastError: 'The server stopped while this went out, so it may have arrived. Ask before it is sent again.',
            },
        { transaction: tx },
      );
      tell(tx, message);
    }
  });
}

/** The desk's log, and the board where what waited is no longer told. */
function tell(tx: Transaction, { customerId }: Message): void {
  hintAfterCommit(tx, ['desk'], 'message', customerId);
}

function faultOf(error: unknown): Fault {
  const code = (error as { responseCode?: unknown } | null)?.responseCode;
  // RFC 5321 4.2.1: a reply of 5yz is a permanent refusal; 55z is about the mailbox.
  const isFinal = typeof code === 'number' && code >= 550 && code < 560;
  return { words: (error instanceof Error ? error.message : String(error)).slice(0, 500), isFinal };
}

function dateOf(instant: string | null): Date | null {
  return instant ? new Date(instant) : null;
}
