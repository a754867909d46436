import { createTransport } from 'nodemailer';

export interface OutgoingMail {
  id: string;
  to: string;
  subject: string;
  text: string;
}
export type SendMail = (mail: OutgoingMail) => Promise<void>;

/** Sends through an SMTP server. */
export function smtpMail(url: string, from: string): SendMail {
  const transport = createTransport(url);
  return async ({ id, to, subject, text }) => {
    await transport.sendMail({ from, to, subject, text, messageId: `<${id}@driprail>` });
  };
}

export interface TakenMail extends OutgoingMail {
  at: string;
}

/** The local fake: takes mails through nodemailer's own JSON transport and keeps the last hundred. */
export function localMail(from: string, now: () => Date): { send: SendMail; taken: () => TakenMail[] } {
  const transport = createTransport({ jsonTransport: true });
  const taken: TakenMail[] = [];
  return {
    async send(mail) {
      await transport.sendMail({ from, to: mail.to, subject: mail.subject, text: mail.text });
      taken.unshift({ ...mail, at: now().toISOString() });
      taken.length = Math.min(taken.length, 100);
    },
    taken: () => taken,
  };
}
