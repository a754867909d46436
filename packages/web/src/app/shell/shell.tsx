import { Outlet } from 'react-router';
import { useSession } from '../../lib/session.tsx';
import { Bar } from './bar.tsx';

export function Shell() {
  const { user } = useSession();
  return (
    <>
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <Bar role={user.role} />
      <Outlet />
    </>
  );
}
