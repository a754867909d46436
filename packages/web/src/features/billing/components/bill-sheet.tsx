import { useQuery } from '@tanstack/react-query';
import { Sheet } from '../../../components/sheet.tsx';
import { billQuery } from '../api/money.queries.ts';
import { BillPanel } from './bill-panel.tsx';
import { billTitle } from './bill-words.ts';

/** A job's bill over whatever page it is asked for on. */
export function BillSheet({ jobId, onClose }: { jobId: string; onClose: () => void }) {
  const { data } = useQuery(billQuery(jobId));
  return (
    <Sheet title={data ? billTitle(data.bill) : 'Bill'} onClose={onClose} width={640}>
      <BillPanel jobId={jobId} isTitled={false} />
      <div className="h-5" />
    </Sheet>
  );
}
