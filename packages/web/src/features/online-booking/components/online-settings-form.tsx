import { useState } from 'react';
import type { OnlineSettingsDto } from '@driprail/shared/contracts/online-booking.contract';
import type { ServiceDto } from '@driprail/shared/contracts/services.contract';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextArea, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { money, parseMoney } from '../../../lib/format.ts';
import type { useSaveOnlineSettings } from '../api/online-settings.queries.ts';
import { listOf, timesOf } from './lists.ts';
import { policyWords } from './policy-words.ts';

/** What strangers may book, where, when and on which terms. */
export function OnlineSettingsForm({
  settings,
  services,
  save,
}: {
  settings: OnlineSettingsDto;
  services: ServiceDto[];
  save: ReturnType<typeof useSaveOnlineSettings>;
}) {
  const { policyVersion, ...known } = settings;
  const [value, setValue] = useState(known);
  const [places, setPlaces] = useState(settings.places.join(', '));
  const [starts, setStarts] = useState(settings.starts.join(', '));
  const [fee, setFee] = useState(money(settings.lateFeeCents));
  const fields = fieldsOf(save.error);
  const fault = (name: string) => Object.entries(fields).find(([path]) => path.split('.')[0] === name)?.[1];
  const feeCents = parseMoney(fee);
  const number = (name: 'noticeHours' | 'farthestDays' | 'windowMinutes' | 'freeUntilHours') => ({
    type: 'number',
    value: value[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) =>
      setValue({ ...value, [name]: Number(event.target.value) }),
  });
  return (
    <form
      className="hung p-5 max-w-[980px] grid grid-cols-2 gap-x-10 gap-y-6 max-[900px]:grid-cols-1"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (save.isPending || feeCents === null) return;
        save.mutate({ ...value, places: listOf(places), starts: timesOf(starts), lateFeeCents: feeCents });
      }}
    >
      <section className="grid gap-3 content-start">
        <h2 className="sec">Booking online</h2>
        <CheckField
          label="Customers book by themselves at /book"
          checked={value.isOn}
          onChange={({ target }) => setValue({ ...value, isOn: target.checked })}
        />
        <TextField
          label="Towns and ZIP codes we go to"
          hint="With commas. Left empty: everywhere. Others are asked to call."
          value={places}
          error={fault('places')}
          onChange={(event) => setPlaces(event.target.value)}
        />
        <TextField
          label="Arrival windows begin at"
          hint="With commas, like 8:00, 10:00, 14:00."
          value={starts}
          error={fault('starts')}
          onChange={(event) => setStarts(event.target.value)}
        />
        <div className="grid grid-cols-2 gap-3">
          <TextField label="A window lasts (minutes)" {...number('windowMinutes')} />
          <TextField label="Notice at least (hours)" {...number('noticeHours')} />
          <TextField label="Ahead at most (days)" {...number('farthestDays')} />
        </div>
        <fieldset>
          <legend className="sec w-full">Services offered online</legend>
          {services.map(({ id, name }) => (
            <CheckField
              key={id}
              label={name}
              checked={value.serviceIds.includes(id)}
              onChange={({ target }) => {
                const others = value.serviceIds.filter((one) => one !== id);
                setValue({ ...value, serviceIds: target.checked ? [...others, id] : others });
              }}
            />
          ))}
          {fault('serviceIds') ? (
            <p className="tape err" role="alert">
              {fault('serviceIds')}
            </p>
          ) : null}
        </fieldset>
      </section>
      <section className="grid gap-3 content-start">
        <h2 className="sec">
          Terms <span>version {policyVersion}</span>
        </h2>
        <TextArea
          label="What customers accept"
          rows={8}
          hint="Other words are a new version; who accepted the old one keeps it."
          value={value.policyWords}
          error={fields['policyWords']}
          onChange={(event) => setValue({ ...value, policyWords: event.target.value })}
        />
        <div className="grid grid-cols-2 gap-3">
          <TextField label="Calling off is free until (hours before)" {...number('freeUntilHours')} />
          <TextField
            label="After that it costs"
            inputMode="decimal"
            value={fee}
            error={feeCents === null ? 'Give an amount like 40.00, or 0.' : fields['lateFeeCents']}
            onChange={(event) => setFee(event.target.value)}
          />
        </div>
        <p className="t-2">
          {policyWords({ ...value, lateFeeCents: feeCents ?? 0 })} The fee is proposed on the job; nothing is charged by
          itself.
        </p>
        <p className="caution">
          <b>Caution.</b> Terms and fees have to hold under your law. Have them looked at by somebody licensed to.
        </p>
      </section>
      <div className="col-span-full flex items-center gap-3">
        <Button type="submit" look="main" isBusy={save.isPending}>
          Save online booking
        </Button>
        <FormFault error={save.error} fields={fields} />
        {save.isSuccess ? <p role="status">Saved.</p> : null}
      </div>
    </form>
  );
}
