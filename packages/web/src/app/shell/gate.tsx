import { useCallback } from 'react';
import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation } from 'react-router';
import { getSessionAt } from '@driprail/shared/contracts/phone-addresses';
import { changeSession, sessionQuery } from '../../features/access/index.ts';
import { Fault, Fetching } from '../../components/states.tsx';
import { ApiError, call } from '../../lib/call.ts';
import { SessionProvider } from '../../lib/session.tsx';
import { useOutboxOf } from '../../lib/outbox/outbox.ts';
import { wipeCopies } from '../../lib/outbox/store.ts';
import { useLiveCache } from '../../lib/socket.ts';
import { paths } from '../paths.ts';

/** Lets only signed-in people pass, and keeps their screens in step. */
export function Gate() {
  const client = useQueryClient();
  const location = useLocation();
  const session = useQuery(sessionQuery);
  const onSignedOut = useCallback(() => {
    changeSession(client, null);
    // A session that was ended elsewhere takes its copies along; what waits to be sent stays for its person.
    void wipeCopies();
    // The answer says whether somebody ended it: then drafts and photos go too.
    call(getSessionAt).catch(() => undefined);
  }, [client]);
  useLiveCache(client, session.data?.user.id, onSignedOut);
  useOutboxOf(client, session.data?.user.id);

  const isSignedOut = session.data === null || (session.error instanceof ApiError && session.error.status === 401);
  if (isSignedOut) return <Navigate to={paths.signIn} replace state={{ from: location.pathname + location.search }} />;
  if (session.data) {
    return (
      <SessionProvider session={session.data}>
        <Outlet />
      </SessionProvider>
    );
  }
  if (session.error) return <Fault message={session.error.message} onRetry={() => void session.refetch()} />;
  return <Fetching what="your session" />;
}
