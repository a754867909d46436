import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { TextField } from '../../../components/field.tsx';
import type { PlanPartProps } from './plan-base-fields.tsx';
import { PremiumRows } from './premium-rows.tsx';
import { ServiceRows } from './service-rows.tsx';

/** What a plan may add: premiums, rates of their own, promised bonuses. */
export function PlanMoreFields({ draft, fault, onChange, services }: PlanPartProps & { services: ServiceDto[] }) {
  const { attendance } = draft;
  const plain = (key: 'trainingHourly' | 'helperHourly' | 'perAddOn' | 'percentOfTotal', label: string) => (
    <TextField
      label={label}
      inputMode="decimal"
      value={draft[key]}
      error={fault(`extras.${key}`)}
      onChange={(event) => onChange({ [key]: event.target.value })}
    />
  );
  return (
    <details className="mt-4">
      <summary>More: premiums, bonuses, rates of their own</summary>
      <div className="grid grid-cols-2 gap-3 mt-3 max-[520px]:grid-cols-1">
        {plain('trainingHourly', 'Training, dollars an hour')}
        {plain('helperHourly', 'Helping as a trainee, dollars an hour')}
        {plain('perAddOn', 'Bonus per add-on finished, dollars')}
        {plain('percentOfTotal', 'Bonus, percent of all earnings')}
        <TextField
          label="Attendance bonus, dollars a week"
          inputMode="decimal"
          value={attendance.amount}
          error={fault('extras.attendance.amount')}
          onChange={(event) => onChange({ attendance: { ...attendance, amount: event.target.value } })}
        />
        <TextField
          label="for days worked in the week"
          type="number"
          min={1}
          max={7}
          value={attendance.days}
          error={fault('extras.attendance.days')}
          onChange={(event) => onChange({ attendance: { ...attendance, days: event.target.value } })}
        />
      </div>
      <PremiumRows draft={draft} fault={fault} onChange={onChange} />
      <ServiceRows
        label="Services with an hourly rate of their own"
        amountLabel="Dollars an hour"
        hasSizes={false}
        services={services}
        rows={draft.hourlyByService}
        fault={(key) => fault(`extras.hourlyByService.${key}`)}
        onChange={(hourlyByService) => onChange({ hourlyByService })}
      />
      <p className="t-2 mt-3">
        A bonus that a plan promises counts in the regular rate; a percentage of all earnings carries its own overtime
        (29 CFR 778.210). A bonus nobody promised is added to the week by hand, and stays out of the rate only if both
        that it is paid and how much were decided near the end (29 CFR 778.211).
      </p>
    </details>
  );
}
