import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { DraftRows } from './draft-rows.tsx';
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
  return (
    <DraftRows
      label={label}
      addLabel="Add a service"
      className={hasSizes ? 'has-sizes' : ''}
      rows={rows}
      empty={{ serviceId: '', sizeClass: '', amount: '' }}
      error={fault('')}
      onChange={onChange}
      fields={(row, change, at) => (
        <>
          <SelectField
            label="Service"
            value={row.serviceId}
            error={fault(`${at}.serviceId`)}
            onChange={(event) => change({ serviceId: event.target.value })}
          >
            <option value="">Choose</option>
            <NamedOptions of={services} />
          </SelectField>
          {hasSizes ? (
            <SelectField
              label="Size"
              value={row.sizeClass}
              onChange={(event) => change({ sizeClass: event.target.value })}
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
            onChange={(event) => change({ amount: event.target.value })}
          />
        </>
      )}
    />
  );
}
