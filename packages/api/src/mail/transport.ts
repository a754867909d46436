import { createTransport } from 'nodemailer';
import type { SendMailOptions } from 'nodemailer';

export interface OutgoingMail {
  id: string;
  to: string;
  subject: string;
  text: string;
  html?: string;
  /** A calendar file, as text. */
  calendar?: string;
  /** Where a press in the mail program stops such mails (RFC 8058). */
  unsubscribeUrl?: string;
  replyTo?: string;
}
export type SendMail = (mail: OutgoingMail) => Promise<void>;

/** Nothing hangs on a silent server for longer than this. */
const SILENT_MS = 60_000;

/** Sends through an SMTP server, which has no way to tell a repeat from a new mail but its Message-ID. */
export function smtpMail(url: string, from: string): SendMail {
  const transport = createTransport({ url, socketTimeout: SILENT_MS, connectionTimeout: SILENT_MS });
  return async (mail) => {
    await transport.sendMail(optionsOf(mail, from));
  };
}

function optionsOf({ id, to, subject, text, ...more }: OutgoingMail, from: string): SendMailOptions {
  return {
    ...{ from, to, subject, text, messageId: messageIdOf(id) },
    ...(more.html && { html: more.html }),
    ...(more.replyTo && { replyTo: more.replyTo }),
    ...(more.calendar && {
      icalEvent: { method: 'PUBLISH', filename: 'visit.ics', content: more.calendar },
    }),
    ...(more.unsubscribeUrl && {
      headers: {
        'List-Unsubscribe': `<${more.unsubscribeUrl}>`,
        'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
      },
    }),
  };
}

export function messageIdOf(id: string): string {
  return `<${id}@driprail>`;
}

export interface TakenMail extends OutgoingMail {
  at: string;
}

/** The local fake: takes mails through nodemailer's own JSON transport, each id once, and keeps the last hundred. */
export function localMail(from: string, now: () => Date): { send: SendMail; taken: () => TakenMail[] } {
  const transport = createTransport({ jsonTransport: true });
  const taken: TakenMail[] = [];
  return {
    async send(mail) {
      if (taken.some(({ id }) => id === mail.id)) return;
      await transport.sendMail(optionsOf(mail, from));
      taken.unshift({ ...mail, at: now().toISOString() });
      taken.length = Math.min(taken.length, 100);
    },
    taken: () => taken,
  };
}
