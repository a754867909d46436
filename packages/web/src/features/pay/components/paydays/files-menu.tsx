import type { PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import { Icon } from '../../../../components/icon.tsx';
import { HandoverFiles } from './handover-files.tsx';
import './files-menu.css';

/** A locked week's files, opened from the page's head. */
export function FilesMenu({ week }: { week: PayWeekHead }) {
  return (
    <details className="files-menu">
      <summary className="btn">
        <Icon name="dn" /> Files
      </summary>
      <div className="menu">
        <HandoverFiles
          base={`/api/pay/weeks/${week.startsOn}`}
          name={`pay-week-${week.startsOn}`}
          linesFile="export.csv"
        />
      </div>
    </details>
  );
}
