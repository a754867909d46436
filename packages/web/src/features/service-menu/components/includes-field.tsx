import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { CheckField } from '../../../components/field.tsx';

/** What a package holds. Its price and minutes stay its own. */
export function IncludesField({
  services,
  value,
  error,
  onChange,
}: {
  services: ServiceDto[];
  value: string[];
  error: string | undefined;
  onChange: (ids: string[]) => void;
}) {
  const parts = services.filter((one) => one.kind !== 'package' && (one.isActive || value.includes(one.id)));
  return (
    <fieldset className="mt-3">
      <legend className="sec w-full">What the package holds</legend>
      {parts.length === 0 ? <p className="t-2">Add single services and add-ons first.</p> : null}
      <div className="grid grid-cols-2 gap-x-6 max-[560px]:grid-cols-1">
        {parts.map((part) => (
          <CheckField
            key={part.id}
            label={part.name}
            checked={value.includes(part.id)}
            onChange={(event) =>
              onChange(event.target.checked ? [...value, part.id] : value.filter((other) => other !== part.id))
            }
          />
        ))}
      </div>
      {error ? (
        <p className="tape mt-2" role="alert">
          <b>{error}</b>
        </p>
      ) : null}
    </fieldset>
  );
}
