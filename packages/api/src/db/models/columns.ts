import type { ProgressAction } from '@driprail/shared/domain/board/progress';

/** Half-open span of instants as Sequelize takes it; it hands back bounds with their inclusion. */
export type PlannedRange = [Date | { value: Date; inclusive: boolean }, Date | { value: Date; inclusive: boolean }];

export function rangeOf(from: string, to: string): PlannedRange {
  return [new Date(from), new Date(to)];
}

/** The two instants of a stored range, ISO. */
export function spanOf(range: PlannedRange): { from: string; to: string } {
  const [from, to] = range.map((bound) => (bound instanceof Date ? bound : bound.value).toISOString());
  return { from: from ?? '', to: to ?? '' };
}

export interface AcceptedWarning {
  key: string;
  code: string;
  reason: string;
  by: string;
  at: string;
}

export type VisitEventKind = ProgressAction | 'undo' | 'trouble' | 'plan';
