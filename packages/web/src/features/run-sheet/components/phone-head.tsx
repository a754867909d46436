import type { ReactNode } from 'react';
import { useAbility } from '@casl/react';
import { Link } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import { paths } from '../../../app/paths.ts';
import { OutboxLine } from './outbox-line.tsx';
import { useSession } from '../../../lib/session.tsx';
import { useIsLive } from '../../../lib/socket.ts';
import { useOnline } from '../../../lib/use-online.ts';

/** The head of a phone page: a line, a hanging name, and whether there is signal. */
export function PhoneHead({
  above,
  title,
  menu,
  children,
}: {
  above: ReactNode;
  title: string;
  menu: (ability: AppAbility) => ReactNode;
  children?: ReactNode;
}) {
  const ability = useAbility<AppAbility>();
  const isOnline = useOnline();
  const isLive = useIsLive();
  const { user } = useSession();
  return (
    <header className="ph-head">
      <div className="flex justify-between items-start gap-3">
        <p className="t-2">
          {above}, {user.name}
        </p>
        <span className="flex items-start gap-1 shrink-0 whitespace-nowrap">
          <Link className="help" to={paths.firstAid}>
            First help
          </Link>
          {menu(ability)}
        </span>
      </div>
      <div className="flex justify-between items-end gap-3">
        <h1 className="t-hang">{title}</h1>
        {children}
      </div>
      <OutboxLine isOnline={isOnline} isLive={isLive} />
    </header>
  );
}
