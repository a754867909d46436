import type { CustomerDto } from '@driprail/shared/contracts/customers.contract';
import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import type { SizeClass } from '@driprail/shared/contracts/fields';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { money } from '../../../lib/format.ts';
import type { LineDraft } from './job-draft.ts';
import { menuPrice } from './job-draft.ts';

interface JobLinesFieldProps {
  lines: LineDraft[];
  services: ServiceDto[];
  customer: CustomerDto | undefined;
  fields: Record<string, string>;
  onChange: (lines: LineDraft[]) => void;
}

/** What is ordered: a service on a vehicle, by its size class, at the menu's price or an agreed one. */
export function JobLinesField({ lines, services, customer, fields, onChange }: JobLinesFieldProps) {
  const change = (index: number, next: Partial<LineDraft>) =>
    onChange(lines.map((line, at) => (at === index ? { ...line, ...next } : line)));
  const sold = services.filter((service) => service.isActive);
  return (
    <fieldset>
      <legend className="sec w-full mb-2">Work</legend>
      <div className="grid gap-3">
        {lines.map((line, index) => {
          const price = menuPrice(services, line);
          return (
            <div
              key={line.id ?? index}
              className="grid grid-cols-[minmax(0,1.5fr)_minmax(0,1.2fr)_130px_100px_36px] gap-2 items-end max-[720px]:grid-cols-2"
            >
              <SelectField
                label="Service"
                disabled={line.isFinished}
                value={line.serviceId}
                error={fields[`lines.${index}.serviceId`]}
                onChange={(event) => change(index, { serviceId: event.target.value, price: '' })}
              >
                <option value="">Choose …</option>
                <NamedOptions of={sold} />
              </SelectField>
              <SelectField
                label="Vehicle"
                disabled={line.isFinished}
                value={line.vehicleId}
                error={fields[`lines.${index}.vehicleId`]}
                onChange={(event) => {
                  const vehicle = customer?.vehicles.find((v) => v.id === event.target.value);
                  change(index, {
                    vehicleId: event.target.value,
                    ...(vehicle && { sizeClass: vehicle.sizeClass, price: '' }),
                  });
                }}
              >
                <option value="">None named</option>
                {customer?.vehicles.map((vehicle) => (
                  <option key={vehicle.id} value={vehicle.id}>
                    {[vehicle.color, vehicle.label, vehicle.plate].filter(Boolean).join(' ')}
                  </option>
                ))}
              </SelectField>
              <SelectField
                label="Size class"
                disabled={line.isFinished}
                value={line.sizeClass}
                onChange={(event) => change(index, { sizeClass: event.target.value as SizeClass, price: '' })}
              >
                {sizeClasses.map((size) => (
                  <option key={size} value={size}>
                    {sizeClassNames[size]}
                  </option>
                ))}
              </SelectField>
              <TextField
                label="Price"
                inputMode="decimal"
                disabled={line.isFinished}
                value={line.price}
                placeholder={price ? money(price.priceCents) : 'not sold'}
                error={fields[`lines.${index}.priceCents`]}
                onChange={(event) => change(index, { price: event.target.value })}
              />
              <Button
                look="bare"
                aria-label="Drop this line"
                disabled={line.isFinished}
                onClick={() => onChange(lines.filter((_, at) => at !== index))}
              >
                <Icon name="x" />
              </Button>
            </div>
          );
        })}
        {fields['lines'] ? <p className="tape">{fields['lines']}</p> : null}
        <div>
          <Button
            onClick={() => {
              const vehicle = customer?.vehicles[0];
              onChange([
                ...lines,
                {
                  serviceId: '',
                  vehicleId: vehicle?.id ?? '',
                  sizeClass: vehicle?.sizeClass ?? 'sedan',
                  price: '',
                  isFinished: false,
                },
              ]);
            }}
          >
            <Icon name="plus" /> Add a service
          </Button>
        </div>
      </div>
    </fieldset>
  );
}
