import { formatDate } from '@driprail/shared/domain/time/format';

export interface TimeAxis {
  from: string;
  to: string;
  ticks: { day: string; label: string; at: number }[];
  /** Where a day lies, in percent from the left, within the axis. */
  at: (day: string) => number;
}

const MONTHS_BACK = 24;

/** Quarters from the first start that still matters to some months after the last: time runs along the rail. */
export function timeAxis(starts: readonly string[], today: string): TimeAxis {
  const first = [...starts, today].sort()[0] ?? today;
  const last = [...starts, today].sort().at(-1) ?? today;
  const oldest = addMonths(today, -MONTHS_BACK);
  const from = quarterOf(first < oldest ? oldest : first);
  const to = addMonths(quarterOf(addMonths(last, 3)), 3);
  const length = daysFrom(from, to);
  const at = (day: string) => Math.min(100, Math.max(0, (daysFrom(from, day) / length) * 100));
  const quarters: string[] = [];
  for (let day = from; day < to; day = addMonths(day, 3)) quarters.push(day);
  const ticks = quarters.map((day, index) => {
    const [month = '', , year = ''] = formatDate(day).replace(',', '').split(' ');
    return { day, label: index === 0 || month === 'Jan' ? `${month} ${year}` : month, at: at(day) };
  });
  return { from, to, ticks, at };
}

function quarterOf(day: string): string {
  const [year = '', month = ''] = day.split('-');
  const first = Math.floor((Number(month) - 1) / 3) * 3 + 1;
  return `${year}-${String(first).padStart(2, '0')}-01`;
}

function addMonths(day: string, count: number): string {
  const [year = '', month = ''] = day.split('-');
  const total = Number(year) * 12 + Number(month) - 1 + count;
  return `${Math.floor(total / 12)}-${String((total % 12) + 1).padStart(2, '0')}-01`;
}

function daysFrom(a: string, b: string): number {
  return (Date.parse(b) - Date.parse(a)) / 86_400_000;
}
