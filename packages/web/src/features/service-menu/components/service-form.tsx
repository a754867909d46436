import { useState } from 'react';
import { equipmentKinds, equipmentNames, skillNames, skills } from '@driprail/shared/contracts/fields';
import type { Equipment, Skill } from '@driprail/shared/contracts/fields';
import { serviceKinds } from '@driprail/shared/contracts/services.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { taxClassNames, taxClasses } from '@driprail/shared/domain/billing/tax-rates';
import { photoSetNames, photoSets, usualPhotoSet } from '@driprail/shared/domain/walk-round/views';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextArea, TextField } from '../../../components/field.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { useSaveService } from '../api/services.queries.ts';
import { IncludesField } from './includes-field.tsx';
import { NeedsFields } from './needs-fields.tsx';
import { PriceFields } from './price-fields.tsx';
import type { PriceTexts } from './price-texts.ts';
import { readPrices, textsOf } from './price-texts.ts';
import { fieldsOf } from '../../../lib/fields.ts';

export const kindNames = { package: 'Package', single: 'Single service', add_on: 'Add-on' } as const;
const noNeeds: ServiceDto['needs'] = {
  ...{ water: false, power: false, dry: false, daylight: false, coldestTenths: null, hottestTenths: null },
};

/** A service by size class. A new price starts on a date; what was quoted keeps its own. */
export function ServiceForm({
  service,
  services,
  today,
  onDone,
}: {
  service: ServiceDto | null;
  /** The whole menu, for what a package holds. */
  services: ServiceDto[];
  today: string;
  onDone: () => void;
}) {
  const save = useSaveService();
  const [value, setValue] = useState({
    name: service?.name ?? '',
    kind: service?.kind ?? ('package' as const),
    description: service?.description ?? '',
    skills: service?.skills ?? [],
    equipment: service?.equipment ?? [],
    photoSet: service?.photoSet ?? usualPhotoSet('package'),
    taxClass: service?.taxClass ?? ('standard' as const),
    needs: service?.needs ?? noNeeds,
    cureHours: service?.cureHours ?? 0,
    intervalDays: service?.intervalDays ?? null,
    depositPercent: service?.depositPercent ?? 0,
    includes: service?.includes ?? [],
    isActive: service?.isActive ?? true,
    position: service?.position ?? 0,
  });
  const [prices, setPrices] = useState<PriceTexts>(() => textsOf(service));
  const [startsOn, setStartsOn] = useState(today);
  const [unread, setUnread] = useState<Record<string, string>>({});
  const fields = { ...fieldsOf(save.error), ...unread };
  const toggle = <T extends string>(list: T[], item: T, isOn: boolean) =>
    isOn ? [...list, item] : list.filter((other) => other !== item);

  const submit = () => {
    const read = readPrices(prices);
    setUnread(read.fields);
    if (Object.keys(read.fields).length > 0 || save.isPending) return;
    const kept = { includes: value.kind === 'package' ? value.includes : [] };
    const isChanged = JSON.stringify(prices) !== JSON.stringify(textsOf(service));
    const order = service
      ? {
          id: service.id,
          update: { ...value, ...kept, version: service.version },
          prices: isChanged ? { startsOn, prices: read.prices } : null,
        }
      : { create: { ...value, ...kept, startsOn, prices: read.prices } };
    save.mutate(order, { onSuccess: onDone });
  };
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        submit();
      }}
    >
      <div className="grid grid-cols-[2fr_1fr_90px] gap-3 max-[560px]:grid-cols-1">
        <TextField
          label="Name"
          value={value.name}
          error={fields['name']}
          onChange={(event) => setValue({ ...value, name: event.target.value })}
        />
        <SelectField
          label="Kind"
          value={value.kind}
          onChange={(event) => {
            const kind = event.target.value as ServiceDto['kind'];
            // A new service follows its kind until somebody chooses.
            const isUsual = value.photoSet === usualPhotoSet(value.kind);
            setValue({ ...value, kind, photoSet: isUsual ? usualPhotoSet(kind) : value.photoSet });
          }}
        >
          {serviceKinds.map((kind) => (
            <option key={kind} value={kind}>
              {kindNames[kind]}
            </option>
          ))}
        </SelectField>
        <TextField
          label="Order"
          type="number"
          value={value.position}
          error={fields['position']}
          onChange={(event) => setValue({ ...value, position: Number(event.target.value) })}
        />
      </div>
      <TextArea
        className="mt-3"
        label="What it is"
        value={value.description}
        onChange={(event) => setValue({ ...value, description: event.target.value })}
      />
      <div className="grid grid-cols-2 gap-6 mt-3 max-[560px]:grid-cols-1">
        <fieldset>
          <legend className="sec w-full">Skills it needs</legend>
          {skills.map((skill: Skill) => (
            <CheckField
              key={skill}
              label={skillNames[skill]}
              checked={value.skills.includes(skill)}
              onChange={(event) => setValue({ ...value, skills: toggle(value.skills, skill, event.target.checked) })}
            />
          ))}
        </fieldset>
        <fieldset>
          <legend className="sec w-full">Equipment it needs</legend>
          {equipmentKinds.map((tool: Equipment) => (
            <CheckField
              key={tool}
              label={equipmentNames[tool]}
              checked={value.equipment.includes(tool)}
              onChange={(event) =>
                setValue({ ...value, equipment: toggle(value.equipment, tool, event.target.checked) })
              }
            />
          ))}
        </fieldset>
      </div>
      <div className="grid grid-cols-2 gap-6 mt-3 max-[560px]:grid-cols-1">
        <SelectField
          label="Walk-round before work"
          hint="A visit asks for the largest of its lines."
          value={value.photoSet}
          error={fields['photoSet']}
          onChange={(event) =>
            setValue({ ...value, photoSet: photoSets.find((set) => set === event.target.value) ?? value.photoSet })
          }
        >
          {photoSets.map((set) => (
            <option key={set} value={set}>
              {photoSetNames[set]}
            </option>
          ))}
        </SelectField>
        <SelectField
          label="Sales tax"
          hint="How much, and where, the owner enters under Settings. Which services are taxed differs by place and law."
          value={value.taxClass}
          error={fields['taxClass']}
          onChange={(event) =>
            setValue({ ...value, taxClass: taxClasses.find((one) => one === event.target.value) ?? value.taxClass })
          }
        >
          {taxClasses.map((one) => (
            <option key={one} value={one}>
              {taxClassNames[one]}
            </option>
          ))}
        </SelectField>
      </div>
      <div className="mt-4">
        <NeedsFields value={value.needs} fields={fields} onChange={(needs) => setValue({ ...value, needs })} />
      </div>
      <div className="grid grid-cols-3 gap-3 mt-3 max-[560px]:grid-cols-1">
        <TextField
          label="Stays dry for, hours"
          type="number"
          value={value.cureHours}
          error={fields['cureHours']}
          onChange={(event) => setValue({ ...value, cureHours: Number(event.target.value) })}
        />
        <TextField
          label="Due again after, days"
          type="number"
          placeholder="never"
          value={value.intervalDays ?? ''}
          error={fields['intervalDays']}
          onChange={(event) =>
            setValue({ ...value, intervalDays: event.target.value === '' ? null : Number(event.target.value) })
          }
        />
        <TextField
          label="Deposit, percent"
          type="number"
          value={value.depositPercent}
          error={fields['depositPercent']}
          onChange={(event) => setValue({ ...value, depositPercent: Number(event.target.value) })}
        />
      </div>
      {value.kind === 'package' ? (
        <IncludesField
          services={services.filter((one) => one.id !== service?.id)}
          value={value.includes}
          error={fields['includes']}
          onChange={(includes) => setValue({ ...value, includes })}
        />
      ) : null}
      <PriceFields value={prices} fields={fields} onChange={setPrices} />
      <div className="grid grid-cols-2 gap-3 mt-3">
        <TextField
          label="These prices start on"
          type="date"
          value={startsOn}
          error={fields['startsOn']}
          onChange={(event) => setStartsOn(event.target.value)}
        />
        <CheckField
          label="On the menu"
          checked={value.isActive}
          onChange={(event) => setValue({ ...value, isActive: event.target.checked })}
        />
      </div>
      {fields['prices'] || (save.error && Object.keys(fields).length === 0) ? (
        <p className="tape mt-3" role="alert">
          <b>{fields['prices'] ?? save.error?.message}</b>
        </p>
      ) : null}
      <SheetFoot>
        <Button onClick={onDone}>Leave</Button>
        <Button type="submit" look="main" isBusy={save.isPending}>
          {service ? 'Save service' : 'Add service'}
        </Button>
      </SheetFoot>
    </form>
  );
}
