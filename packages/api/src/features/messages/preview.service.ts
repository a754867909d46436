import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import type { MessageTemplate } from '@driprail/shared/domain/messages/templates';
import { companyOf } from '../../db/company.ts';
import { inTransaction, select } from '../../db/sequelize.ts';
import { readReach } from './reach.queries.ts';
import { composed, renderMessage } from './render.ts';
import type { Rendered, RenderParts } from './render.ts';
import { readShownVisit } from './standing.queries.ts';
import { StopTokens } from './stop-tokens.ts';

/** A message as it would read, with the next real job's facts or sample ones. Its links lead nowhere, nothing is kept. */
export function previewMessage(
  parts: RenderParts,
  kind: MessageKind,
  template: MessageTemplate,
  now: Date,
): Promise<{ jobNumber: number | null; subject: string; html: string; text: string }> {
  const shown: RenderParts = {
    ...parts,
    stops: new StopTokens('preview'),
    pages: { ...parts.pages, tokenFor: () => Promise.resolve('preview') },
  };
  return inTransaction(async (tx) => {
    const [next] = await select<{ id: string; number: number }>(
      `SELECT j.id, j.number FROM jobs j JOIN customers c ON c.id = j.customer_id
        WHERE j.window_from > :now AND j.called_off_reason IS NULL AND c.erased_at IS NULL ORDER BY j.window_from, j.number LIMIT 1`,
      { now },
      tx,
    );
    if (!next) return answer(null, sample(shown, kind, template, await companyOf(tx), now));
    const about = { kind, jobId: next.id, visitId: null, amountCents: null };
    const [reach, visit] = [await readReach(tx, next.id, kind), await readShownVisit(tx, about)];
    return answer(next.number, await renderMessage(tx, shown, about, { reach, visit, now, template }));
  });
}

function answer(jobNumber: number | null, { mail, text }: Rendered) {
  return { jobNumber, subject: mail.subject, html: mail.html ?? '', text };
}

function sample(
  parts: RenderParts,
  kind: MessageKind,
  template: MessageTemplate,
  company: Awaited<ReturnType<typeof companyOf>>,
  now: Date,
): Rendered {
  return composed(parts, {
    ...{ kind, company, template, now, visit: null, job: { number: 1, version: 0 } },
    reach: { customerId: '00000000-0000-7000-8000-000000000000', email: 'hana@mail.example' },
    values: {
      ...{ name: 'Hana', company: company.name, phone: company.phone || company.name },
      ...{ window: '10:00 to 11:00 am', day: 'Thu May 14', services: 'Inside and out', crew: 'Sefa', van: 'Gannet' },
      ...{ link: `${parts.baseUrl()}/c/preview`, amount: '158.82', estimate: '10:38 am' },
    },
  });
}
