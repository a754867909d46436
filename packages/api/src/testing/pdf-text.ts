import { inflateSync } from 'node:zlib';
import type { Test } from 'supertest';

/** Asks for a file and keeps its bytes. */
export async function fileOf(asked: Test): Promise<{ status: number; type: string; bytes: Buffer }> {
  const answer = await asked.buffer(true).parse((res, done) => {
    const parts: Buffer[] = [];
    res.on('data', (part: Buffer) => parts.push(part));
    res.on('end', () => done(null, Buffer.concat(parts)));
  });
  return { status: answer.status, type: answer.type, bytes: answer.body as Buffer };
}

/** Words on paper, and where: points from the left edge and from the foot of the page. */
export interface Printed {
  words: string;
  x: number;
  y: number;
}

/** The words of a PDF of ours, line by line. */
export function pdfText(pdf: Buffer): string {
  return printedOn(pdf)
    .map(({ words }) => words)
    .join('\n');
}

/** What is printed, in the order in which it was written: the one font is a subset, whose own map names each glyph's letter. */
export function printedOn(pdf: Buffer): Printed[] {
  const streams = streamsOf(pdf);
  const letters = new Map<string, string>();
  for (const stream of streams.filter((one) => one.includes('beginbfrange'))) {
    for (const [, from = '', list = ''] of stream.matchAll(/<(\w+)> <\w+> \[([^\]]*)\]/g)) {
      const found = [...list.matchAll(/<([\w ]+)>/g)];
      found.forEach(([, hex = ''], index) =>
        letters.set(
          (Number.parseInt(from, 16) + index).toString(16).padStart(4, '0'),
          String.fromCharCode(...(hex.match(/\w{4}/g) ?? []).map((unit) => Number.parseInt(unit, 16))),
        ),
      );
    }
  }
  const shown = streams.flatMap((one) => [...one.matchAll(/1 0 0 1 ([\d.]+) ([\d.]+) Tm[^[]*\[([^\]]*)\] TJ/g)]);
  return shown.map(([, x, y, parts = '']) => {
    const glyphs = [...parts.matchAll(/<(\w+)>/g)].flatMap(([, hex = '']) => hex.match(/\w{4}/g) ?? []);
    const words = glyphs.map((glyph) => letters.get(glyph.toLowerCase()) ?? '').join('');
    return { words, x: Number(x), y: Number(y) };
  });
}

function streamsOf(pdf: Buffer): string[] {
  const text = pdf.toString('latin1');
  return [...text.matchAll(/FlateDecode\n>>\nstream\n/g)].map((found) => {
    const start = found.index + found[0].length;
    const end = text.indexOf('endstream', start);
    return inflateSync(pdf.subarray(start, end)).toString('latin1');
  });
}
