import { Link } from 'react-router';
import type { RunSheetDto } from '@driprail/shared/contracts/run-sheet.contract';
import { addDays } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { useSession } from '../../../lib/session.tsx';

/** Who rides along, and the way to the neighboring day. */
export function DayLinks({ sheet, today }: { sheet: RunSheetDto; today: string }) {
  const { user } = useSession();
  const others = sheet.crewNames.filter((name) => name !== user.name);
  return (
    <>
      {others.length > 0 ? <span>With {others.join(', ')}. </span> : null}
      {sheet.day === today ? (
        <Link to={paths.runSheetDay(addDays(today, 1))}>
          Tomorrow <Icon name="right" />
        </Link>
      ) : (
        <Link to={paths.runSheet}>
          <Icon name="left" /> Today
        </Link>
      )}
    </>
  );
}
