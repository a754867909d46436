import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { DraftRows } from './draft-rows.tsx';
import { planKinds } from './plan-draft.ts';
import type { PlanDraft } from './plan-draft.ts';

export interface PlanPartProps {
  draft: PlanDraft;
  fault: (path: string) => string | undefined;
  onChange: (part: Partial<PlanDraft>) => void;
}

const periods = {
  weekly: 'a week',
  biweekly: 'two weeks',
  semimonthly: 'half a month',
  monthly: 'a month',
  annual: 'a year',
};

/** The figures that the chosen kind of plan asks for. */
export function PlanBaseFields({ draft, fault, onChange }: PlanPartProps) {
  const { fields } = planKinds[draft.kind];
  return (
    <div className="grid grid-cols-2 gap-3 mt-3 max-[520px]:grid-cols-1">
      {fields.map(({ name, label }) => (
        <TextField
          key={name}
          label={label}
          inputMode="decimal"
          value={draft.values[name] ?? ''}
          error={fault(`base.${name}`)}
          onChange={(event) => onChange({ values: { ...draft.values, [name]: event.target.value } })}
        />
      ))}
      {draft.kind === 'salary' ? (
        <SelectField
          label="Paid for"
          value={draft.period}
          onChange={(event) => onChange({ period: event.target.value })}
        >
          {Object.entries(periods).map(([period, label]) => (
            <option key={period} value={period}>
              {label}
            </option>
          ))}
        </SelectField>
      ) : null}
      {draft.kind === 'tiered_percent' ? <TierFields draft={draft} fault={fault} onChange={onChange} /> : null}
    </div>
  );
}

function TierFields({ draft, fault, onChange }: PlanPartProps) {
  return (
    <>
      <DraftRows
        label="Tiers of what was sold"
        addLabel="Add a tier"
        className="has-tier"
        rows={draft.tiers}
        empty={{ over: '', percent: '' }}
        error={fault('base.tiers')}
        onChange={(tiers) => onChange({ tiers })}
        fields={(row, change, at) => (
          <>
            <TextField
              label="Sold over, dollars"
              inputMode="decimal"
              value={row.over}
              error={fault(`base.tiers.${at}.over`)}
              onChange={(event) => change({ over: event.target.value })}
            />
            <TextField
              label="Percent"
              inputMode="decimal"
              value={row.percent}
              error={fault(`base.tiers.${at}.percent`)}
              onChange={(event) => change({ percent: event.target.value })}
            />
          </>
        )}
      />
      <div>
        <SelectField
          label="A tier’s percentage is for"
          value={draft.tierMode}
          onChange={(event) => onChange({ tierMode: event.target.value })}
        >
          <option value="marginal">what is sold above it</option>
          <option value="whole">everything sold</option>
        </SelectField>
        <SelectField
          label="Counted by"
          value={draft.tierPeriod}
          onChange={(event) => onChange({ tierPeriod: event.target.value })}
        >
          <option value="week">the workweek</option>
          <option value="month">the month</option>
        </SelectField>
      </div>
    </>
  );
}

/** Travel, waiting and other time: by the hour, or covered by a recorded agreement. */
export function OtherTimeFields({ draft, fault, onChange }: PlanPartProps) {
  return (
    <fieldset className="mt-3">
      <legend>Travel, waiting and other time</legend>
      <TextField
        label="Dollars an hour beside the jobs"
        inputMode="decimal"
        value={draft.otherHourly}
        error={fault('base.other.hourly')}
        onChange={(event) => onChange({ otherHourly: event.target.value })}
      />
      <CheckField
        label="A signed agreement says that the pay for jobs covers this time"
        checked={draft.isAgreed}
        onChange={(event) => onChange({ isAgreed: event.target.checked })}
      />
      {draft.isAgreed ? (
        <>
          <div className="grid grid-cols-2 gap-3 mt-2 max-[520px]:grid-cols-1">
            <TextField
              label="Signed on"
              type="date"
              value={draft.signedOn}
              error={fault('base.other.agreement.signedOn')}
              onChange={(event) => onChange({ signedOn: event.target.value })}
            />
            <TextField
              label="What was agreed, and where it is kept"
              value={draft.agreement}
              error={fault('base.other.agreement.note')}
              onChange={(event) => onChange({ agreement: event.target.value })}
            />
          </div>
          <p className="caution mt-2">
            <b>Caution.</b> Federal law lets flat pay cover this time only where both sides agreed so beforehand (29 CFR
            778.318); some states never do, and there it is paid by the hour anyway. Ask a licensed adviser.
          </p>
        </>
      ) : null}
    </fieldset>
  );
}
