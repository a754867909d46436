import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { PayRulesDto } from '@driprail/shared/contracts/pay-rates.contract';
import { Button } from '../../../../components/button.tsx';
import { Sheet } from '../../../../components/sheet.tsx';
import { money } from '../../../../lib/format.ts';
import { jobsPaidQuery } from '../../api/jobs-paid.queries.ts';
import { JobsPaidSheet } from './jobs-paid-sheet.tsx';

/** Where commission is earned on payment: which finished jobs nobody paid for, and the way to mark them. */
export function WaitingTape({ rules }: { rules: readonly PayRulesDto[] }) {
  const isUsed = rules.some((one) => one.commissionEarned === 'paid');
  const query = useQuery({ ...jobsPaidQuery, enabled: isUsed });
  const [isOpen, setOpen] = useState(false);
  if (!isUsed || !query.data) return null;
  const { waiting } = query.data;
  const cents = waiting.reduce((sum, job) => sum + job.totalCents, 0);
  return (
    <>
      <p className="t-2 flex flex-wrap items-center gap-3 mb-2">
        <span>
          {waiting.length === 0
            ? 'Every finished job is paid for; no commission waits.'
            : `Commission of ${waiting.length === 1 ? '1 job' : `${waiting.length} jobs`}, ${money(cents)} sold, waits until the customer pays.`}
        </span>
        <Button onClick={() => setOpen(true)}>Jobs paid for</Button>
      </p>
      {isOpen ? (
        <Sheet title="Jobs paid for" onClose={() => setOpen(false)} width={720}>
          <JobsPaidSheet {...query.data} />
        </Sheet>
      ) : null}
    </>
  );
}
