import type { ReactNode } from 'react';
import { Mark } from './icon.tsx';

export type Status = 'unplaced' | 'placed' | 'on_the_way' | 'on_site' | 'working' | 'part_done' | 'done' | 'called_off';

/** The bead fills as the job goes on; mark and word always stand together. */
const marks: Record<Status, string> = {
  unplaced: 'm-unplaced',
  placed: 'm-placed',
  on_the_way: 'm-way',
  on_site: 'm-site',
  working: 'm-work',
  part_done: 'm-part',
  done: 'm-done',
  called_off: 'm-off',
};

export function StatusMark({
  status,
  isLate = false,
  children,
}: {
  status: Status;
  isLate?: boolean;
  children: ReactNode;
}) {
  return (
    <span className={isLate ? 'st is-late' : 'st'}>
      <Mark name={isLate ? 'm-late' : marks[status]} />
      <span>{children}</span>
    </span>
  );
}
