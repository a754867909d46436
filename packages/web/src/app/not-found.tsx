import { Link } from 'react-router';
import { PageHead, RailPage } from '../components/page-head.tsx';
import { Fault } from '../components/states.tsx';

export function NotFound() {
  return (
    <>
      <PageHead title="Not here" />
      <RailPage>
        <p className="empty">
          There is no page at this address. <Link to="/">Go to the start</Link>
        </p>
      </RailPage>
    </>
  );
}

/** A page that broke or could not be fetched; what was entered elsewhere is safe. */
export function PageFault({ error }: { error: unknown }) {
  return (
    <>
      <PageHead title="Something broke" />
      <RailPage>
        <Fault
          message={error instanceof Error ? error.message : 'This page could not be shown.'}
          onRetry={() => window.location.reload()}
        />
      </RailPage>
    </>
  );
}
