import type { Mark, WorkState } from './fold-work.ts';
import type { Stage } from './stages.ts';
import { inOrderOfWork, stages } from './stages.ts';
import type { CheckStep, StepRef } from './step.ts';
import { stepKey } from './step.ts';

/** A line of the visit with the checklist it goes by. */
export interface WorkLine {
  lineId: string;
  serviceName: string;
  vehicleId: string | null;
  vehicle: string;
  asksNote: boolean;
  steps: CheckStep[];
}

/** A step on the screen: one press for the same step of several services on one car. */
export interface PlannedStep {
  step: CheckStep;
  refs: StepRef[];
  mark: Mark | null;
}

export interface PlannedStage {
  stage: Stage;
  steps: PlannedStep[];
}

export interface PlannedVehicle {
  vehicleId: string | null;
  vehicle: string;
  serviceNames: string[];
  stages: PlannedStage[];
}

/** The steps of all lines in order of work, by vehicle and stage; what two services share on one car is done once. */
export function planWork(lines: readonly WorkLine[], ticks: WorkState['ticks']): PlannedVehicle[] {
  const byVehicle = new Map<string, WorkLine[]>();
  for (const line of lines) {
    const key = line.vehicleId ?? line.lineId;
    byVehicle.set(key, [...(byVehicle.get(key) ?? []), line]);
  }
  return [...byVehicle.values()].map((own) => ({
    vehicleId: own[0]?.vehicleId ?? null,
    vehicle: own[0]?.vehicle ?? '',
    serviceNames: own.map((line) => line.serviceName),
    stages: stagesOf(own, ticks),
  }));
}

function stagesOf(lines: readonly WorkLine[], ticks: WorkState['ticks']): PlannedStage[] {
  const merged = new Map<string, PlannedStep>();
  for (const line of lines) {
    for (const step of line.steps) {
      const ref = { lineId: line.lineId, stepId: step.id };
      const key = [step.stage, step.words.toLowerCase(), step.product.toLowerCase()].join('/');
      const known = merged.get(key);
      if (known) known.refs.push(ref);
      else merged.set(key, { step, refs: [ref], mark: null });
    }
  }
  const all = [...merged.values()].map((planned) => ({ ...planned, mark: markOf(planned.refs, ticks) }));
  return stages.flatMap((stage) => {
    const steps = all.filter((planned) => planned.step.stage === stage);
    return steps.length > 0 ? [{ stage, steps }] : [];
  });
}

/** Ticked when each line it stands for has it ticked. */
function markOf(refs: readonly StepRef[], ticks: WorkState['ticks']): Mark | null {
  const marks = refs.map((ref) => ticks.get(stepKey(ref)));
  return marks.every((mark) => mark !== undefined) ? (marks.at(-1) ?? null) : null;
}

/** What "done up to here" ticks: every open step of the stages up to this one, but those that want a press of their own. */
export function upToHere(vehicle: PlannedVehicle, stage: Stage): StepRef[] {
  return vehicle.stages
    .filter((one) => stages.indexOf(one.stage) <= stages.indexOf(stage))
    .flatMap((one) => one.steps)
    .filter(({ step, mark }) => !step.isAlone && mark === null)
    .flatMap(({ refs }) => refs);
}

/** The next open step of the visit, in order of work. */
export function nextStep(
  vehicles: readonly PlannedVehicle[],
): { vehicle: PlannedVehicle; planned: PlannedStep } | null {
  for (const vehicle of vehicles) {
    const planned = inOrderOfWork(vehicle.stages)
      .flatMap((one) => one.steps)
      .find(({ mark }) => mark === null);
    if (planned) return { vehicle, planned };
  }
  return null;
}
