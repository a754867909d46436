import { useQuery } from '@tanstack/react-query';
import type { PairedCustomer } from '@driprail/shared/contracts/customers-merge.contract';
import { likenessNames } from '@driprail/shared/domain/customer/duplicates';
import { Button } from '../../../components/button.tsx';
import { FormError } from '../../../components/form-error.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { duplicatesQuery, useKeepApart } from '../api/merge.queries.ts';

/** Pairs that are likely one customer, each to be merged or told apart. */
export function DuplicatesSheet({
  onMerge,
  onClose,
}: {
  onMerge: (ids: [string, string]) => void;
  onClose: () => void;
}) {
  const duplicates = useQuery(duplicatesQuery);
  const apart = useKeepApart();
  return (
    <Sheet title="Likely duplicates" onClose={onClose} width={860}>
      <Loaded query={duplicates} what="likely duplicates">
        {({ pairs }) =>
          pairs.length === 0 ? (
            <Empty>No two customers share a phone, an e-mail, a plate, a VIN, or an alike name at one address.</Empty>
          ) : (
            <ul className="cu-pairs">
              {pairs.map(({ one, other, why }) => (
                <li key={`${one.id}${other.id}`}>
                  <Half customer={one} />
                  <Half customer={other} />
                  <p className="cu-why">{why.map((likeness) => likenessNames[likeness]).join('. ')}</p>
                  <p className="cu-pair-acts">
                    <Button isBusy={apart.isPending} onClick={() => apart.mutate([one.id, other.id])}>
                      Two customers
                    </Button>
                    <Button onClick={() => onMerge(one.jobs >= other.jobs ? [one.id, other.id] : [other.id, one.id])}>
                      See what a merge moves
                    </Button>
                  </p>
                </li>
              ))}
            </ul>
          )
        }
      </Loaded>
      <FormError error={apart.error} />
    </Sheet>
  );
}

function Half({ customer: { name, phone, email, place, jobs } }: { customer: PairedCustomer }) {
  return (
    <p>
      <b className="t-name" dir="auto">
        {name}
      </b>
      <small>{[phone, email].filter(Boolean).join(', ') || 'No phone, no e-mail'}</small>
      <small dir="auto">{place}</small>
      <small>
        {jobs} job{jobs === 1 ? '' : 's'}
      </small>
    </p>
  );
}
