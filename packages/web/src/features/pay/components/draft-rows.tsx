import type { ReactNode } from 'react';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';

interface Props<Row> {
  label: string;
  addLabel: string;
  rows: Row[];
  empty: Row;
  /** The rows' layout, a class of the grid. */
  className: string;
  error: string | undefined;
  fields: (row: Row, change: (part: Partial<Row>) => void, at: number) => ReactNode;
  onChange: (rows: Row[]) => void;
}

/** Lines of a form that are added and taken out one by one. */
export function DraftRows<Row>({ label, addLabel, rows, empty, className, error, fields, onChange }: Props<Row>) {
  const change = (at: number) => (part: Partial<Row>) =>
    onChange(rows.map((row, index) => (index === at ? { ...row, ...part } : row)));
  return (
    <fieldset className="mt-3">
      <legend>{label}</legend>
      {rows.map((row, at) => (
        <div key={at} className={`svc-row ${className}`}>
          {fields(row, change(at), at)}
          <Button
            look="bare"
            aria-label={`Take out line ${at + 1}`}
            onClick={() => onChange(rows.filter((_row, index) => index !== at))}
          >
            <Icon name="x" />
          </Button>
        </div>
      ))}
      {error ? (
        <p className="tape err" role="alert">
          {error}
        </p>
      ) : null}
      <Button onClick={() => onChange([...rows, empty])}>
        <Icon name="plus" /> {addLabel}
      </Button>
    </fieldset>
  );
}
