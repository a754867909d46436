import { TextField } from '../../../../components/field.tsx';

interface Props {
  value: string;
  error: string | undefined;
  onChange: (startsOn: string) => void;
}

/** The first day of the workweek from which a rule holds. */
export function StartField({ value, error, onChange }: Props) {
  return (
    <TextField
      label="From, the first day of a workweek"
      type="date"
      value={value}
      error={error}
      onChange={(event) => onChange(event.target.value)}
    />
  );
}
