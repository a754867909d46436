import type { Transaction } from 'sequelize';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import { calendarFile } from '@driprail/shared/domain/messages/calendar';
import { groupOf, hasCalendar, messageGroupNames } from '@driprail/shared/domain/messages/kinds';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import { fillPlaceholders } from '@driprail/shared/domain/messages/placeholders';
import type { PlaceholderValues } from '@driprail/shared/domain/messages/placeholders';
import { linkWords, ourTemplates } from '@driprail/shared/domain/messages/templates';
import type { MessageTemplate } from '@driprail/shared/domain/messages/templates';
import { companyOf } from '../../db/company.ts';
import type { CompanySettings, Message } from '../../db/models/index.ts';
import { Job, MessageKindRow, Van } from '../../db/models/index.ts';
import type { OutgoingMail } from '../../mail/transport.ts';
import { mailHtml } from './mail-html.ts';
import { amountOf, messageValues } from './message-values.ts';
import type { Reach } from './reach.queries.ts';
import type { StopTokens } from './stop-tokens.ts';

/** What other features know of a job's bill and page; handed in, since they queue messages themselves. */
export interface JobPages {
  /** The token of the customer's own page. */
  tokenFor: (tx: Transaction, jobId: string, now: Date) => Promise<string>;
  owedCents: (jobId: string, now: Date, tx: Transaction) => Promise<number>;
}

export interface RenderParts {
  pages: JobPages;
  stops: StopTokens;
  /** The address of this server as customers reach it, without a slash at its end. */
  baseUrl: () => string;
}

export interface Rendered {
  mail: Omit<OutgoingMail, 'id'>;
  /** The same as a text message. */
  text: string;
}

type About = Pick<Message, 'kind' | 'jobId' | 'amountCents'>;

/** The company's words for a kind, ours where it has none of its own. */
async function templateOf(tx: Transaction, kind: MessageKind): Promise<MessageTemplate> {
  const row = await MessageKindRow.findByPk(kind, { transaction: tx });
  const ours = ourTemplates[kind];
  return { subject: row?.subject ?? ours.subject, body: row?.body ?? ours.body, text: row?.textBody ?? ours.text };
}

/** A message in words, as of now. */
export async function renderMessage(
  tx: Transaction,
  parts: RenderParts,
  about: About,
  { reach, visit, now, ...given }: { reach: Reach; visit: VisitDto | null; now: Date; template?: MessageTemplate },
): Promise<Rendered> {
  const company = await companyOf(tx);
  const template = given.template ?? (await templateOf(tx, about.kind));
  const link = `${parts.baseUrl()}/c/${await parts.pages.tokenFor(tx, about.jobId, now)}`;
  const values = messageValues({
    ...{ company, customer: reach, visit, link, now },
    vanName: visit?.vanId ? ((await Van.findByPk(visit.vanId, { transaction: tx }))?.name ?? '') : '',
    amountCents: amountOf(about, await parts.pages.owedCents(about.jobId, now, tx)),
  });
  const job = await Job.findByPk(about.jobId, { transaction: tx, rejectOnEmpty: true });
  return composed(parts, { kind: about.kind, company, template, values, reach, visit, now, job });
}

interface Composing {
  kind: MessageKind;
  company: CompanySettings;
  template: MessageTemplate;
  values: PlaceholderValues;
  reach: Pick<Reach, 'customerId' | 'email'>;
  visit: VisitDto | null;
  now: Date;
  job: Pick<Job, 'number' | 'version'>;
}

/** Words, look and links put together. */
export function composed(parts: RenderParts, c: Composing): Rendered {
  const { kind, company, values } = c;
  const subject = fillPlaceholders(c.template.subject, values).replace(/\s+/g, ' ').trim();
  const body = fillPlaceholders(c.template.body, values);
  const group = groupOf(kind);
  const token = parts.stops.tokenFor(c.reach.customerId, group);
  const stop = { url: `${parts.baseUrl()}/u/${token}`, words: `No more mail with ${messageGroupNames[group]}` };
  const footer = [company.name, company.phone].filter(Boolean).join(', ');
  const link = { url: values.link, words: linkWords[kind] };
  const calendar = hasCalendar(kind) ? calendarOf(c) : null;
  return {
    mail: {
      ...{ to: c.reach.email, subject },
      text: `${body}\n\n${link.words}: ${link.url}\n\n-- \n${footer}\n${stop.words}: ${stop.url}\n`,
      html: mailHtml({ company: company.name, aside: `Job ${c.job.number}`, subject, body, link, footer, stop }),
      ...(calendar !== null && { calendar }),
      unsubscribeUrl: `${parts.baseUrl()}/api/unsubscribe/${token}`,
      ...(company.email !== '' && { replyTo: company.email }),
    },
    text: fillPlaceholders(c.template.text, values),
  };
}

/** The arrival window; its number grows with the visit's plan and with the job, since either may change the promise. */
function calendarOf({ kind, company, values, visit, now, job }: Composing): string | null {
  if (!visit?.windowFrom || !visit.windowTo) return null;
  return calendarFile({
    ...{ visitId: visit.id, sequence: visit.planVersion + job.version, isCalledOff: kind === 'called_off' },
    ...{ from: visit.windowFrom, to: visit.windowTo, madeAt: now.toISOString() },
    summary: `${company.name}: ${values.services.replaceAll('\n', ', ')}`,
    description: `We arrive within this time. ${company.phone}`.trim(),
    url: values.link,
  });
}
