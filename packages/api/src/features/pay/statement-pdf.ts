import { createRequire as requireFrom } from 'node:module';
import PDFDocument from 'pdfkit';
import type { StatementDto, YearToDate } from '@driprail/shared/contracts/pay.contract';
import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';
import { exact } from '@driprail/shared/domain/money/exact';
import { centsText, decimalText } from '@driprail/shared/domain/money/rounding';
import { formatDate, formatDay } from '@driprail/shared/domain/time/format';
import { timeOffKindNames } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { dayOf } from '@driprail/shared/domain/time/zone';

// One weight only ships for paper: rank is by size and by rules.
const FONT = requireFrom(import.meta.url).resolve('@fontsource/roboto-flex/files/roboto-flex-latin-400-normal.woff');
const PAGE = { left: 54, right: 558, top: 54, bottom: 738 };
const COLUMNS = { date: 54, job: 108, label: 156, working: 330, amount: 558 };

type Document = InstanceType<typeof PDFDocument>;

/** A pay statement on Letter paper, fonts embedded: every line with its job, totals double-ruled, page x of y. */
export function statementPdf(
  { week, person, companyName, customers, yearToDate, timeOff }: StatementDto,
  zone: string,
): Promise<Buffer> {
  const doc = new PDFDocument({
    size: 'LETTER',
    margin: 54,
    bufferPages: true,
    font: FONT,
    info: { Title: `Pay statement, week ${week.number}, ${person.name}`, Author: companyName },
  });
  const done = collected(doc);
  head(doc, companyName, person.name, stateWords(week, zone));
  text(
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
  total(doc, person.totals.gross);
  text(doc, 9, yearWords(yearToDate));
  if (timeOff.length > 0) text(doc, 9, timeOffWords(timeOff, week.state === 'locked'));
  text(
    doc,
    8,
    'Gross pay before any tax withholding, which a licensed payroll processor works out. Ask about any line: each has its working on screen.',
  );
  pageNumbers(doc);
  doc.end();
  return done;
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

function collected(doc: Document): Promise<Buffer> {
  const parts: Buffer[] = [];
  return new Promise((resolve, reject) => {
    doc.on('data', (part: Buffer) => parts.push(part));
    doc.on('end', () => resolve(Buffer.concat(parts)));
    doc.on('error', reject);
  });
}

function stateWords(week: StatementDto['week'], zone: string): string {
  if (week.state !== 'locked' || !week.lockedAt) return 'Draft';
  return `Locked ${formatDate(dayOf(week.lockedAt, zone))}`;
}

function head(doc: Document, companyName: string, name: string, state: string): void {
  doc.fontSize(9).text(companyName, PAGE.left, PAGE.top).text(state, PAGE.left, PAGE.top, { align: 'right' });
  doc.fontSize(30).text(name, PAGE.left, PAGE.top + 18);
  rule(doc, doc.y + 4, 1);
  doc.y += 12;
}

function text(doc: Document, size: number, words: string): void {
  doc.fontSize(size).text(words, PAGE.left, doc.y, { width: PAGE.right - PAGE.left });
  doc.y += 6;
}

function hoursRow(doc: Document, hoursByDay: Record<string, string>): void {
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

function section(doc: Document, name: string, cents: number): void {
  room(doc, 40);
  const y = doc.y + 8;
  doc.fontSize(12).text(name, PAGE.left, y, { lineBreak: false });
  money(doc, 12, cents, y);
  rule(doc, y + 17, 0.5);
  doc.y = y + 22;
}

function row(doc: Document, line: PayLine, customer: string): void {
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
  money(doc, 9, line.amountCents, y, !line.isPayable);
  doc.y = Math.max(bottom, doc.y, y + 12) + 3;
}

function money(doc: Document, size: number, cents: number, y: number, isShownOnly = false): void {
  const words = isShownOnly ? `(${centsText(cents)})` : centsText(cents);
  doc.fontSize(size).text(words, COLUMNS.amount - 110, y, { width: 110, align: 'right', lineBreak: false });
}

function total(doc: Document, cents: number): void {
  room(doc, 60);
  const y = doc.y + 10;
  rule(doc, y, 1);
  doc.fontSize(14).text('Gross', PAGE.left, y + 6, { lineBreak: false });
  money(doc, 14, cents, y + 6);
  rule(doc, y + 26, 1);
  rule(doc, y + 29, 1);
  doc.y = y + 42;
}

/** A new page where the next rows would not fit. */
function room(doc: Document, height: number): void {
  if (doc.y + height > PAGE.bottom) {
    doc.addPage();
    doc.y = PAGE.top;
  }
}

function rule(doc: Document, y: number, width: number): void {
  doc.moveTo(PAGE.left, y).lineTo(PAGE.right, y).lineWidth(width).stroke();
}

function pageNumbers(doc: Document): void {
  const { start, count } = doc.bufferedPageRange();
  for (let page = start; page < start + count; page += 1) {
    doc.switchToPage(page);
    // Below the margin pdfkit would begin another page.
    doc.page.margins.bottom = 0;
    doc.fontSize(8).text(`Page ${page - start + 1} of ${count}`, PAGE.left, 756, {
      width: PAGE.right - PAGE.left,
      align: 'right',
      lineBreak: false,
    });
  }
}
