import { DataTypes } from 'sequelize';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import type { StampedTimes } from '@driprail/shared/domain/time/device';

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

/** The columns of when a press was made: by the device, at the server, and corrected. New ones for each model, which changes them. */
export const stampColumns = () => ({
  deviceAt: { type: DataTypes.DATE, allowNull: false },
  receivedAt: { type: DataTypes.DATE, allowNull: false },
  occurredAt: { type: DataTypes.DATE, allowNull: false },
  isCorrected: { type: DataTypes.BOOLEAN },
});

/** A press's times as those columns hold them. */
export function stampOf(times: StampedTimes) {
  return {
    deviceAt: new Date(times.deviceAt),
    receivedAt: new Date(times.receivedAt),
    occurredAt: new Date(times.occurredAt),
    isCorrected: times.isCorrected,
  };
}
