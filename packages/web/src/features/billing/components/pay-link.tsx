import { useEffect, useRef, useState } from 'react';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { Loaded } from '../../../components/states.tsx';
import { useOpenPayLink } from '../api/money.queries.ts';

/** The customer's own page of this job: its address, to be copied into a message. */
export function PayLink({ jobId, onDone }: { jobId: string; onDone: () => void }) {
  const link = useOpenPayLink(jobId);
  const { mutate } = link;
  useEffect(() => mutate(), [mutate]);
  return (
    <section className="bl-task" aria-label="Customer’s link">
      <h3 className="sec">Customer’s link</h3>
      <Loaded query={{ data: link.data, error: link.error, refetch: mutate }} what="the link">
        {({ url }) => <Address url={url} />}
      </Loaded>
      <p className="t-2">
        Whoever has this address sees this one job and may pay it by card. It stays good for 90 days after it was last
        opened here.
      </p>
      <div className="bl-foot">
        <Button onClick={onDone}>Close</Button>
      </div>
    </section>
  );
}

function Address({ url }: { url: string }) {
  const field = useRef<HTMLInputElement>(null);
  const [said, setSaid] = useState('');
  const copy = async () => {
    field.current?.select();
    try {
      await navigator.clipboard.writeText(url);
      setSaid('Copied.');
    } catch {
      // Outside https a browser lets no page write there.
      setSaid('This browser does not copy by itself: the address is marked, press Ctrl+C.');
    }
  };
  return (
    <>
      <div className="bl-copy">
        <input
          ref={field}
          className="inp"
          aria-label="The address"
          readOnly
          value={url}
          onFocus={(event) => event.target.select()}
        />
        <Button look="main" onClick={() => void copy()}>
          <Icon name="copy" /> Copy address
        </Button>
      </div>
      <p role="status">{said}</p>
    </>
  );
}
