import { useState } from 'react';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import type { TimeOffKind, TimeOffRule } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { FormError } from '../../../../components/form-error.tsx';
import { Button } from '../../../../components/button.tsx';
import { NamedOptions, SelectField, TextArea, TextField } from '../../../../components/field.tsx';
import { SheetFoot } from '../../../../components/sheet.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { useAddTimeOffRule } from '../../api/time-off.queries.ts';
import { KindField } from './kind-field.tsx';
import { StartField } from './start-field.tsx';

type By = TimeOffRule['earning']['by'];
const byWords: Record<By, string> = {
  hours_worked: '1 hour for every so many worked',
  year: 'So many hours a year',
  holidays: 'So many hours for each holiday',
  none: 'Nothing more from then on',
};

interface Props {
  people: PersonDto[];
  personId: string | null;
  startsOn: string;
  onDone: () => void;
}

/** A rule of paid time off from a workweek on; earlier ones stay in the history. */
export function TimeOffRuleForm({ people, personId, startsOn, onDone }: Props) {
  const add = useAddTimeOffRule();
  const [value, setValue] = useState({
    ...{ kind: 'sick' as TimeOffKind, personId: personId ?? '', startsOn, by: 'hours_worked' as By },
    ...{ perHours: '30', hours: '8', holidays: '', capHours: '40', yearStartsOn: '01-01', carryHours: '', dollars: '' },
  });
  const fields = fieldsOf(add.error);
  const set = (next: Partial<typeof value>) => setValue({ ...value, ...next });
  const text = (key: 'perHours' | 'hours' | 'capHours' | 'carryHours' | 'dollars' | 'yearStartsOn', path: string) => ({
    value: value[key],
    error: fields[`rule.${path}`],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) => set({ [key]: event.target.value }),
  });
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const { kind, personId: of, startsOn: from } = value;
        if (!add.isPending)
          add.mutate({ kind, personId: of || null, startsOn: from, rule: ruleOf(value) }, { onSuccess: onDone });
      }}
    >
      <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
        <KindField label="Kind" value={value.kind} error={fields['kind']} onChange={(kind) => set({ kind })} />
        <SelectField
          label="For"
          value={value.personId}
          error={fields['personId']}
          onChange={(event) => set({ personId: event.target.value })}
        >
          <option value="">the company</option>
          <NamedOptions of={people} />
        </SelectField>
        <StartField value={value.startsOn} error={fields['startsOn']} onChange={(from) => set({ startsOn: from })} />
        <SelectField label="Earned by" value={value.by} onChange={(event) => set({ by: event.target.value as By })}>
          {(Object.keys(byWords) as By[]).map((by) => (
            <option key={by} value={by}>
              {byWords[by]}
            </option>
          ))}
        </SelectField>
        {value.by === 'hours_worked' ? (
          <TextField label="Hours worked for 1 hour" inputMode="decimal" {...text('perHours', 'earning.perHours')} />
        ) : null}
        {value.by === 'year' || value.by === 'holidays' ? (
          <TextField
            label={value.by === 'year' ? 'Hours a year' : 'Hours for each holiday'}
            inputMode="decimal"
            {...text('hours', 'earning.hours')}
          />
        ) : null}
        <TextField
          label="Most that may be kept, hours"
          hint="Earning stops there; nothing that is there is taken away. Empty for no limit."
          inputMode="decimal"
          {...text('capHours', 'capHours')}
        />
        <TextField
          label="Goes on into a new year, hours"
          hint="Empty for all. Some states forbid that earned hours are lost."
          inputMode="decimal"
          {...text('carryHours', 'carryHours')}
        />
        <TextField label="Year begins on" hint="Month and day." {...text('yearStartsOn', 'yearStartsOn')} />
        <TextField
          label="Fixed dollars an hour"
          hint="Empty to pay each person’s hourly rate."
          inputMode="decimal"
          {...text('dollars', 'pays.dollars')}
        />
      </div>
      {value.by === 'holidays' ? (
        <TextArea
          className="mt-3"
          label="Holidays, one a line"
          rows={5}
          value={value.holidays}
          hint="Date and name, like 2026-11-26 Thanksgiving Day."
          error={holidayError(fields)}
          onChange={(event) => set({ holidays: event.target.value })}
        />
      ) : null}
      <FormError error={add.error} />
      <SheetFoot>
        <Button onClick={onDone}>Leave it</Button>
        <Button type="submit" look="main" isBusy={add.isPending}>
          Add rule
        </Button>
      </SheetFoot>
    </form>
  );
}

interface Draft {
  by: By;
  perHours: string;
  hours: string;
  holidays: string;
  capHours: string;
  yearStartsOn: string;
  carryHours: string;
  dollars: string;
}

function ruleOf({ by, perHours, hours, holidays, capHours, yearStartsOn, carryHours, dollars }: Draft): TimeOffRule {
  return {
    earning:
      by === 'hours_worked'
        ? { by, perHours }
        : by === 'year'
          ? { by, hours }
          : by === 'holidays'
            ? { by, hours, dates: datesOf(holidays) }
            : { by },
    ...{ capHours: capHours || null, yearStartsOn, carryHours: carryHours || null },
    pays: dollars === '' ? { by: 'hourly' } : { by: 'fixed', dollars: dollars.replace(/[$,\s]/g, '') },
  };
}

function datesOf(text: string): { on: string; name: string }[] {
  const lines = text.split('\n').map((line) => line.trim());
  return lines
    .filter((line) => line !== '')
    .map((line) => ({ on: line.slice(0, 10), name: line.slice(10).replace(/^[\s,]+/, '') }));
}

/** "Line 2: ..." for the first line that makes no sense. */
function holidayError(fields: Record<string, string>): string | undefined {
  const [path, message] = Object.entries(fields).find(([key]) => key.startsWith('rule.earning.dates')) ?? [];
  const index = path?.split('.')[3];
  return index === undefined ? message : `Line ${Number(index) + 1}: ${message ?? ''}`;
}
