import type { SettingsDto } from '@driprail/shared/contracts/settings.contract';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { SelectField } from '../../../components/field.tsx';

type Breaks = Pick<SettingsDto, 'mealReminderMinutes' | 'restReminderMinutes'>;

const picks = {
  mealReminderMinutes: { label: 'A meal break', minutes: [180, 210, 240, 270, 285, 300, 330, 360] },
  restReminderMinutes: { label: 'A rest break', minutes: [90, 120, 150, 180, 210, 240] },
};
const names = ['mealReminderMinutes', 'restReminderMinutes'] as const;

/** After how much work without a break the phone reminds. */
export function BreakFields({
  value,
  fields,
  onChange,
}: {
  value: Breaks;
  fields: Record<string, string>;
  onChange: (value: Breaks) => void;
}) {
  return (
    <fieldset>
      <legend className="sec w-full">
        The phone reminds of <span>after work without one</span>
      </legend>
      <div className="grid grid-cols-2 gap-3 mt-2">
        {names.map((name) => (
          <SelectField
            key={name}
            label={picks[name].label}
            value={value[name] ?? ''}
            error={fields[name]}
            onChange={(event) =>
              onChange({
                mealReminderMinutes: value.mealReminderMinutes,
                restReminderMinutes: value.restReminderMinutes,
                [name]: event.target.value === '' ? null : Number(event.target.value),
              })
            }
          >
            <option value="">Not at all</option>
            {withSet(picks[name].minutes, value[name]).map((minutes) => (
              <option key={minutes} value={minutes}>
                After {formatMinutes(minutes)}
              </option>
            ))}
          </SelectField>
        ))}
      </div>
      <p className="caution mt-2">
        <b>Caution.</b> Which breaks are due, when, and what a missed one costs differs by place. Set this by the rule
        where you work; the reminder is an aid, it records and decides nothing.
      </p>
    </fieldset>
  );
}

/** A length set by other means stays in the list. */
export function withSet(minutes: readonly number[], set: number | null): number[] {
  return set === null || minutes.includes(set) ? [...minutes] : [...minutes, set].sort((a, b) => a - b);
}
