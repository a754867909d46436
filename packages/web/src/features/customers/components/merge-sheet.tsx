import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { MergePreview } from '@driprail/shared/contracts/customers-merge.contract';
import { Button } from '../../../components/button.tsx';
import { FormError } from '../../../components/form-error.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { Loaded } from '../../../components/states.tsx';
import { mergeQuery, useMerge } from '../api/merge.queries.ts';

interface MergeSheetProps {
  /** The record that stays, and the one that goes into it; they can be swapped. */
  ids: [string, string];
  onMerged: (id: string) => void;
  onClose: () => void;
}

/** What moves from one record into another, to look at before it is done. */
export function MergeSheet({ ids, onMerged, onClose }: MergeSheetProps) {
  const [[staysId, goesId], setIds] = useState(ids);
  const merge = useMerge();
  // While it is done, and after, there is nothing to look at any more.
  const preview = useQuery({ ...mergeQuery(staysId, goesId), enabled: !merge.isPending && !merge.isSuccess });
  return (
    <Sheet title="Merge two records" onClose={onClose} width={680}>
      <Loaded query={preview} what="what would move">
        {(shown) => (
          <>
            <dl className="cu-merge">
              <dt>Stays</dt>
              <dd dir="auto">{shown.stays.name}</dd>
              <dt>Goes into it</dt>
              <dd dir="auto">{shown.goes.name}</dd>
            </dl>
            <Button onClick={() => setIds([goesId, staysId])}>
              <span>
                Keep the record of <bdi>{shown.goes.name}</bdi> instead
              </span>
            </Button>
            <h3 className="sec mt-4">What moves</h3>
            <ul className="cu-moves">
              {movesOf(shown.moves).map((move) => (
                <li key={move}>{move}</li>
              ))}
              {shown.words.map((words) => (
                <li key={words} dir="auto">
                  {words}
                </li>
              ))}
              <li>Consents come along for the same number or mailbox; a no of either stands.</li>
              <li>
                The address of the record of <bdi>{shown.goes.name}</bdi> leads to the one that stays, and its name and
                phone still find it. Invoices keep the name they were issued to.
              </li>
            </ul>
            <p className="mt-3">This can’t be undone.</p>
            {shown.problems.map((problem) => (
              <p key={problem} className="tape mt-2" role="alert">
                <b>{problem}</b>
              </p>
            ))}
            <FormError error={merge.error} />
            <SheetFoot>
              <Button onClick={onClose}>Leave both</Button>
              <Button
                look="main"
                isBusy={merge.isPending || preview.isFetching}
                disabled={shown.problems.length > 0}
                onClick={() => merge.mutate(shown, { onSuccess: ({ id }) => onMerged(id) })}
              >
                <span>
                  Merge into <bdi>{shown.stays.name}</bdi>
                </span>
              </Button>
            </SheetFoot>
          </>
        )}
      </Loaded>
    </Sheet>
  );
}

function movesOf({ addresses, vehicles, jobs, photos }: MergePreview['moves']): string[] {
  const counted = (count: number, one: string, many: string) => `${count} ${count === 1 ? one : many}`;
  return [
    counted(addresses, 'address', 'addresses'),
    counted(vehicles, 'vehicle', 'vehicles'),
    `${counted(jobs, 'job', 'jobs')} with visits and walk-rounds${photos > 0 ? `, ${counted(photos, 'photo', 'photos')}` : ''}`,
  ];
}
