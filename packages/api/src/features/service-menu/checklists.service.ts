import type { z } from 'zod';
import type { ChecklistDto, putChecklist } from '@driprail/shared/contracts/checklist.contract';
import { inOrderOfWork } from '@driprail/shared/domain/job-work/stages';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import { towelClashes } from '@driprail/shared/domain/job-work/towels';
import { ratioText } from '@driprail/shared/domain/kit/dilution/dilution-ratio';
import { readRatio } from '@driprail/shared/domain/kit/dilution/read-ratio';
import { audit } from '../../db/audit.ts';
import { Service, ServiceChecklist } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { conflict, notFound, unprocessable } from '../../http/errors.ts';
import { hintAfterCommit } from '../../realtime/hints.ts';
import { readChecklist, stepsOfOthers } from './checklists.queries.ts';

type ChecklistFields = z.infer<(typeof putChecklist)['body']>;

/**
 * The next version of a service's steps, in order of work; visits under way keep theirs.
 * @throws 404, 409 when somebody saved meanwhile, 422 at a ratio that reads in two ways or a towel color with another use
 */
export function saveChecklist(ctx: Ctx, serviceId: string, fields: ChecklistFields): Promise<ChecklistDto> {
  return inTransaction(async (tx) => {
    const service = await Service.findByPk(serviceId, { transaction: tx, lock: tx.LOCK.UPDATE });
    if (!service) throw notFound('That service');
    const { version } = await readChecklist(serviceId, tx);
    if (version !== fields.version) {
      const words = `Somebody changed the steps of ${service.name} meanwhile. Reload and try again.`;
      throw conflict('stale', words);
    }
    const wrong: Record<string, string> = {};
    const steps = fields.steps.map((step, index) => withRatio(step, `steps.${index}`, wrong));
    for (const [index, words] of towelClashes(steps, await stepsOfOthers(tx, serviceId)))
      wrong[`steps.${index}.towel.color`] = words;
    refuseTwice(steps, wrong);
    const [first] = Object.values(wrong);
    if (first) throw unprocessable('steps', first, { fields: wrong });
    await ServiceChecklist.create(
      {
        ...{ serviceId, version: version + 1, asksNote: fields.asksNote, steps: inOrderOfWork(steps) },
        ...{ createdBy: ctx.actor.userId, createdAt: ctx.now() },
      },
      { transaction: tx },
    );
    const by = { userId: ctx.actor.userId, at: ctx.now() };
    await audit(tx, by, 'service', serviceId, 'steps saved', { version: version + 1, steps: steps.length });
    hintAfterCommit(tx, ['everyone'], 'service', serviceId, service.version);
    return readChecklist(serviceId, tx);
  });
}

/** A typed ratio is read once and kept as "N:1"; one with two readings is asked about, never guessed. */
function withRatio(step: CheckStep, at: string, wrong: Record<string, string>): CheckStep {
  if (step.ratio === '') return step;
  const read = readRatio(step.ratio);
  if (read.kind === 'ratio') return { ...step, ratio: ratioText(read.ratio) };
  wrong[`${at}.ratio`] =
    read.kind === 'question' ? `${read.question} ${read.readings.map((one) => one.label).join('; or ')}.` : read.reason;
  return step;
}

function refuseTwice(steps: CheckStep[], wrong: Record<string, string>): void {
  const ids = new Set<string>();
  for (const [index, step] of steps.entries()) {
    if (ids.has(step.id)) wrong[`steps.${index}.words`] = 'This step is on the list twice. Take one off.';
    ids.add(step.id);
  }
}
