import { useState } from 'react';
import type { PayRulesDto } from '@driprail/shared/contracts/pay-rates.contract';
import { FormError } from '../../../components/form-error.tsx';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useAddRules } from '../api/rates.queries.ts';
import { splitWords, weekdayWords } from './rate-bands.ts';

function stepOf(text: string): PayRulesDto['punchRoundingMinutes'] {
  return ([5, 6, 15] as const).find((minutes) => String(minutes) === text) ?? null;
}

/** New company rules from a day on, beginning from those in force. */
export function RulesForm({
  current,
  startsOn,
  onDone,
}: {
  current: PayRulesDto | null;
  startsOn: string;
  onDone: () => void;
}) {
  const add = useAddRules();
  const [value, setValue] = useState({
    startsOn,
    overtimeRuleSet: 'us_federal' as const,
    minimumWage: current?.minimumWage ?? '7.25',
    crewSplit: current?.crewSplit ?? 'equal',
    mealBreakMinutes: String(current?.mealBreakMinutes ?? 30),
    punchRoundingMinutes: String(current?.punchRoundingMinutes ?? ''),
    premiumRounding: current?.premiumRounding ?? ('half_up' as const),
    commissionEarned: current?.commissionEarned ?? ('done' as const),
    tipsGoTo: current?.tipsGoTo ?? ('crew' as const),
    tipCardFeePercent: current?.tipCardFeePercent ?? '0',
    workweekStartsOn: current?.workweekStartsOn ?? 1,
    workweekStartsAt: current?.workweekStartsAt ?? '00:00',
  });
  const fields = fieldsOf(add.error);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const body = {
          ...value,
          minimumWage: value.minimumWage.replace(/[$,\s]/g, ''),
          mealBreakMinutes: Number(value.mealBreakMinutes),
          tipCardFeePercent: value.tipCardFeePercent.replace(/[%\s]/g, '') || '0',
          punchRoundingMinutes: stepOf(value.punchRoundingMinutes),
        };
        if (!add.isPending) add.mutate(body, { onSuccess: onDone });
      }}
    >
      <TextField
        label="From"
        type="date"
        value={value.startsOn}
        error={fields['startsOn']}
        onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
      />
      <div className="grid grid-cols-2 gap-3 mt-3 max-[520px]:grid-cols-1">
        <SelectField
          label="Overtime"
          value={value.overtimeRuleSet}
          error={fields['overtimeRuleSet']}
          onChange={() => undefined}
        >
          <option value="us_federal">Federal: half the regular rate over 40 h</option>
        </SelectField>
        <TextField
          label="Minimum wage, dollars an hour"
          inputMode="decimal"
          value={value.minimumWage}
          error={fields['minimumWage']}
          onChange={(event) => setValue({ ...value, minimumWage: event.target.value })}
        />
        <SelectField
          label="In a crew a job is shared"
          value={value.crewSplit}
          error={fields['crewSplit']}
          onChange={(event) => setValue({ ...value, crewSplit: event.target.value as PayRulesDto['crewSplit'] })}
        >
          {Object.entries(splitWords).map(([split, label]) => (
            <option key={split} value={split}>
              {label}
            </option>
          ))}
        </SelectField>
        <TextField
          label="A meal break is unpaid from, minutes"
          type="number"
          min={20}
          max={120}
          value={value.mealBreakMinutes}
          error={fields['mealBreakMinutes']}
          onChange={(event) => setValue({ ...value, mealBreakMinutes: event.target.value })}
        />
        <SelectField
          label="Punches count"
          value={value.punchRoundingMinutes}
          error={fields['punchRoundingMinutes']}
          onChange={(event) => setValue({ ...value, punchRoundingMinutes: event.target.value })}
        >
          <option value="">exactly, to the second</option>
          {[5, 6, 15].map((minutes) => (
            <option key={minutes} value={minutes}>
              to the nearest {minutes} minutes
            </option>
          ))}
        </SelectField>
        <SelectField
          label="Overtime premiums round"
          value={value.premiumRounding}
          error={fields['premiumRounding']}
          onChange={(event) =>
            setValue({ ...value, premiumRounding: event.target.value as PayRulesDto['premiumRounding'] })
          }
        >
          <option value="half_up">half up to the cent</option>
          <option value="up">always up to the cent</option>
        </SelectField>
        <SelectField
          label="Commission is earned"
          value={value.commissionEarned}
          error={fields['commissionEarned']}
          onChange={(event) =>
            setValue({ ...value, commissionEarned: event.target.value as PayRulesDto['commissionEarned'] })
          }
        >
          <option value="done">when the work is done</option>
          <option value="paid">when the customer has paid</option>
        </SelectField>
        <SelectField
          label="A tip meant for one of the crew"
          value={value.tipsGoTo}
          error={fields['tipsGoTo']}
          onChange={(event) => setValue({ ...value, tipsGoTo: event.target.value as PayRulesDto['tipsGoTo'] })}
        >
          <option value="crew">is shared by the crew</option>
          <option value="person">goes to that person</option>
        </SelectField>
        <TextField
          label="Card fee taken off card tips, percent"
          inputMode="decimal"
          value={value.tipCardFeePercent}
          error={fields['tipCardFeePercent']}
          onChange={(event) => setValue({ ...value, tipCardFeePercent: event.target.value })}
        />
        <SelectField
          label="Workweek starts on"
          value={value.workweekStartsOn}
          error={fields['workweekStartsOn']}
          onChange={(event) => setValue({ ...value, workweekStartsOn: Number(event.target.value) })}
        >
          {weekdayWords.map((weekday, index) => (
            <option key={weekday} value={index + 1}>
              {weekday}
            </option>
          ))}
        </SelectField>
        <TextField
          label="at"
          type="time"
          value={value.workweekStartsAt}
          error={fields['workweekStartsAt']}
          onChange={(event) => setValue({ ...value, workweekStartsAt: event.target.value })}
        />
      </div>
      {value.punchRoundingMinutes ? (
        <p className="caution mt-4">
          <b>Caution.</b> Rounded punches are tolerated only while they even out over time, for the person as much as
          for the company (29 CFR 785.48(b)); some states do not allow them. The punches themselves are kept as they
          were.
        </p>
      ) : null}
      {value.commissionEarned === 'paid' ? (
        <p className="caution mt-4">
          <b>Caution.</b> Commission then waits until you mark the job as paid, and is settled with the overtime it
          brings to the week of the work (29 CFR 778.119). Every week still meets the minimum wage on its own payday.
          The written plan has to say so, and some states set when commission is earned.
        </p>
      ) : null}
      {Number(value.tipCardFeePercent) > 0 ? (
        <p className="caution mt-4">
          <b>Caution.</b> At most what the card really costs may come off, never below the minimum wage (DOL Fact Sheet
          #15); some states, California among them, forbid it, and a place with such rules pays the whole tip.
        </p>
      ) : null}
      <p className="caution mt-4">
        <b>Caution.</b> Driprail works out pay by the rules set here. It is not legal advice: states and towns add daily
        overtime, higher minimum wages, meal and rest rules. A workweek may be moved only for good, not to avoid
        overtime (29 CFR 778.105). Ask a licensed payroll adviser first.
      </p>
      <FormError error={add.error} />
      <SheetFoot>
        <Button type="submit" look="main" isBusy={add.isPending}>
          Add rules
        </Button>
      </SheetFoot>
    </form>
  );
}
