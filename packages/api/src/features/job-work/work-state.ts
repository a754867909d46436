import { foldWork } from '@driprail/shared/domain/job-work/fold-work';
import type { WorkState } from '@driprail/shared/domain/job-work/fold-work';
import { stepKey } from '@driprail/shared/domain/job-work/step';
import type { WorkLine } from '@driprail/shared/domain/job-work/work-plan';
import type { WorkRow } from './work-rows.queries.ts';

/** The visit's lines with the checklists they go by. */
export function linesOf({ visit, extras }: WorkRow): WorkLine[] {
  return visit.lines.map((line) => {
    const list = extras.checklists.find((one) => one.lineId === line.id);
    const { id: lineId, serviceName, vehicleId, vehicle } = line;
    return {
      ...{ lineId, serviceName, vehicleId, vehicle },
      ...{ asksNote: list?.asksNote ?? false, steps: list?.steps ?? [] },
    };
  });
}

/** What has been done at the visit so far. */
export function foldOf(row: WorkRow): WorkState {
  const lines = linesOf(row);
  const stepsOf = new Map(
    lines.map(({ lineId, steps }) => [lineId, steps.map((step) => stepKey({ lineId, stepId: step.id }))] as const),
  );
  return foldWork(row.extras.events, { startedAt: row.extras.startedAt, stepsOf });
}
