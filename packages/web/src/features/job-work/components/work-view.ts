import type { VisitWorkDto, WorkActionBody } from '@driprail/shared/contracts/job-work.contract';
import type { Progress } from '@driprail/shared/domain/board/progress';
import { progressActions, takeStep } from '@driprail/shared/domain/board/progress';
import type { WorkEvent, WorkState } from '@driprail/shared/domain/job-work/fold-work';
import { foldWork } from '@driprail/shared/domain/job-work/fold-work';
import type { Missing } from '@driprail/shared/domain/job-work/missing';
import { missingForDone, stillMissing } from '@driprail/shared/domain/job-work/missing';
import type { MustKnow } from '@driprail/shared/domain/job-work/must-knows';
import { unconfirmed } from '@driprail/shared/domain/job-work/must-knows';
import { stepKey } from '@driprail/shared/domain/job-work/step';
import type { PlannedVehicle, WorkLine } from '@driprail/shared/domain/job-work/work-plan';
import { planWork } from '@driprail/shared/domain/job-work/work-plan';
import type { KeptPress } from '../../../lib/outbox/store.ts';

/** One visit's work as the screen shows it: what the server has, and what waits on this phone. */
export interface WorkView {
  work: VisitWorkDto;
  progress: Progress;
  startedAt: string | null;
  lines: WorkLine[];
  state: WorkState;
  vehicles: PlannedVehicle[];
  /** Must-knows that nobody has confirmed yet. */
  open: MustKnow[];
  missing: Missing[];
  /** Words of changes that have not left the phone. */
  waitingChanges: string[];
}

export function workView(work: VisitWorkDto, waiting: readonly KeptPress[], userName: string): WorkView {
  const own = waiting.filter((press) => press.targetId === work.visitId);
  const { progress, startedAt } = own.filter((press) => press.path === 'visit').reduce(step, work);
  const lines: WorkLine[] = work.lines.map(({ id: lineId, serviceName, vehicleId, vehicle, asksNote, steps }) => ({
    ...{ lineId, serviceName, vehicleId, vehicle, asksNote, steps },
  }));
  const events = own.filter((press) => press.path === 'work').map((press) => eventOf(press, userName));
  const stepsOf = new Map(
    lines.map(({ lineId, steps }) => [lineId, steps.map((one) => stepKey({ lineId, stepId: one.id }))] as const),
  );
  const state = foldWork([...work.events, ...events], { startedAt, stepsOf });
  return {
    ...{ work, progress, startedAt, lines, state },
    vehicles: planWork(lines, state.ticks),
    open: unconfirmed(work.mustKnows, state.confirmedKeys),
    missing: stillMissing(missingForDone(lines, state), state.wentOn?.keys ?? []),
    waitingChanges: own.filter((press) => press.path === 'change').map((press) => press.words),
  };
}

type Standing = Pick<VisitWorkDto, 'progress' | 'startedAt'>;

function step({ progress, startedAt }: Standing, { body }: KeptPress): Standing {
  const action = progressActions.find((known) => known === body['kind']);
  const next = action ? takeStep(progress, action) : null;
  if (!action || !next?.ok) return { progress, startedAt };
  return { progress: next.to, startedAt: action === 'start_work' ? (body['deviceAt'] as string) : startedAt };
}

function eventOf({ key, body }: KeptPress, by: string): WorkEvent {
  const { kind, deviceAt, offsetMs = 0, steps = [], lineId = null, keys = [], words = '' } = body as WorkActionBody;
  const at = new Date(Date.parse(deviceAt) - offsetMs).toISOString();
  return { id: key, kind, at, by, steps, lineId, keys, words };
}

/** Ticked and all steps, of one car or of the whole visit. */
export function countSteps(vehicles: readonly PlannedVehicle[]): { done: number; all: number } {
  const steps = vehicles.flatMap((vehicle) => vehicle.stages).flatMap((stage) => stage.steps);
  return { done: steps.filter(({ mark }) => mark !== null).length, all: steps.length };
}
