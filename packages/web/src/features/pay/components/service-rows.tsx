import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import type { ServiceRow } from './plan-draft.ts';

interface Props {
  label: string;
  amountLabel: string;
  hasSizes: boolean;
  services: ServiceDto[];
  rows: ServiceRow[];
  /** By the row's place and field: "0.amount". */
  fault: (key: string) => string | undefined;
  onChange: (rows: ServiceRow[]) => void;
}

/** Amounts by service, and by size class where that matters. */
export function ServiceRows({ label, amountLabel, hasSizes, services, rows, fault, onChange }: Props) {
  const change = (at: number, part: Partial<ServiceRow>) =>
    onChange(rows.map((row, index) => (index === at ? { ...row, ...part } : row)));
  return (
    <fieldset className="mt-3">
      <legend>{label}</legend>
      {rows.map((row, at) => (
        <div key={at} className={hasSizes ? 'svc-row has-sizes' : 'svc-row'}>
          <SelectField
            label="Service"
            value={row.serviceId}
            error={fault(`${at}.serviceId`)}
            onChange={(event) => change(at, { serviceId: event.target.value })}
          >
            <option value="">Choose</option>
            {services.map((service) => (
              <option key={service.id} value={service.id}>
                {service.name}
              </option>
            ))}
          </SelectField>
          {hasSizes ? (
            <SelectField
              label="Size"
              value={row.sizeClass}
              onChange={(event) => change(at, { sizeClass: event.target.value })}
            >
              <option value="">All sizes</option>
              {sizeClasses.map((size) => (
                <option key={size} value={size}>
                  {sizeClassNames[size]}
                </option>
              ))}
            </SelectField>
          ) : null}
          <TextField
            label={amountLabel}
            inputMode="decimal"
            value={row.amount}
            error={fault(`${at}.${hasSizes ? 'amount' : 'hourly'}`)}
            onChange={(event) => change(at, { amount: event.target.value })}
          />
          <Button
            look="bare"
            aria-label={`Take out line ${at + 1}`}
            onClick={() => onChange(rows.filter((_row, index) => index !== at))}
          >
            <Icon name="x" />
          </Button>
        </div>
      ))}
      {fault('') ? (
        <p className="tape err" role="alert">
          {fault('')}
        </p>
      ) : null}
      <Button onClick={() => onChange([...rows, { serviceId: '', sizeClass: '', amount: '' }])}>
        <Icon name="plus" /> Add a service
      </Button>
    </fieldset>
  );
}
