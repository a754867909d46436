import type { StatementDto, YearToDate } from '@driprail/shared/contracts/pay.contract';
import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';
import { exact } from '@driprail/shared/domain/money/exact';
import { centsText, decimalText } from '@driprail/shared/domain/money/rounding';
import { formatDate, formatDay } from '@driprail/shared/domain/time/format';
import { timeOffKindNames } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { PAGE, closePaper, head, money, openPaper, paragraph, room, section, total } from '../../paper/paper.ts';
import type { Paper } from '../../paper/paper.ts';

const COLUMNS = { date: 54, job: 108, label: 156, working: 330 };

/** A pay statement on Letter paper, fonts embedded: every line with its job, totals double-ruled, page x of y. */
export function statementPdf(
  { week, person, companyName, customers, yearToDate, timeOff }: StatementDto,
  zone: string,
): Promise<Buffer> {
  const { doc, bytes } = openPaper(`Pay statement, week ${week.number}, ${person.name}`, companyName);
  head(doc, person.name, companyName, stateWords(week, zone));
  paragraph(
    doc,
    9,
    `Week ${week.number}, ${formatDay(week.startsOn)} to ${formatDate(week.endsOn)}. ${decimalText(exact(person.hoursWorked), 2)} h worked, ${decimalText(exact(person.overtimeHours), 2)} h over the limit.`,
  );
  hoursRow(doc, person.hoursByDay);
  for (const [group, lines] of groupsOf(person.lines)) {
    section(
      doc,
      group,
      lines.reduce((sum, line) => sum + (line.isPayable ? line.amountCents : 0), 0),
    );
    for (const line of lines) row(doc, line, line.jobId ? (customers[line.jobId] ?? '') : '');
  }
  total(doc, 'Gross', person.totals.gross);
  paragraph(doc, 9, yearWords(yearToDate));
  if (timeOff.length > 0) paragraph(doc, 9, timeOffWords(timeOff, week.state === 'locked'));
  paragraph(
    doc,
    8,
    'Gross pay before any tax withholding, which a licensed payroll processor works out. Ask about any line: each has its working on screen.',
  );
  closePaper(doc);
  return bytes;
}

function yearWords({ year, weeks, hours, grossCents, tipCents, overtimePremiumCents }: YearToDate): string {
  const span = weeks === 1 ? '1 week' : `${weeks} weeks`;
  return `${year} to date, ${span}: gross ${centsText(grossCents)}, ${decimalText(exact(hours), 2)} h, overtime premium ${centsText(overtimePremiumCents)}, tips in the gross ${centsText(tipCents)}.`;
}

/** "Sick: earned 1.33 h, taken 8.00 h, balance 12.00 h." by kind. */
function timeOffWords(rows: StatementDto['timeOff'], isLocked: boolean): string {
  const words = rows.map(({ kind, earned, taken, adjusted, lost, balance }) => {
    const parts = [
      ['earned', earned],
      ['taken', taken],
      ['changed by the owner', adjusted],
      ['not kept', lost],
      ['balance', balance],
    ] as const;
    const said = parts.filter(([name, hours]) => name === 'balance' || !exact(hours).equals(0));
    return `${timeOffKindNames[kind]}: ${said.map(([name, hours]) => `${name} ${decimalText(exact(hours), 2)} h`).join(', ')}`;
  });
  return `Paid time off${isLocked ? '' : ', expected until the week is locked'}. ${words.join('. ')}.`;
}

function stateWords(week: StatementDto['week'], zone: string): string {
  if (week.state !== 'locked' || !week.lockedAt) return 'Draft';
  return `Locked ${formatDate(dayOf(week.lockedAt, zone))}`;
}

function hoursRow(doc: Paper, hoursByDay: Record<string, string>): void {
  const days = Object.entries(hoursByDay).sort(([a], [b]) => a.localeCompare(b));
  const width = (PAGE.right - PAGE.left) / 7;
  const top = doc.y;
  days.forEach(([day, hours], index) => {
    doc.fontSize(8).text(formatDay(day), PAGE.left + index * width, top, { width, lineBreak: false });
    doc
      .fontSize(11)
      .text(`${decimalText(exact(hours), 2)} h`, PAGE.left + index * width, top + 11, { width, lineBreak: false });
  });
  doc.y = top + 30;
}

const groupNames: Partial<Record<PayLine['kind'], string>> = {
  hourly: 'Hours',
  overtime_premium: 'Hours',
  minimum_wage_make_up: 'Hours',
  show_up_pay: 'Hours',
  flat: 'Flat',
  no_show_trip: 'Flat',
  commission: 'Commission',
  tip: 'Tips',
  tip_already_received: 'Tips',
  correction: 'Corrections of earlier weeks',
};

function groupsOf(lines: PayLine[]): Map<string, PayLine[]> {
  const groups = new Map<string, PayLine[]>();
  for (const line of lines) {
    const name = groupNames[line.kind] ?? 'Further lines';
    groups.set(name, [...(groups.get(name) ?? []), line]);
  }
  return groups;
}

function row(doc: Paper, line: PayLine, customer: string): void {
  room(doc, 16);
  const y = doc.y;
  const label = [line.label, customer].filter(Boolean).join(', ');
  doc.fontSize(9);
  doc.text(line.workedOn ? formatDay(line.workedOn).slice(4) : '', COLUMNS.date, y, { width: 52, lineBreak: false });
  doc.text(line.jobNumber ? String(line.jobNumber) : '', COLUMNS.job, y, { width: 46, lineBreak: false });
  doc.text(label, COLUMNS.label, y, { width: COLUMNS.working - COLUMNS.label - 8 });
  const bottom = doc.y;
  doc.text(line.isPayable ? (line.working.at(-1)?.arithmetic ?? '') : 'already received', COLUMNS.working, y, {
    width: 160,
  });
  const amount = centsText(line.amountCents);
  money(doc, 9, line.isPayable ? amount : `(${amount})`, y);
  doc.y = Math.max(bottom, doc.y, y + 12) + 3;
}
