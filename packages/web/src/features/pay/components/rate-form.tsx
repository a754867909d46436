import { useState } from 'react';
import { clockKindNames, clockKinds } from '@driprail/shared/domain/time/clock-kinds';
import type { ClockKindName } from '@driprail/shared/domain/time/clock-kinds';
import type { RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { FormError } from '../../../components/form-error.tsx';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useAddRate } from '../api/rates.queries.ts';

interface Props {
  people: PersonDto[];
  services: ServiceDto[];
  personId: string | null;
  startsOn: string;
  onDone: (rate: RateDto) => void;
}

const kinds: Record<RateDto['kind'], { label: string; value: string; hint: string }> = {
  hourly: {
    label: 'By the hour',
    value: 'Dollars an hour',
    hint: 'Every worked hour, travel and shop time too, unless a kind of work or a service has its own. A service’s rate pays for the time on visits that finished it.',
  },
  commission_percent: {
    label: 'Commission, percent of the line',
    value: 'Percent',
    hint: 'Of what the finished line sold for, after discounts, before tax and tips. 0 ends a commission.',
  },
  flat_service: {
    label: 'Flat per finished line',
    value: 'Dollars a line',
    hint: 'For each finished line of the service, shared in the crew. 0 ends it.',
  },
  product_cost: {
    label: 'Product cost, off the commission’s base',
    value: 'Dollars a line',
    hint: 'Comes off what a finished line of the service sold for, before the percentage. 0 ends it.',
  },
  per_review: {
    label: 'Bonus per review',
    value: 'Dollars a review',
    hint: 'Promised, so it counts in the regular rate (29 CFR 778.211). Reviews are counted when the bonus is added to a week.',
  },
  mileage: {
    label: 'A mile in one’s own car',
    value: 'Dollars a mile',
    hint: 'Paid back, not wages (29 CFR 778.217). Miles are counted when they are added to a week.',
  },
};

/** A new rate from a day on. The earlier ones stay for the days before. */
export function RateForm({ people, services, personId, startsOn, onDone }: Props) {
  const add = useAddRate();
  const [value, setValue] = useState({
    kind: 'hourly' as RateDto['kind'],
    personId: personId ?? '',
    serviceId: '',
    clockKind: '' as ClockKindName | '',
    value: '',
    startsOn,
  });
  const fields = fieldsOf(add.error);
  const isHourly = value.kind === 'hourly';
  const forCompany = value.kind === 'product_cost' || value.kind === 'mileage';
  const goesByService = value.kind !== 'mileage' && value.kind !== 'per_review';
  const needsService = value.kind === 'flat_service' || value.kind === 'product_cost';
  const words = kinds[value.kind];
  const submit = () => {
    if (add.isPending) return;
    add.mutate(
      {
        kind: value.kind,
        personId: forCompany ? null : value.personId || null,
        serviceId: goesByService ? value.serviceId || null : null,
        clockKind: isHourly ? value.clockKind || null : null,
        value: value.value.replace(/[$%,\s]/g, ''),
        startsOn: value.startsOn,
      },
      { onSuccess: ({ rate }) => onDone(rate) },
    );
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <div className="grid grid-cols-2 gap-3 max-[520px]:grid-cols-1">
        <SelectField
          label="For"
          value={forCompany ? '' : value.personId}
          disabled={forCompany}
          error={fields['personId']}
          onChange={(event) => setValue({ ...value, personId: event.target.value })}
        >
          <option value="">Everybody, company-wide</option>
          <NamedOptions of={people} />
        </SelectField>
        <SelectField
          label="Kind"
          value={value.kind}
          error={fields['kind']}
          onChange={(event) => setValue({ ...value, kind: event.target.value as RateDto['kind'] })}
        >
          {Object.entries(kinds).map(([kind, { label }]) => (
            <option key={kind} value={kind}>
              {label}
            </option>
          ))}
        </SelectField>
        {isHourly ? (
          <SelectField
            label="Kind of work"
            value={value.clockKind}
            error={fields['clockKind']}
            onChange={(event) => setValue({ ...value, clockKind: event.target.value as ClockKindName | '' })}
          >
            <option value="">All worked time</option>
            {clockKinds.map((kind) => (
              <option key={kind} value={kind}>
                Only {clockKindNames[kind].toLowerCase()}
              </option>
            ))}
          </SelectField>
        ) : null}
        {goesByService ? (
          <SelectField
            label="Service"
            value={value.serviceId}
            error={fields['serviceId']}
            onChange={(event) => setValue({ ...value, serviceId: event.target.value })}
          >
            <option value="">{needsService ? 'Choose the service' : isHourly ? 'Any time' : 'Every service'}</option>
            <NamedOptions of={services} />
          </SelectField>
        ) : null}
        <div className="grid grid-cols-2 gap-3">
          <TextField
            label={words.value}
            inputMode="decimal"
            value={value.value}
            error={fields['value']}
            onChange={(event) => setValue({ ...value, value: event.target.value })}
          />
          <TextField
            label="From"
            type="date"
            value={value.startsOn}
            error={fields['startsOn']}
            onChange={(event) => setValue({ ...value, startsOn: event.target.value })}
          />
        </div>
      </div>
      <p className="t-2 mt-3">{words.hint}</p>
      <p className="t-2 mt-1">
        A person’s own rate goes before the company’s, one for a service before one for all. Rates that change how
        somebody is paid often need notice in advance by state law: ask a licensed adviser.
      </p>
      <FormError error={add.error} />
      <SheetFoot>
        <Button type="submit" look="main" isBusy={add.isPending}>
          Add rate
        </Button>
      </SheetFoot>
    </form>
  );
}
