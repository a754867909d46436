import { clockKindNames } from '@driprail/shared/domain/time/clock-kinds';
import { planClockKinds } from '@driprail/shared/domain/pay/plans/pay-plan';
import { SelectField, TextField } from '../../../components/field.tsx';
import { DraftRows } from './draft-rows.tsx';
import type { PlanPartProps } from './plan-base-fields.tsx';
import { EMPTY_PREMIUM } from './plan-draft.ts';

/** Dollars an hour on top for a role, a kind of work or some hours of the day. */
export function PremiumRows({ draft, fault, onChange }: PlanPartProps) {
  return (
    <DraftRows
      label="Premiums for a role or a shift"
      addLabel="Add a premium"
      className="has-premium"
      rows={draft.premiums}
      empty={EMPTY_PREMIUM}
      error={fault('extras.premiums')}
      onChange={(premiums) => onChange({ premiums })}
      fields={(row, change, at) => {
        const error = (field: string) => fault(`extras.premiums.${at}.${field}`);
        return (
          <>
            <TextField
              label="Name"
              value={row.label}
              error={error('label')}
              onChange={(event) => change({ label: event.target.value })}
            />
            <TextField
              label="Dollars an hour"
              inputMode="decimal"
              value={row.perHour}
              error={error('perHour')}
              onChange={(event) => change({ perHour: event.target.value })}
            />
            <SelectField label="For" value={row.kind} onChange={(event) => change({ kind: event.target.value })}>
              <option value="">all worked time</option>
              {planClockKinds.map((kind) => (
                <option key={kind} value={kind}>
                  {clockKindNames[kind].toLowerCase()}
                </option>
              ))}
            </SelectField>
            <TextField
              label="Only from"
              type="time"
              value={row.from}
              error={error('between.from')}
              onChange={(event) => change({ from: event.target.value })}
            />
            <TextField
              label="to"
              type="time"
              value={row.to}
              error={error('between.to') ?? error('between')}
              onChange={(event) => change({ to: event.target.value })}
            />
          </>
        );
      }}
    />
  );
}
