import type { ReactNode } from 'react';
import { useSession } from '../../lib/session.tsx';
import { Bar } from './bar.tsx';

/** The desk's frame: the bar above, the page below. */
export function Shell({ children }: { children: ReactNode }) {
  const { user } = useSession();
  return (
    <>
      <a className="skip" href="#main">
        Skip to the page
      </a>
      <Bar role={user.role} />
      {children}
    </>
  );
}
