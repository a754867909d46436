import { useEffect, useRef } from 'react';
import type { PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import { Icon } from '../../../../components/icon.tsx';
import { HandoverFiles } from './handover-files.tsx';
import './files-menu.css';

/** A locked week's files, opened from the page's head; Esc or a press beside it closes it. */
export function FilesMenu({ week }: { week: PayWeekHead }) {
  const menu = useRef<HTMLDetailsElement>(null);
  useEffect(() => {
    const close = (event: MouseEvent | KeyboardEvent) => {
      const isMeant =
        event instanceof KeyboardEvent ? event.key === 'Escape' : !menu.current?.contains(event.target as Node);
      if (isMeant && menu.current) menu.current.open = false;
    };
    document.addEventListener('mousedown', close);
    document.addEventListener('keydown', close);
    return () => {
      document.removeEventListener('mousedown', close);
      document.removeEventListener('keydown', close);
    };
  }, []);
  return (
    <details className="files-menu" ref={menu}>
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
