import { useEffect, useRef, useState } from 'react';
import type { ReactNode } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { TimeOffQuote, TimeOffWarning } from '@driprail/shared/contracts/time-off.contract';
import type { TimeOffKind } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { FormError } from '../../../../components/form-error.tsx';
import { Button } from '../../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../../components/sheet.tsx';
import { fieldsOf } from '../../../../lib/fields.ts';
import { hoursMinutes, money } from '../../../../lib/format.ts';
import { useNow } from '../../../../lib/now.ts';
import { useSession } from '../../../../lib/session.tsx';
import { weeksQuery } from '../../api/pay.queries.ts';
import { payPeopleQuery } from '../../api/rates.queries.ts';
import { balancesQuery, quoteQuery, useTakeTimeOff } from '../../api/time-off.queries.ts';
import { rateText } from '../ledger.ts';
import { openWeeks, weekSpan } from '../week-model.ts';
import { KindField } from './kind-field.tsx';
import './time-off.css';

interface Props {
  /** Null leaves the choice of the person to the form. */
  personId: string | null;
  /** The week to pay it in; null for the first open one. */
  startsOn: string | null;
  /** Leads back to the other kinds of adjustment. */
  children?: ReactNode;
  onClose: (addedTo: string | null) => void;
}

interface Draft {
  personId: string;
  kind: TimeOffKind;
  /** As typed. */
  hours: string;
  on: string;
  startsOn: string;
  /** By the code of the warning that each accepts. */
  reasons: Partial<Record<TimeOffWarning['code'], string>>;
}

const HOURS = /^\d{1,2}(\.\d{1,4})?$/;

/** Pays hours off: the balance and what the hours come to stand there before anything is saved. */
export function TimeOffSheet({ personId, startsOn: asked, children, onClose }: Props) {
  const take = useTakeTimeOff();
  const { zone } = useSession().company;
  const today = dayOf(useNow(), zone);
  const people = (useQuery(payPeopleQuery).data?.people ?? []).filter((person) => person.isActive);
  const open = openWeeks(useQuery(weeksQuery).data?.weeks ?? []);
  const [value, setValue] = useState<Draft>({
    ...{ personId: personId ?? '', kind: 'sick', hours: '8', on: '', startsOn: asked ?? '', reasons: {} },
  });
  const week = open.find((one) => one.startsOn === value.startsOn) ?? open[0];
  const startsOn = week?.startsOn ?? '';
  const isToday = week !== undefined && today >= week.startsOn && today <= week.endsOn;
  const on = value.on || (isToday ? today : startsOn);
  const { kind, hours } = value;
  const taking = { personId: value.personId, kind, hours, on };
  const isReady = value.personId !== '' && HOURS.test(hours) && startsOn !== '';
  const quote = useQuery({ ...quoteQuery(startsOn, taking), enabled: isReady });
  const balances = useQuery(balancesQuery(value.personId)).data?.balances ?? [];
  const fields = { ...fieldsOf(quote.error), ...fieldsOf(take.error) };
  const found = isReady && quote.error === null ? quote.data : undefined;
  // While the next answer is worked out the last one stays on the screen, dimmed, and can’t be paid.
  const isNew = found !== undefined && !quote.isPlaceholderData;
  const warnings = found?.warnings ?? [];
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (take.error) form.current?.querySelector('[aria-invalid]')?.scrollIntoView({ block: 'center' });
  }, [take.error]);
  const change = (next: Partial<Draft>) => {
    if (take.error) take.reset();
    setValue({ ...value, ...next });
  };

  return (
    <Sheet title="Time off" onClose={() => onClose(null)} width={620}>
      <form
        ref={form}
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          const accept = warnings.map(({ code }) => ({ code, reason: value.reasons[code] ?? '' }));
          const given = accept.filter(({ reason }) => reason.trim() !== '');
          if (!take.isPending)
            take.mutate({ startsOn, body: { ...taking, accept: given } }, { onSuccess: () => onClose(startsOn) });
        }}
      >
        {children}
        <div className="grid grid-cols-2 gap-3 mt-3 max-[520px]:grid-cols-1">
          {personId === null ? (
            <SelectField
              label="Person"
              value={value.personId}
              error={fields['personId']}
              onChange={(event) => change({ personId: event.target.value })}
            >
              <option value="">Choose</option>
              <NamedOptions of={people} />
            </SelectField>
          ) : null}
          <KindField
            label="Time off"
            value={kind}
            error={fields['kind']}
            more={(one) => {
              const balance = balances.find((own) => own.kind === one)?.balance;
              return balance === undefined ? '' : `, ${hoursMinutes(balance)} h there`;
            }}
            onChange={(next) => change({ kind: next })}
          />
          <TextField
            label="Day"
            type="date"
            value={on}
            error={fields['on']}
            onChange={(event) => change({ on: event.target.value })}
          />
          <TextField
            label="Hours"
            inputMode="decimal"
            value={hours}
            hint="7.5 is seven and a half hours."
            error={hours !== '' && !HOURS.test(hours) ? 'Give hours like 8 or 7.5.' : fields['hours']}
            onChange={(event) => change({ hours: event.target.value })}
          />
          {open.length > 1 ? (
            <SelectField
              label="Paid in"
              value={startsOn}
              onChange={(event) => change({ startsOn: event.target.value, on: '' })}
            >
              {open.map((one) => (
                <option key={one.startsOn} value={one.startsOn}>
                  Week {one.number}, {weekSpan(one)}
                  {one.state === 'checked' ? ' (goes back to draft)' : ''}
                </option>
              ))}
            </SelectField>
          ) : null}
        </div>
        {found ? <QuoteWords quote={found} isOld={quote.isPlaceholderData} /> : null}
        {warnings.map(({ code, message }) => (
          <TextField
            key={code}
            className="mt-3"
            label={message}
            hint="Goes on with a reason, which stays in the trail."
            placeholder="Reason"
            value={value.reasons[code] ?? ''}
            error={fields[code]}
            onChange={(event) => change({ reasons: { ...value.reasons, [code]: event.target.value } })}
          />
        ))}
        <p className="t-2 mt-3">
          Not hours worked: outside the regular rate, overtime and the minimum wage (29 CFR 778.218, 778.219). What must
          be given and when is the law of the state or town: ask a licensed adviser.
        </p>
        <FormError error={take.error} />
        <SheetFoot>
          <Button onClick={() => onClose(null)}>Leave it</Button>
          <Button type="submit" look="main" isBusy={take.isPending} disabled={!isNew}>
            {found && isNew ? `Pay ${hoursMinutes(hours)} h, ${money(found.amountCents)}` : 'Pay the hours'}
          </Button>
        </SheetFoot>
      </form>
    </Sheet>
  );
}

function QuoteWords({ quote, isOld }: { quote: TimeOffQuote; isOld: boolean }) {
  return (
    <dl className={isOld ? 'to-quote is-old' : 'to-quote'} aria-label="What this comes to" aria-busy={isOld}>
      <div>
        <dt>There now</dt>
        <dd>{hoursMinutes(quote.balance)} h</dd>
      </div>
      <div>
        <dt>{`${hoursMinutes(quote.hours)} h at ${rateText(quote.rate)}`}</dt>
        <dd>{money(quote.amountCents)}</dd>
      </div>
      <div>
        <dt>Left after</dt>
        <dd>{hoursMinutes(quote.balanceAfter)} h</dd>
      </div>
      <p>
        {quote.rateWords}. {quote.ruleWords}.
        {quote.dayAway === null ? '' : ` Away that day: ${quote.dayAway || 'written down without a note'}.`}
      </p>
    </dl>
  );
}
