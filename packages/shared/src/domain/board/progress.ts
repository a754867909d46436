/** The one state machine of a visit's progress; phone, board and API all ask it. */

export const progressStates = [
  'unplaced',
  'placed',
  'on_the_way',
  'on_site',
  'working',
  'part_done',
  'done',
  'called_off',
] as const;
export type Progress = (typeof progressStates)[number];

export const progressNames: Record<Progress, string> = {
  unplaced: 'Unplaced',
  placed: 'Placed',
  on_the_way: 'On the way',
  on_site: 'On site',
  working: 'Working',
  part_done: 'Part done',
  done: 'Done',
  called_off: 'Called off',
};

export const progressActions = ['set_off', 'arrive', 'start_work', 'part_done', 'finish', 'call_off'] as const;
export type ProgressAction = (typeof progressActions)[number];

export const actionNames: Record<ProgressAction, string> = {
  set_off: 'On my way',
  arrive: 'Arrived',
  start_work: 'Start work',
  part_done: 'Part done',
  finish: 'Done',
  call_off: 'Call off',
};

const steps: Record<ProgressAction, { from: readonly Progress[]; to: Progress }> = {
  set_off: { from: ['placed'], to: 'on_the_way' },
  // A crew may forget to say it left: arriving says both.
  arrive: { from: ['placed', 'on_the_way'], to: 'on_site' },
  start_work: { from: ['on_site'], to: 'working' },
  part_done: { from: ['working'], to: 'part_done' },
  finish: { from: ['working'], to: 'done' },
  call_off: { from: ['unplaced', 'placed', 'on_the_way', 'on_site'], to: 'called_off' },
};

export type StepResult = { ok: true; to: Progress } | { ok: false; message: string };

/** What an action does to a visit, or a sentence why it can't be done from here. */
export function takeStep(from: Progress, action: ProgressAction): StepResult {
  const step = steps[action];
  if (step.from.includes(from)) return { ok: true, to: step.to };
  return { ok: false, message: `${actionNames[action]} can’t follow ${progressNames[from]}.` };
}

/** The actions a person may press now, the main one first. */
export function nextActions(from: Progress): ProgressAction[] {
  const order: ProgressAction[] = ['set_off', 'arrive', 'start_work', 'finish', 'part_done', 'call_off'];
  return order.filter((action) => steps[action].from.includes(from));
}

/** Ended visits keep their place; nothing more is planned with them. */
export function isEnded(progress: Progress): boolean {
  return progress === 'done' || progress === 'part_done' || progress === 'called_off';
}

/** A plan may change until the crew is there; what happened is never re-planned. */
export function isMovable(progress: Progress): boolean {
  return progress === 'unplaced' || progress === 'placed' || progress === 'on_the_way';
}

export function isUnderWay(progress: Progress): boolean {
  return progress === 'on_the_way' || progress === 'on_site' || progress === 'working';
}
