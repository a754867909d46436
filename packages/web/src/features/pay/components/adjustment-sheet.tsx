import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { adjustmentKinds } from '@driprail/shared/contracts/pay.contract';
import { FormError } from '../../../components/form-error.tsx';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { parseMoney } from '../../../lib/format.ts';
import { useAddAdjustment, weekQuery, weeksQuery } from '../api/pay.queries.ts';
import { adjustmentWords } from './adjustment-kinds.ts';
import type { AdjustmentKindName } from './adjustment-kinds.ts';
import { CorrectedLineField } from './corrected-line-field.tsx';
import { openWeeks, weekSpan } from './week-model.ts';

export interface AdjustmentStart {
  personId: string;
  name: string;
  /** The week to add it to; null leaves the choice to the first open one. */
  startsOn: string | null;
  kind: AdjustmentKindName;
  /** As typed: "12.00". */
  amount: string;
  /** The locked week that a correction mends. */
  mends: string | null;
  lineKey: string | null;
}

/** Adds an amount with its reason to an open week. */
export function AdjustmentSheet({
  start,
  onClose,
}: {
  start: AdjustmentStart;
  onClose: (addedTo: string | null) => void;
}) {
  const add = useAddAdjustment();
  const weeks = useQuery(weeksQuery);
  const open = openWeeks(weeks.data?.weeks ?? []);
  const [value, setValue] = useState({ ...start, reason: '', lineId: '' });
  const [amountError, setAmountError] = useState<string | undefined>();
  const startsOn = value.startsOn ?? open[0]?.startsOn ?? '';
  const isCorrection = value.kind === 'correction';
  const mended = useQuery({ ...weekQuery(value.mends ?? ''), enabled: isCorrection && value.mends !== null });
  const lineIds = mended.data?.lineIds ?? {};
  const lineId = value.lineId || (value.lineKey ? (lineIds[`${value.personId}:${value.lineKey}`] ?? '') : '');
  const fields = fieldsOf(add.error);
  const words = adjustmentWords[value.kind];

  const submit = () => {
    const cents = parseMoney(value.amount);
    setAmountError(cents === null ? 'Give an amount like 24.00.' : undefined);
    if (cents === null || add.isPending) return;
    const amountCents = value.kind === 'deduction' ? -Math.abs(cents) : cents;
    const { personId, kind, reason } = value;
    const correctsLineId = isCorrection && lineId !== '' ? lineId : null;
    add.mutate(
      { startsOn, body: { personId, kind, amountCents, reason, correctsLineId } },
      { onSuccess: () => onClose(startsOn) },
    );
  };

  return (
    <Sheet title={isCorrection ? 'Correct' : 'Adjust'} onClose={() => onClose(null)} width={620}>
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          submit();
        }}
      >
        <p className="t-2 mb-3">
          For <b className="t-name text-ink">{value.name}</b>
        </p>
        <div className="grid grid-cols-[1.6fr_1fr] gap-3 max-[520px]:grid-cols-1">
          <SelectField
            label="Kind"
            value={value.kind}
            error={fields['kind']}
            onChange={(event) => setValue({ ...value, kind: event.target.value as AdjustmentKindName })}
          >
            {adjustmentKinds.map((kind) => (
              <option key={kind} value={kind}>
                {adjustmentWords[kind].label}
              </option>
            ))}
          </SelectField>
          <TextField
            label="Amount, dollars"
            inputMode="decimal"
            value={value.amount}
            error={amountError ?? fields['amountCents']}
            hint={
              isCorrection
                ? 'With a minus sign it takes away.'
                : value.kind === 'deduction'
                  ? 'Is taken off.'
                  : undefined
            }
            onChange={(event) => {
              setValue({ ...value, amount: event.target.value });
              setAmountError(undefined);
            }}
          />
        </div>
        {isCorrection ? (
          <CorrectedLineField
            personId={value.personId}
            weeks={(weeks.data?.weeks ?? []).filter((week) => week.state === 'locked' && week.startsOn < startsOn)}
            mends={value.mends}
            locked={mended.data ?? null}
            lineId={lineId}
            error={fields['correctsLineId']}
            onWeek={(mends) => setValue({ ...value, mends, lineId: '', lineKey: null })}
            onLine={(next) => setValue({ ...value, lineId: next, lineKey: null })}
          />
        ) : null}
        <TextField
          className="mt-3"
          label="What it is for"
          value={value.reason}
          error={fields['reason']}
          onChange={(event) => setValue({ ...value, reason: event.target.value })}
        />
        <div className="flex flex-wrap gap-2 mt-2" role="group" aria-label="Picks">
          {words.picks.map((pick) => (
            <Button
              key={pick}
              className="!min-h-7 !px-2.5"
              aria-pressed={value.reason === pick}
              onClick={() => setValue({ ...value, reason: pick })}
            >
              {pick}
            </Button>
          ))}
        </div>
        {open.length > 1 || value.startsOn === null ? (
          <SelectField
            className="mt-3"
            label="Paid in"
            value={startsOn}
            onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
          >
            {open.map((week) => (
              <option key={week.startsOn} value={week.startsOn}>
                Week {week.number}, {weekSpan(week)}
                {week.state === 'checked' ? ' (goes back to draft)' : ''}
              </option>
            ))}
          </SelectField>
        ) : null}
        <p className="t-2 mt-3">{words.caution}</p>
        <FormError error={add.error} />
        <SheetFoot>
          <Button onClick={() => onClose(null)}>Leave it</Button>
          <Button type="submit" look="main" isBusy={add.isPending}>
            {isCorrection ? 'Add correction' : value.kind === 'deduction' ? 'Add deduction' : 'Add amount'}
          </Button>
        </SheetFoot>
      </form>
    </Sheet>
  );
}
