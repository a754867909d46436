import type { Transaction } from 'sequelize';
import { User } from '../../db/models/index.ts';
import { inTransaction } from '../../db/sequelize.ts';
import type { Ctx } from '../../http/context.ts';
import { abilityFor } from '@driprail/shared/authz/ability';
import type { Clock } from '../../clock.ts';
import { customerRow, jobRow } from './columns.ts';
import type { Complaint } from './csv.ts';
import { readCsv } from './csv.ts';
import { importCustomers } from './import-customers.ts';
import { importJobs } from './import-jobs.ts';

export type ImportKind = 'customers' | 'jobs';
export interface ImportReport {
  rows: number;
  made: number;
  complaints: Complaint[];
}

/** Leaves the transaction without keeping anything. */
class NothingKept extends Error {
  readonly report: ImportReport;
  constructor(report: ImportReport) {
    super('nothing kept');
    this.report = report;
  }
}

/** Loads a list: all rows or none. A dry run does everything and keeps nothing. */
export async function importCsv(
  kind: ImportKind,
  text: string,
  { isDry, now }: { isDry: boolean; now: Clock },
): Promise<ImportReport> {
  const ctx = await ownerContext(now);
  try {
    return await inTransaction(async (tx) => {
      const report = kind === 'customers' ? await loadCustomers(tx, ctx, text) : await loadJobs(tx, ctx, text);
      if (isDry || report.complaints.length > 0) throw new NothingKept(report);
      return report;
    });
  } catch (error) {
    if (error instanceof NothingKept) return error.report;
    throw error;
  }
}

async function loadCustomers(tx: Transaction, ctx: Ctx, text: string): Promise<ImportReport> {
  const { rows, complaints } = readCsv(text, customerRow);
  const result = await importCustomers(tx, ctx, rows);
  return { rows: rows.length, made: result.made, complaints: byLine([...complaints, ...result.complaints]) };
}

async function loadJobs(tx: Transaction, ctx: Ctx, text: string): Promise<ImportReport> {
  const { rows, complaints } = readCsv(text, jobRow);
  const result = await importJobs(tx, ctx, rows);
  return { rows: rows.length, made: result.made, complaints: byLine([...complaints, ...result.complaints]) };
}

function byLine(complaints: Complaint[]): Complaint[] {
  return complaints.sort((a, b) => a.line - b.line);
}

/** A list from the terminal is loaded in the owner's name. @throws Error before the company is set up */
async function ownerContext(now: Clock): Promise<Ctx> {
  const owner = await User.findOne({ where: { role: 'owner', isActive: true } });
  if (!owner) throw new Error('Set up the company first: start Driprail and open it in a browser.');
  const actor = { userId: owner.id, personId: owner.personId, role: owner.role };
  return { actor, name: owner.name, ability: abilityFor(actor), now };
}
