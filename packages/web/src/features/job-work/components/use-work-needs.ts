import { useQuery } from '@tanstack/react-query';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { useFormats } from '../../../lib/format.ts';
import { openWorkQuery } from '../api/open-work.queries.ts';
import { signed } from './change-row.tsx';

/** One line for the desk's list of what needs somebody; the day is that of its board. */
export interface WorkNeed {
  key: string;
  visitId: string;
  day: string | null;
  who: string;
  words: string;
}

/** Changes that crews ask for, and keys that were not handed back, whatever their day. */
export function useWorkNeeds(today: string): WorkNeed[] {
  const format = useFormats();
  const { data } = useQuery(openWorkQuery);
  const when = (instant: string) => {
    const day = dayOf(instant, format.zone);
    return day === today ? format.clock(instant) : `${formatDay(day)}, ${format.clock(instant)}`;
  };
  const changes = (data?.changes ?? []).map((change) => ({
    ...{ key: change.id, visitId: change.visitId, day: dayOf(change.at, format.zone), who: change.customerName },
    words: [
      `${change.words}, ${signed(change.priceDifferenceCents)}`,
      `${change.by} asks since ${when(change.at)}`,
      ...(change.isBoardNotAsked ? ['board not asked'] : []),
    ].join('. '),
  }));
  const keys = (data?.keys ?? []).map((key) => ({
    ...{ key: `key:${key.visitId}`, visitId: key.visitId, day: key.day, who: key.customerName },
    words: `Key not handed back: ${key.vanName}, ${key.takenBy} since ${when(key.takenAt)}`,
  }));
  return [...changes, ...keys];
}
