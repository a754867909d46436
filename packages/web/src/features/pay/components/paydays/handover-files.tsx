import { Icon } from '../../../../components/icon.tsx';
import './handover-files.css';

interface Props {
  /** "/api/pay/paydays/<id>" or "/api/pay/weeks/<day>". */
  base: string;
  /** How the files are called on one's own disk, "payday-2026-05-15". */
  name: string;
  /** A week's lines had a name before paydays came. */
  linesFile?: 'lines.csv' | 'export.csv';
}

/** Links to what goes to the payroll processor. */
export function HandoverFiles({ base, name, linesFile = 'lines.csv' }: Props) {
  const files = [
    { file: 'export.zip', label: 'Everything, ZIP', what: 'Statements as PDFs, the files below and a README' },
    { file: 'kinds.csv', label: 'By kind of pay, CSV', what: 'A row per person and week' },
    { file: linesFile, label: 'Lines, CSV', what: 'A row per amount with its rule' },
    { file: 'hours.csv', label: 'Hours, CSV', what: 'The clock entries that were paid' },
  ];
  return (
    <ul className="pd-files">
      {files.map(({ file, label, what }) => (
        <li key={file}>
          <a href={`${base}/${file}`} download={`${name}-${file}`}>
            <Icon name="dn" />
            <span>
              <b>{label}</b>
              <small>{what}</small>
            </span>
          </a>
        </li>
      ))}
    </ul>
  );
}
