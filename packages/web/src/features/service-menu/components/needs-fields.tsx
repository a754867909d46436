import { degreesOf, tenthsOf } from '@driprail/shared/domain/menu/service-needs';
import type { ServiceNeeds } from '@driprail/shared/domain/menu/service-needs';
import { CheckField, TextField } from '../../../components/field.tsx';
import { useSession } from '../../../lib/session.tsx';

const asked = [
  ['water', 'Water: a spigot, or a tank in the van'],
  ['power', 'Power: an outlet, or a generator'],
  ['dry', 'Dry weather'],
  ['daylight', 'Daylight'],
] as const;

/** What a service asks of the place and the weather; temperatures in the company's units. */
export function NeedsFields({
  value,
  fields,
  onChange,
}: {
  value: ServiceNeeds;
  fields: Record<string, string>;
  onChange: (needs: ServiceNeeds) => void;
}) {
  const { units } = useSession().company;
  const unit = units === 'us' ? '°F' : '°C';
  const temperature = (key: 'coldestTenths' | 'hottestTenths', label: string) => (
    <TextField
      label={`${label}, ${unit}`}
      type="number"
      placeholder="no limit"
      value={value[key] === null ? '' : degreesOf(value[key], units)}
      error={fields[`needs.${key}`]}
      onChange={(event) =>
        onChange({ ...value, [key]: event.target.value === '' ? null : tenthsOf(Number(event.target.value), units) })
      }
    />
  );
  return (
    <fieldset>
      <legend className="sec w-full">What it needs of the place and the weather</legend>
      <div className="grid grid-cols-2 gap-x-6 max-[560px]:grid-cols-1">
        {asked.map(([key, label]) => (
          <CheckField
            key={key}
            label={label}
            checked={value[key]}
            onChange={(event) => onChange({ ...value, [key]: event.target.checked })}
          />
        ))}
        {temperature('coldestTenths', 'Air not colder than')}
        {temperature('hottestTenths', 'Air not hotter than')}
      </div>
    </fieldset>
  );
}
