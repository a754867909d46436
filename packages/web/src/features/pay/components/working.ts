import { formatDay } from '@driprail/shared/domain/time/format';
import type { PayLine, SourceRef, WorkingStep } from '@driprail/shared/domain/pay/pay-week.types';
import { paths } from '../../../app/paths.ts';
import type { Customers } from './ledger.ts';

export interface NumberedStep {
  step: WorkingStep;
  /** Null for what is said but not reckoned with. */
  number: number | null;
}

/** Steps with a result are counted; "Does not count" is not. */
export function numberSteps(working: readonly WorkingStep[]): NumberedStep[] {
  let number = 0;
  return working.map((step) => ({ step, number: step.result === '' ? null : ++number }));
}

/** A step of a job's line that begins with the job's number says whose job it was: "Job 4127, Galloway. Flat". */
export function withCustomer(step: WorkingStep, line: PayLine, customers: Customers): WorkingStep {
  const customer = line.jobId === null ? undefined : customers[line.jobId];
  const job = `Job ${line.jobNumber}`;
  if (customer === undefined || !step.note.startsWith(job)) return step;
  return { ...step, note: `${job}, ${customer}${step.note.slice(job.length)}` };
}

export interface ArithmeticPart {
  text: string;
  isWord: boolean;
}

const WORDS = /(\bhalf of\b|\btimes\b|\bdivided by\b|\bless\b|\bof\b|\+)/;

/** Cuts "912.98 divided by 42.25 h" into figures and the words between them; minus signs become true ones. */
export function arithmeticParts(arithmetic: string): ArithmeticPart[] {
  return arithmetic
    .split(WORDS)
    .map((text) => ({ text: trueMinus(text.trim()), isWord: WORDS.test(text) }))
    .filter((part) => part.text !== '');
}

export function trueMinus(text: string): string {
  return text.replace(/(^|\s)-(?=\d)/g, '$1−');
}

export interface SourceLink {
  key: string;
  label: string;
  /** Null where there is nothing of its own to open. */
  to: string | null;
}

export interface StepSources {
  /** What the step says of itself, less what the links say better. */
  note: string;
  /** Words before the links. */
  lead: string;
  links: SourceLink[];
}

/** Where a step's figures come from, as links: clock entries by day, jobs, rates, rules, other lines. */
export function stepSources(step: WorkingStep, line: PayLine, lines: readonly PayLine[]): StepSources {
  const entries = step.sources.filter((source) => source.kind === 'clock_entry');
  if (entries.length > 0) return { note: step.note, lead: counted(entries.length), links: entryLinks(entries) };
  const jobs = step.sources.filter((source) => source.kind === 'job');
  if (/^Jobs? [\d, ]+$/.test(step.note)) {
    return {
      note: '',
      lead: jobs.length === 1 ? 'Job' : 'Jobs',
      links: unique(jobs.map((job) => jobLink(job, lines))),
    };
  }
  if (step.result === '') return { note: step.note, lead: '', links: [] };
  const links = step.sources.map((source) => sourceLink(source, line, lines));
  return { note: step.note, lead: '', links: unique(links.filter((link) => link !== null)) };
}

function counted(count: number): string {
  return count === 1 ? '1 clock entry:' : `${count} clock entries:`;
}

/** A clock entry is named by its kind and its day: "Job work, 2026-05-04". */
export function dayOfSource(source: Pick<SourceRef, 'label'>): string | null {
  return /\d{4}-\d{2}-\d{2}$/.exec(source.label)?.[0] ?? null;
}

function entryLinks(entries: readonly SourceRef[]): SourceLink[] {
  const days = [...new Set(entries.map(dayOfSource).filter((day) => day !== null))].sort();
  return days.map((day) => ({ key: day, label: formatDay(day).slice(0, 3), to: hoursOf(day) }));
}

function jobLink(source: SourceRef, lines: readonly PayLine[]): SourceLink {
  const known = lines.find((line) => line.jobId === source.id);
  const label = known?.jobNumber ? String(known.jobNumber) : source.label;
  return { key: source.id, label, to: boardJob(source.id, known?.workedOn ?? null) };
}

function sourceLink(source: SourceRef, line: PayLine, lines: readonly PayLine[]): SourceLink | null {
  const { id, kind, label } = source;
  switch (kind) {
    case 'job':
      return { key: id, label, to: boardJob(id, lines.find((own) => own.jobId === id)?.workedOn ?? line.workedOn) };
    case 'tip':
      return line.jobId
        ? { key: id, label: `Job ${line.jobNumber}`, to: boardJob(line.jobId, line.workedOn) }
        : { key: id, label, to: null };
    case 'visit':
      return line.workedOn
        ? { key: id, label, to: `${paths.boardDay(line.workedOn)}?visit=${id}` }
        : { key: id, label, to: null };
    case 'rate':
      return { key: id, label: 'Dated rates', to: `${paths.rates}?rate=${id}` };
    case 'plan':
      return { key: id, label, to: `${paths.rates}?person=${line.personId}` };
    case 'rule':
      return { key: id, label, to: `${paths.rates}#rules` };
    case 'pay_line':
      return { key: id, label, to: `?line=${encodeURIComponent(id)}` };
    case 'clock_entry':
    case 'adjustment':
      return null;
  }
}

function unique(links: SourceLink[]): SourceLink[] {
  return [...new Map(links.map((link) => [link.key, link])).values()];
}

export function hoursOf(day: string, entryId?: string): string {
  return `${paths.hours}?day=${day}${entryId ? `&entry=${entryId}` : ''}`;
}

export function boardJob(jobId: string, day: string | null): string {
  return `${day ? paths.boardDay(day) : paths.board}?job=${jobId}`;
}
