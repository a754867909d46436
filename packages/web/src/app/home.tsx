import { Navigate } from 'react-router';
import { useSession } from '../lib/session.tsx';
import { paths } from './paths.ts';

/** Where each role's day starts. */
export function Home() {
  const { user } = useSession();
  return <Navigate to={user.role === 'technician' ? paths.runSheet : paths.board} replace />;
}
