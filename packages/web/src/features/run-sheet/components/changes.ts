import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';

/** What a person last saw of a visit. */
export interface SeenVisit {
  id: string;
  customerName: string;
  from: string | null;
  address: string;
  notes: string;
  lines: string;
}

export interface Change {
  id: string;
  who: string;
  words: string;
}

export function seenOf(visits: readonly RunVisitDto[]): SeenVisit[] {
  return visits.map((visit) => ({
    id: visit.id,
    customerName: visit.customerName,
    from: visit.from,
    address: visit.address,
    notes: visit.notes,
    lines: visit.lines.map((line) => `${line.serviceName}, ${line.vehicle}`).join('; '),
  }));
}

/** What changed since the last look, one sentence a visit: new, gone, another time, place, work or note. */
export function changesSince(
  seen: readonly SeenVisit[],
  visits: readonly RunVisitDto[],
  clock: (instant: string) => string,
): Change[] {
  const now = seenOf(visits);
  const gone = seen
    .filter((old) => !now.some((visit) => visit.id === old.id))
    .map(({ id, customerName }) => ({ id, who: customerName, words: 'no longer on this day' }));
  const changed = now.flatMap((visit) => {
    const old = seen.find((one) => one.id === visit.id);
    const words = old ? wordsOf(old, visit, clock) : ['new on this day'];
    return words.length === 0 ? [] : [{ id: visit.id, who: visit.customerName, words: words.join(', ') }];
  });
  return [...changed, ...gone];
}

function wordsOf(old: SeenVisit, visit: SeenVisit, clock: (instant: string) => string): string[] {
  const words: string[] = [];
  if (visit.from && old.from && visit.from !== old.from)
    words.push(`${clock(visit.from)} instead of ${clock(old.from)}`);
  if (visit.address !== old.address) words.push('another address');
  if (visit.lines !== old.lines) words.push(`now ${visit.lines}`);
  if (visit.notes !== old.notes) words.push('another note');
  return words;
}
