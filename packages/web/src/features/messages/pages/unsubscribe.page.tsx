import { useQuery } from '@tanstack/react-query';
import { useParams } from 'react-router';
import { Button } from '../../../components/button.tsx';
import { Loaded } from '../../../components/states.tsx';
import { stopQuery, useStop } from '../api/messages.queries.ts';
import '../components/stop-page.css';

/** Where the link at a mail's foot leads: one press stops such mails, without an account; one more takes it back. */
export function UnsubscribePage() {
  const { token = '' } = useParams();
  const state = useQuery(stopQuery(token));
  const stop = useStop(token);
  return (
    <main className="ph ms-stop" id="main">
      <Loaded query={state} what="your choice">
        {({ companyName, companyPhone, what, isStopped }) => (
          <>
            <header className="ms-stop-top">
              <p className="t-hang">{companyName}</p>
            </header>
            <div className="ms-stop-leg">
              <div className="rail" />
              <i className="bead" aria-hidden />
              <h1 className="t-hang">{isStopped ? 'Stopped' : 'Stop these mails'}</h1>
              <p className="py-2" role="status">
                {isStopped ? `You get no more mail with ${what}.` : `You get mail with ${what}.`}
              </p>
              {stop.error ? (
                <p className="tape my-2" role="alert">
                  <b>{stop.error.message}</b>
                </p>
              ) : null}
              <Button
                isBig
                look={isStopped ? 'plain' : 'main'}
                isBusy={stop.isPending}
                onClick={() => stop.mutate(!isStopped)}
              >
                {isStopped ? 'Send them again' : 'No more of them'}
              </Button>
              {companyPhone ? <p className="t-2 pt-4">Questions? Call {companyPhone}.</p> : null}
            </div>
          </>
        )}
      </Loaded>
    </main>
  );
}
