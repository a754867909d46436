/**
 * The order of work, common practice, no source: walk-round first; wheels and tires before paint; wash top down;
 * decontaminate before correction; inside top down, dry before wet; glass after what splashes; protect last.
 */
export const stages = [
  'walk_round',
  'wheels',
  'wash',
  'decontaminate',
  'correct',
  'inside_dry',
  'inside_wet',
  'glass',
  'protect',
  'last_look',
] as const;
export type Stage = (typeof stages)[number];

export const stageNames: Record<Stage, string> = {
  walk_round: 'Walk-round',
  wheels: 'Wheels and tires',
  wash: 'Wash, top down',
  decontaminate: 'Decontaminate',
  correct: 'Correct',
  inside_dry: 'Inside, dry',
  inside_wet: 'Inside, wet',
  glass: 'Glass',
  protect: 'Protect',
  last_look: 'Last look',
};

/** Steps in order of work; those of one stage keep the order in which they are given. */
export function inOrderOfWork<T extends { stage: Stage }>(steps: readonly T[]): T[] {
  return [...steps].sort((a, b) => stages.indexOf(a.stage) - stages.indexOf(b.stage));
}
