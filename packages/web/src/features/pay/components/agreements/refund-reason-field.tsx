import { useQuery } from '@tanstack/react-query';
import { SelectField } from '../../../../components/field.tsx';
import { agreementsQuery } from '../../api/agreements.queries.ts';
import { reasonsOn } from './agreement-words.ts';

interface Props {
  /** Company-zone day whose reasons are offered. */
  day: string;
  value: string;
  error: string | undefined;
  onChange: (id: string) => void;
}

/** Why the customer was refunded. A reason that leaves commission alone is shown and cannot be chosen. */
export function RefundReasonField({ day, value, error, onChange }: Props) {
  const reasons = reasonsOn(useQuery(agreementsQuery).data?.refundReasons ?? [], day);
  return (
    <SelectField
      className="mt-3"
      label="Why the customer was refunded"
      value={value}
      error={error}
      hint={reasons.length === 0 ? 'No reasons yet. Add them under Rates and rules, Agreements.' : undefined}
      onChange={(event) => onChange(event.target.value)}
    >
      <option value="">Choose the reason</option>
      {reasons.map((reason) => (
        <option key={reason.id} value={reason.id} disabled={!reason.lowersCommission}>
          {reason.name}
          {reason.lowersCommission ? '' : ', leaves commission alone'}
        </option>
      ))}
    </SelectField>
  );
}
