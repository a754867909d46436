import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { AgreementDto, RefundReasonDto } from '@driprail/shared/contracts/pay-agreements.contract';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Button } from '../../../../components/button.tsx';
import { Empty, Loaded } from '../../../../components/states.tsx';
import { agreementsQuery } from '../../api/agreements.queries.ts';
import { AgreementForm } from './agreement-form.tsx';
import { agreementWords } from './agreement-words.ts';
import { RefundReasonForm } from './refund-reason-form.tsx';

interface Props {
  people: PersonDto[];
  personId: string | null;
  startsOn: string;
  today: string;
}

/** What people signed, and which refunds touch commission: both dated, nothing written over. */
export function AgreementsSheet({ people, personId, startsOn, today }: Props) {
  const query = useQuery(agreementsQuery);
  const [open, setOpen] = useState<'agreement' | 'reason' | null>(null);
  const close = () => setOpen(null);
  return (
    <Loaded query={query} what="the agreements">
      {({ agreements, refundReasons }) => (
        <>
          <h3 className="sec">Signed agreements</h3>
          {agreements.length === 0 ? (
            <Empty>None yet. Refunds touch nobody’s commission, and overtime goes by the weighted average.</Empty>
          ) : (
            <ul className="dated-list">
              {agreements.map((one) => (
                <Agreement key={one.id} agreement={one} />
              ))}
            </ul>
          )}
          <p className="mt-3">
            <Button onClick={() => setOpen('agreement')}>Record an agreement</Button>
          </p>
          {open === 'agreement' ? (
            <AgreementForm people={people} personId={personId} startsOn={startsOn} onDone={close} />
          ) : null}
          <h3 className="sec mt-5">Reasons for refunds</h3>
          {refundReasons.length === 0 ? (
            <Empty>None yet. Add a reason before a refund can lower commission; goodwill should not.</Empty>
          ) : (
            <ul className="dated-list">
              {refundReasons.map((one) => (
                <Reason key={one.id} reason={one} />
              ))}
            </ul>
          )}
          <p className="mt-3 mb-5">
            <Button onClick={() => setOpen('reason')}>Add a reason</Button>
          </p>
          {open === 'reason' ? <RefundReasonForm startsOn={today} onDone={close} /> : null}
        </>
      )}
    </Loaded>
  );
}

function Agreement({ agreement: { personName, kind, startsOn, signedOn, note, setBy } }: { agreement: AgreementDto }) {
  return (
    <li>
      <b>{personName}</b>
      <span>
        {agreementWords[kind].label}, {signedOn ? 'from' : 'no longer from'} {formatDate(startsOn)} on
      </span>
      <span>
        {signedOn ? `Signed ${formatDate(signedOn)}. ${note}` : note || 'Ended'}
        {setBy ? `, ${setBy}` : ''}
      </span>
    </li>
  );
}

function Reason({ reason: { name, lowersCommission, startsOn, setBy } }: { reason: RefundReasonDto }) {
  return (
    <li>
      <b>{name}</b>
      <span>
        {lowersCommission ? 'Lowers commission' : 'Leaves commission alone'}, from {formatDate(startsOn)} on
        {setBy ? `, ${setBy}` : ''}
      </span>
    </li>
  );
}
