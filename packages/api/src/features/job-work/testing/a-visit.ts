import type TestAgent from 'supertest/lib/agent.js';
import { v4 as uuid } from 'uuid';
import type { VisitWorkDto } from '@driprail/shared/contracts/job-work.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { CheckStep } from '@driprail/shared/domain/job-work/step';
import type { TestApp } from '../../../testing/app.ts';
import { first } from '../../../testing/company.ts';
import type { TestCompany } from '../../../testing/company.ts';

export const clock = (time: string) => `2026-05-14T${time}:00.000Z`;

/** A step with nothing but its stage and words. */
export function aStep(more: Partial<CheckStep> & Pick<CheckStep, 'stage' | 'words'>): CheckStep {
  return {
    ...{ id: uuid(), product: '', ratio: '', pour: null, dose: '', kitCase: null, towel: null, caution: '' },
    ...{ isAlone: false, ...more },
  };
}

/** Places a visit of the company's one job on Gannet, whose crew is Sefa. */
export async function placeVisit(
  company: TestCompany,
  dispatcher: TestAgent,
  { from, to, vanId }: { from: string; to: string; vanId: string },
): Promise<VisitDto> {
  const made = (await company.aJob()).visit;
  const moved = await dispatcher
    .post('/api/board/moves')
    .send({ moves: [{ visitId: made.id, planVersion: 0, vanId, from, to }] })
    .expect(200);
  return first((moved.body as { visits: VisitDto[] }).visits);
}

/** Presses of one phone on one visit. */
export function pressesOf(app: TestApp, agent: TestAgent, visitId: string) {
  const stamped = () => ({ key: uuid(), deviceAt: app.time.now });
  return {
    mark: (kind: string, more: object = {}) =>
      agent.post(`/api/visits/${visitId}/actions`).send({ ...stamped(), kind, ...more }),
    work: (kind: string, more: object = {}) =>
      agent.post(`/api/visits/${visitId}/work`).send({ ...stamped(), kind, ...more }),
    change: (change: object, more: object = {}) =>
      agent.post(`/api/visits/${visitId}/changes`).send({
        ...stamped(),
        ...{ change, reason: 'Customer asked', saidYes: { by: '', at: app.time.now }, shownCents: 0, ...more },
      }),
  };
}

export const workOf = (body: unknown) => (body as { work: VisitWorkDto }).work;
