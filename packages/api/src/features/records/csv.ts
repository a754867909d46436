import { parse } from 'csv-parse/sync';
import type { z } from 'zod';

export interface Complaint {
  /** Line of the file, as a text editor counts. */
  line: number;
  reason: string;
}
export interface ReadRow<T> {
  line: number;
  row: T;
}

/**
 * Reads a CSV with a head line: with or without a byte-order mark, any line ends, commas or semicolons.
 * @returns the rows that make sense, and a complaint for each that does not
 */
export function readCsv<S extends z.ZodType>(
  text: string,
  schema: S,
): { rows: ReadRow<z.infer<S>>[]; complaints: Complaint[] } {
  const rows: ReadRow<z.infer<S>>[] = [];
  const complaints: Complaint[] = [];
  for (const { line, record } of recordsOf(text)) {
    const parsed = schema.safeParse(record);
    if (parsed.success) rows.push({ line, row: parsed.data });
    else {
      for (const issue of parsed.error.issues) {
        const unknown = issue.code === 'unrecognized_keys' ? `There is no column ${issue.keys.join(', ')}.` : null;
        complaints.push({ line, reason: unknown ?? `${issue.path.join('.')}: ${issue.message}` });
      }
    }
  }
  return { rows, complaints };
}

/** @throws Error with one sentence when the file is no CSV at all */
function recordsOf(text: string): { line: number; record: Record<string, string> }[] {
  const head = text.replace(/^\uFEFF/, '').split(/\r\n|\r|\n/, 1)[0] ?? '';
  const delimiter = head.includes(';') && !head.includes(',') ? ';' : ',';
  try {
    const parsed = parse(text, {
      bom: true,
      columns: (names: string[]) => names.map((name) => name.trim().toLowerCase()),
      delimiter,
      info: true,
      record_delimiter: ['\r\n', '\n', '\r'],
      skip_empty_lines: true,
      trim: true,
    }) as unknown as { record: Record<string, string>; info: { lines: number } }[];
    return parsed.map(({ record, info }) => ({ line: info.lines, record }));
  } catch (error) {
    throw new Error(`The file can’t be read as CSV: ${error instanceof Error ? error.message : String(error)}`, {
      cause: error,
    });
  }
}

/** Rows that belong together, in the order in which each group first came. */
export function grouped<T>(rows: T[], keyOf: (row: T) => string): Map<string, T[]> {
  const groups = new Map<string, T[]>();
  for (const row of rows) groups.set(keyOf(row), [...(groups.get(keyOf(row)) ?? []), row]);
  return groups;
}
