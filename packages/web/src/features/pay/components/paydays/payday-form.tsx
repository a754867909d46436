import { useState } from 'react';
import type { HandoverWeek, PaydayDto } from '@driprail/shared/contracts/handover.contract';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Button } from '../../../../components/button.tsx';
import { TextField } from '../../../../components/field.tsx';
import { FormError } from '../../../../components/form-error.tsx';
import { SheetFoot } from '../../../../components/sheet.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { money, useFormats } from '../../../../lib/format.ts';
import { useNow } from '../../../../lib/now.ts';
import { useSavePayday } from '../../api/paydays.queries.ts';
import { weekSpan } from '../week-model.ts';
import { paydayFor, tickedAtFirst } from './payday-model.ts';

interface Props {
  /** The payday to change; null for a new one. */
  payday: PaydayDto | null;
  /** Weeks that may be on it, oldest first. */
  weeks: readonly HandoverWeek[];
  onDone: (paydayId: string) => void;
}

/** Ticked weeks and the date on which they are handed over together. */
export function PaydayForm({ payday, weeks, onDone }: Props) {
  const save = useSavePayday(payday);
  const [ticked, setTicked] = useState(payday ? payday.weeks.map((week) => week.startsOn) : tickedAtFirst(weeks));
  const [date, setDate] = useState<string | null>(payday?.paysOn ?? null);
  const [note, setNote] = useState(payday?.note ?? '');
  const today = dayOf(useNow(), useFormats().zone);
  const paysOn = date ?? paydayFor(weeks, ticked, today);
  const fields = fieldsOf(save.error);
  const tick = (startsOn: string, isTicked: boolean) =>
    setTicked(isTicked ? [...ticked, startsOn].sort() : ticked.filter((day) => day !== startsOn));
  const count = ticked.length === 1 ? '1 week' : `${ticked.length} weeks`;
  const send = (
    <Button type="submit" look="main" isBusy={save.isPending}>
      {payday ? 'Save payday' : `Make a payday of ${count}`}
    </Button>
  );
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (save.isPending) return;
        save.mutate({ paysOn, note, weeks: ticked }, { onSuccess: (answer) => onDone(answer.payday.id) });
      }}
    >
      <fieldset className="pd-weeks">
        <legend className="sr">Locked weeks</legend>
        {weeks.map((week) => (
          <label key={week.startsOn} className="check">
            <input
              type="checkbox"
              checked={ticked.includes(week.startsOn)}
              onChange={(event) => tick(week.startsOn, event.target.checked)}
            />
            <span>
              <b>Week {week.number}</b>
              <small>
                {weekSpan(week)}, {week.people === 1 ? '1 person' : `${week.people} people`}
              </small>
            </span>
            <span className="am">{money(week.grossCents)}</span>
          </label>
        ))}
        {fields['weeks'] ? (
          <p className="tape err" role="alert">
            {fields['weeks']}
          </p>
        ) : null}
      </fieldset>
      <div className="pd-fields">
        <TextField
          label="Payday"
          type="date"
          value={paysOn}
          error={fields['paysOn']}
          onChange={(event) => setDate(event.target.value)}
        />
        <TextField
          label="Note"
          value={note}
          maxLength={300}
          error={fields['note']}
          onChange={(event) => setNote(event.target.value)}
        />
      </div>
      <FormError error={save.error} />
      {payday ? <SheetFoot>{send}</SheetFoot> : <div className="pd-send">{send}</div>}
    </form>
  );
}
