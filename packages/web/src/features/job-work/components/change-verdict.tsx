import { useState } from 'react';
import type { Change, Judged } from '@driprail/shared/domain/job-work/judge-change';
import { TextField } from '../../../components/field.tsx';
import { Picks } from '../../../components/picks.tsx';
import { useFormats } from '../../../lib/format.ts';
import { useIsLive } from '../../../lib/socket.ts';
import { useOnline } from '../../../lib/use-online.ts';
import type { AtVisit } from '../api/work.queries.ts';
import { usePressChange } from '../api/work.queries.ts';
import { signed, timeWords } from './change-row.tsx';
import { PressFault } from './press-fault.tsx';

const reasons = ['Customer asked', 'Dirtier than booked', 'Not needed', 'Booked for another size'];
const yeses = ['in_person', 'name'] as const;
const yesNames = { in_person: 'Said yes in person', name: 'Types the name' };

interface ChangeVerdictProps {
  change: Change;
  judged: Judged;
  at: AtVisit;
  onDone: () => void;
}

/** What the customer sees before saying yes: the difference, the new finish, and what stands in the way. */
export function ChangeVerdict({ change, judged, at, onDone }: ChangeVerdictProps) {
  const format = useFormats();
  const press = usePressChange(at);
  const isOnline = useOnline();
  const isLive = useIsLive();
  const [reason, setReason] = useState('');
  const [yes, setYes] = useState<(typeof yeses)[number] | null>(null);
  const [name, setName] = useState('');
  const hasSignal = isOnline && isLive;
  const isHindered = judged.hindrances.length > 0;
  const isReady = reason.trim() !== '' && (yes === 'in_person' || (yes === 'name' && name.trim() !== ''));
  const send = (isQuote: boolean) =>
    press.mutate(
      {
        ...{ change, reason: reason.trim(), shownCents: judged.priceDifferenceCents, isQuote },
        ...{ saidYesBy: yes === 'name' ? name.trim() : '', isBoardNotAsked: isHindered && !hasSignal },
      },
      { onSuccess: onDone },
    );
  return (
    <>
      <dl className="wk-verdict">
        <div>
          <dt>Price</dt>
          <dd>{signed(judged.priceDifferenceCents)}</dd>
        </div>
        <div>
          <dt>Through about</dt>
          <dd>{format.clock(judged.finishAfter)}</dd>
          <dd className="t-2">{timeWords(judged.minutesDifference)}</dd>
        </div>
      </dl>
      {judged.hindrances.map((one) => (
        <p className="tape my-2" key={one.code}>
          <b>In the way.</b> {one.message}
        </p>
      ))}
      <h2 className="sec">Why</h2>
      <Picks options={reasons} value={reason} onPick={setReason} className="grid grid-cols-2 gap-2 my-2" />
      <TextField label="Reason" value={reason} maxLength={300} onChange={(event) => setReason(event.target.value)} />
      <h2 className="sec mt-3">The customer sees this and says yes</h2>
      <Picks
        options={yeses}
        value={yes}
        onPick={setYes}
        nameOf={(one) => yesNames[one]}
        className="grid grid-cols-2 gap-2 my-2"
      />
      {yes === 'name' ? (
        <TextField
          label="Customer’s name"
          value={name}
          maxLength={80}
          onChange={(event) => setName(event.target.value)}
        />
      ) : null}
      <PressFault error={press.error} />
      <footer className="ph-act">
        {isHindered && !hasSignal ? <p className="pb-2">No signal: it is marked “board not asked”.</p> : null}
        <button type="button" className="ph-main" disabled={!isReady || press.isPending} onClick={() => send(false)}>
          {!isHindered ? 'Change the job' : hasSignal ? 'Ask the board' : 'Keep for the board'}
        </button>
        <div className="below">
          <button type="button" className="btn" disabled={!isReady || press.isPending} onClick={() => send(true)}>
            Keep as a quote
          </button>
        </div>
      </footer>
    </>
  );
}
