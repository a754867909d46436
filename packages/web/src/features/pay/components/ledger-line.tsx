import type { ReactNode } from 'react';
import { Link } from 'react-router';
import type { CorrectedLine } from '@driprail/shared/contracts/pay.contract';
import type { PayLine } from '@driprail/shared/domain/pay/pay-week.types';
import { money } from '../../../lib/format.ts';
import { howText, lineWords } from './ledger.ts';
import type { Customers, LedgerGroup } from './ledger.ts';
import { shortDate } from './week-model.ts';
import { boardJob } from './working.ts';

/** A group of a person's lines under its title and sum. */
export function LedgerSection({ group, children }: { group: LedgerGroup; children: ReactNode }) {
  return (
    <section className={`lg ${group.isPayable ? '' : 'is-shown'}`}>
      <h3>
        {group.title}
        <span>{group.isPayable ? money(group.cents) : `${money(group.cents)} in hand`}</span>
      </h3>
      <ol>{children}</ol>
      {group.isPayable ? null : <p className="lg-note">Kept on the spot. Shown here, adds nothing to what is paid.</p>}
    </section>
  );
}

interface CellsProps {
  line: PayLine;
  customers: Customers;
  amount?: ReactNode;
  corrected?: CorrectedLine | undefined;
  /** Whether the job number opens the board. */
  opensJob?: boolean;
}

/** One line's cells: date, job, what it is, how it came about, amount. */
export function LineCells({ line, customers, amount, corrected, opensJob = false }: CellsProps) {
  const number = line.jobNumber;
  return (
    <>
      {line.workedOn ? <span className="dt">{shortDate(line.workedOn)}</span> : null}
      {number === null ? null : opensJob && line.jobId ? (
        <Link className="jb" to={boardJob(line.jobId, line.workedOn)} aria-label={`Job ${number} on the board`}>
          {number}
        </Link>
      ) : (
        <span className="jb">{number}</span>
      )}
      <span className={line.workedOn ? 'wh' : 'wh is-wide'}>
        {lineWords(line, customers)}
        {corrected ? (
          <small>
            corrects week {corrected.number}, line {corrected.position + 1}: {corrected.label}
          </small>
        ) : null}
      </span>
      <span className="hw">{howText(line)}</span>
      <span className="am">{amount ?? money(line.amountCents)}</span>
    </>
  );
}
