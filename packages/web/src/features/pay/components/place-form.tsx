import { useState } from 'react';
import type { OvertimeRuleSet } from '@driprail/shared/domain/pay/overtime-rule-sets';
import { FormError } from '../../../components/form-error.tsx';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useAddPlace } from '../api/plans.queries.ts';

interface Props {
  ruleSets: OvertimeRuleSet[];
  startsOn: string;
  onDone: () => void;
}

/** A place with a known rule set, or with rules of its own. */
export function PlaceForm({ ruleSets, startsOn, onDone }: Props) {
  const add = useAddPlace();
  const [value, setValue] = useState({ name: '', ruleSetKey: 'us_federal', wage: '', wageFrom: startsOn });
  const [own, setOwn] = useState({
    ...{ weeklyOver: '40', dailyOver: '', doubleAfter: '', source: '' },
    ...{ hasSeventhDay: false, paysPieceRest: false, mayCoverOtherTime: true },
  });
  const fields = fieldsOf(add.error);
  const isOwn = value.ruleSetKey === '';
  const chosen = ruleSets.find((set) => set.key === value.ruleSetKey);
  const submit = () => {
    if (add.isPending) return;
    const { hasSeventhDay, dailyOver, doubleAfter, ...rest } = own;
    const seventhDay = hasSeventhDay ? { doubleOver: null, onlyOverWeekly: false } : null;
    const ownRules = { ...rest, dailyOver: dailyOver || null, doubleAfter: doubleAfter || null, seventhDay };
    add.mutate(
      {
        name: value.name,
        ruleSetKey: isOwn ? null : value.ruleSetKey,
        ownRules: isOwn ? ownRules : null,
        minimumWages:
          value.wage === ''
            ? []
            : [{ startsOn: value.wageFrom, amount: value.wage.replace(/[$,\s]/g, ''), source: own.source }],
      },
      { onSuccess: onDone },
    );
  };
  const hours = (key: 'weeklyOver' | 'dailyOver' | 'doubleAfter', label: string) => (
    <TextField
      label={label}
      inputMode="decimal"
      value={own[key]}
      error={fields[`ownRules.${key}`]}
      onChange={(event) => setOwn({ ...own, [key]: event.target.value })}
    />
  );
  return (
    <form
      noValidate
      className="dated-form"
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <h3>New place</h3>
      <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
        <TextField
          label="Name"
          value={value.name}
          error={fields['name']}
          onChange={(event) => setValue({ ...value, name: event.target.value })}
        />
        <SelectField
          label="Overtime rules"
          value={value.ruleSetKey}
          error={fields['ruleSetKey']}
          hint={chosen ? `${chosen.source}, ${chosen.certainty === 'read' ? 'read' : 'from memory: check first'}` : ''}
          onChange={(event) => setValue({ ...value, ruleSetKey: event.target.value })}
        >
          {ruleSets.map((set) => (
            <option key={set.key} value={set.key}>
              {set.name}
            </option>
          ))}
          <option value="">Rules of its own</option>
        </SelectField>
        <TextField
          label="Minimum wage, dollars an hour"
          inputMode="decimal"
          value={value.wage}
          error={fields['minimumWages.0.amount']}
          onChange={(event) => setValue({ ...value, wage: event.target.value })}
        />
        <TextField
          label="Minimum wage from"
          type="date"
          value={value.wageFrom}
          error={fields['minimumWages.0.startsOn']}
          onChange={(event) => setValue({ ...value, wageFrom: event.target.value })}
        />
        <TextField
          label="Where rules and wage are written"
          value={own.source}
          error={fields['ownRules.source']}
          onChange={(event) => setOwn({ ...own, source: event.target.value })}
        />
        {isOwn ? (
          <>
            {hours('weeklyOver', 'Time and a half over hours a week')}
            {hours('dailyOver', 'Time and a half over hours a day')}
            {hours('doubleAfter', 'Double time over hours a day')}
          </>
        ) : null}
      </div>
      {isOwn ? (
        <>
          <CheckField
            label="Time and a half on the seventh day worked in a row"
            checked={own.hasSeventhDay}
            onChange={(event) => setOwn({ ...own, hasSeventhDay: event.target.checked })}
          />
          <CheckField
            label="Rest breaks of flat and commission work are paid apart"
            checked={own.paysPieceRest}
            onChange={(event) => setOwn({ ...own, paysPieceRest: event.target.checked })}
          />
          <CheckField
            label="An agreement may let flat pay cover travel and waiting"
            checked={own.mayCoverOtherTime}
            onChange={(event) => setOwn({ ...own, mayCoverOtherTime: event.target.checked })}
          />
        </>
      ) : null}
      <FormError error={add.error} />
      <Button type="submit" look="main" isBusy={add.isPending}>
        Add place
      </Button>
    </form>
  );
}
