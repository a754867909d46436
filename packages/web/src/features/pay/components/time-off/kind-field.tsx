import { timeOffKindNames, timeOffKinds } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import type { TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { SelectField } from '../../../../components/field.tsx';

interface Props {
  label: string;
  value: TimeOffKind;
  error: string | undefined;
  /** Beside the name of a kind, like what is there of it. */
  more?: (kind: TimeOffKind) => string;
  onChange: (kind: TimeOffKind) => void;
}

/** Sick, vacation or holiday. */
export function KindField({ label, value, error, more, onChange }: Props) {
  return (
    <SelectField
      label={label}
      value={value}
      error={error}
      onChange={(event) => onChange(event.target.value as TimeOffKind)}
    >
      {timeOffKinds.map((kind) => (
        <option key={kind} value={kind}>
          {timeOffKindNames[kind]}
          {more?.(kind)}
        </option>
      ))}
    </SelectField>
  );
}
