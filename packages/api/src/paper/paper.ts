import { createRequire as requireFrom } from 'node:module';
import PDFDocument from 'pdfkit';
import { centsText } from '@driprail/shared/domain/money/rounding';

// One weight only ships for paper: rank is by size and by rules.
const FONT = requireFrom(import.meta.url).resolve('@fontsource/roboto-flex/files/roboto-flex-latin-400-normal.woff');
/** What may be printed on, in points of Letter paper (612 x 792). */
export const PAGE = { left: 54, right: 558, top: 54, bottom: 738 };

export type Paper = InstanceType<typeof PDFDocument>;

/** Letter paper with the font embedded. `bytes` is the whole file once the paper is closed. */
export function openPaper(title: string, author: string): { doc: Paper; bytes: Promise<Buffer> } {
  const doc = new PDFDocument({
    size: 'LETTER',
    margin: 54,
    bufferPages: true,
    font: FONT,
    info: { Title: title, Author: author },
  });
  const parts: Buffer[] = [];
  const bytes = new Promise<Buffer>((resolve, reject) => {
    doc.on('data', (part: Buffer) => parts.push(part));
    doc.on('end', () => resolve(Buffer.concat(parts)));
    doc.on('error', reject);
  });
  return { doc, bytes };
}

/** Numbers the pages, and ends the file. */
export function closePaper(doc: Paper): void {
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
  doc.end();
}

/** The large name of the paper, above it whose it is and what state it is in. */
export function head(doc: Paper, title: string, left: string, right: string): void {
  doc.fontSize(9).text(left, PAGE.left, PAGE.top).text(right, PAGE.left, PAGE.top, { align: 'right' });
  doc.fontSize(30).text(title, PAGE.left, PAGE.top + 18);
  rule(doc, doc.y + 4, 1);
  doc.y += 12;
}

/** A paragraph over the whole width. */
export function paragraph(doc: Paper, size: number, words: string): void {
  doc.fontSize(size).text(words, PAGE.left, doc.y, { width: PAGE.right - PAGE.left });
  doc.y += 6;
}

/** The name of a group of rows, with its sum if it has one. */
export function section(doc: Paper, name: string, cents: number | null): void {
  room(doc, 40);
  const y = doc.y + 8;
  doc.fontSize(12).text(name, PAGE.left, y, { lineBreak: false });
  if (cents !== null) money(doc, 12, centsText(cents), y);
  rule(doc, y + 17, 0.5);
  doc.y = y + 22;
}

/** The sum of it all, double-ruled. */
export function total(doc: Paper, name: string, cents: number): void {
  room(doc, 60);
  const y = doc.y + 10;
  rule(doc, y, 1);
  doc.fontSize(14).text(name, PAGE.left, y + 6, { lineBreak: false });
  money(doc, 14, centsText(cents), y + 6);
  rule(doc, y + 26, 1);
  rule(doc, y + 29, 1);
  doc.y = y + 42;
}

/** An amount in the column at the right edge. */
export function money(doc: Paper, size: number, words: string, y: number): void {
  doc.fontSize(size).text(words, PAGE.right - 110, y, { width: 110, align: 'right', lineBreak: false });
}

/** Goes on to a new page where the next rows would not fit. @param height of those rows, in points */
export function room(doc: Paper, height: number): void {
  if (doc.y + height > PAGE.bottom) {
    doc.addPage();
    doc.y = PAGE.top;
  }
}

/** A line over the whole width. */
export function rule(doc: Paper, y: number, width: number): void {
  doc.moveTo(PAGE.left, y).lineTo(PAGE.right, y).lineWidth(width).stroke();
}
