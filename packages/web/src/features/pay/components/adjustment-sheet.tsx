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
import { addWords, adjustmentWords, countedUnits, takesOff } from './adjustment-kinds.ts';
import type { AdjustmentKindName } from './adjustment-kinds.ts';
import { RefundReasonField } from './agreements/refund-reason-field.tsx';
import { CountedFields } from './counted-fields.tsx';
import { CorrectedLineField } from './corrected-line-field.tsx';
import { TimeOffSheet } from './time-off/time-off-sheet.tsx';
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
  const [value, setValue] = useState({
    ...start,
    reason: '',
    lineId: '',
    isCounted: false,
    quantity: '',
    on: '',
    refundReasonId: '',
  });
  const [amountError, setAmountError] = useState<string | undefined>();
  const [isByHand, setByHand] = useState(false);
  const startsOn = value.startsOn ?? open[0]?.startsOn ?? '';
  const isCorrection = value.kind === 'correction';
  const namesLine = isCorrection || value.kind === 'refund';
  const mended = useQuery({ ...weekQuery(value.mends ?? ''), enabled: namesLine && value.mends !== null });
  const lineIds = mended.data?.lineIds ?? {};
  const lineId = value.lineId || (value.lineKey ? (lineIds[`${value.personId}:${value.lineKey}`] ?? '') : '');
  const fields = fieldsOf(add.error);
  const words = adjustmentWords[value.kind];

  const unit = countedUnits[value.kind];
  const isCounted = unit !== undefined && value.isCounted;
  const on = value.on || startsOn;

  const submit = () => {
    const cents = isCounted ? null : parseMoney(value.amount);
    setAmountError(cents === null && !isCounted ? 'Give an amount like 24.00.' : undefined);
    if ((cents === null && !isCounted) || add.isPending) return;
    const amountCents = cents !== null && takesOff(value.kind) ? -Math.abs(cents) : cents;
    const { personId, kind, reason } = value;
    const body = {
      ...{ personId, kind, amountCents, reason },
      correctsLineId: namesLine && lineId !== '' ? lineId : null,
      counted: isCounted ? { unit: unit.unit, quantity: value.quantity.replace(/[,\s]/g, ''), on } : null,
      refundReasonId: kind === 'refund' ? value.refundReasonId || null : null,
    };
    add.mutate({ startsOn, body }, { onSuccess: () => onClose(startsOn) });
  };

  if (value.kind === 'paid_time_off' && !isByHand)
    return (
      <TimeOffSheet personId={value.personId} startsOn={value.startsOn} onClose={onClose}>
        <p className="t-2">
          For <b className="t-name text-ink">{value.name}</b>.{' '}
          <button type="button" className="link" onClick={() => setValue({ ...value, kind: start.kind })}>
            Another kind
          </button>{' '}
          <button type="button" className="link" onClick={() => setByHand(true)}>
            An amount instead of hours
          </button>
        </p>
      </TimeOffSheet>
    );

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
            value={isCounted ? '' : value.amount}
            disabled={isCounted}
            error={amountError ?? fields['amountCents']}
            hint={
              isCorrection
                ? 'With a minus sign it takes away.'
                : takesOff(value.kind)
                  ? 'Is taken off.'
                  : isCounted
                    ? 'Counted below.'
                    : undefined
            }
            onChange={(event) => {
              setValue({ ...value, amount: event.target.value });
              setAmountError(undefined);
            }}
          />
        </div>
        {unit ? (
          <CountedFields
            words={unit}
            value={value}
            on={on}
            errors={fields}
            onChange={(parts) => setValue({ ...value, ...parts })}
          />
        ) : null}
        {value.kind === 'refund' ? (
          <RefundReasonField
            day={startsOn}
            value={value.refundReasonId}
            error={fields['refundReasonId']}
            onChange={(refundReasonId) => setValue({ ...value, refundReasonId })}
          />
        ) : null}
        {namesLine ? (
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
            {addWords(value.kind)}
          </Button>
        </SheetFoot>
      </form>
    </Sheet>
  );
}
