import type { PayWeekDto, PayWeekHead } from '@driprail/shared/contracts/pay.contract';
import { SelectField } from '../../../components/field.tsx';
import { money } from '../../../lib/format.ts';
import { lineWords } from './ledger.ts';
import { shortDate, weekSpan } from './week-model.ts';

interface Props {
  personId: string;
  /** Locked weeks before the one that pays. */
  weeks: PayWeekHead[];
  mends: string | null;
  locked: PayWeekDto | null;
  lineId: string;
  error: string | undefined;
  onWeek: (startsOn: string | null) => void;
  onLine: (lineId: string) => void;
}

/** Which line of which locked week is mended. */
export function CorrectedLineField({ personId, weeks, mends, locked, lineId, error, onWeek, onLine }: Props) {
  const lines = locked?.people.find((person) => person.personId === personId)?.lines ?? [];
  const lineIds = locked?.lineIds ?? {};
  const isEmpty = locked !== null && lines.length === 0;
  return (
    <div className="grid grid-cols-[1fr_1.6fr] gap-3 mt-3 max-[520px]:grid-cols-1">
      <SelectField label="Locked week" value={mends ?? ''} onChange={(event) => onWeek(event.target.value || null)}>
        <option value="">Choose the week</option>
        {weeks.map((week) => (
          <option key={week.startsOn} value={week.startsOn}>
            Week {week.number}, {weekSpan(week)}
          </option>
        ))}
      </SelectField>
      <SelectField
        label="Line that was wrong"
        value={lineId}
        error={error}
        disabled={lines.length === 0}
        hint={isEmpty ? 'No lines in that week. Choose a week in which there was pay.' : undefined}
        onChange={(event) => onLine(event.target.value)}
      >
        <option value="">{mends ? 'Choose the line' : 'Choose the week first'}</option>
        {lines.map((line, index) => (
          <option key={line.key} value={lineIds[`${personId}:${line.key}`]}>
            {index + 1}. {line.workedOn ? `${shortDate(line.workedOn)}, ` : ''}
            {line.jobNumber ? `job ${line.jobNumber}, ` : ''}
            {lineWords(line, locked?.customers ?? {})}, {money(line.amountCents)}
          </option>
        ))}
      </SelectField>
    </div>
  );
}
