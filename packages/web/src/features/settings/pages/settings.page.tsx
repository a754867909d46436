import { useState } from 'react';
import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { Link } from 'react-router';
import { getSettings, updateSettings } from '@driprail/shared/contracts/settings.contract';
import type { SettingsDto } from '@driprail/shared/contracts/settings.contract';
import { warningCodes, warningNames } from '@driprail/shared/domain/board/findings';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { CheckField, SelectField, TextField } from '../../../components/field.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { call } from '../../../lib/call.ts';
import { BreakFields, withSet } from '../components/break-fields.tsx';
import { zoneNames } from '../zones.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

export function SettingsPage() {
  const settings = useQuery({ queryKey: ['settings'], queryFn: ({ signal }) => call(getSettings, {}, signal) });
  return (
    <>
      <PageHead title="Settings" above="The company and its board" />
      <RailPage>
        <Loaded query={settings} what="the settings">
          {(data) => <SettingsForm key={data.settings.version} settings={data.settings} />}
        </Loaded>
      </RailPage>
    </>
  );
}

function SettingsForm({ settings }: { settings: SettingsDto }) {
  const client = useQueryClient();
  const [value, setValue] = useState(settings);
  const save = useMutation({
    mutationFn: () => call(updateSettings, { body: value }),
    onSuccess: (data) => {
      client.setQueryData(['settings'], data);
      return client.invalidateQueries({ queryKey: ['session'] });
    },
  });
  const fields = fieldsOf(save.error);
  const text = (name: 'name' | 'phone' | 'email' | 'emergencyNumber' | 'dayStartsAt' | 'dayEndsAt') => ({
    value: value[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) => setValue({ ...value, [name]: event.target.value }),
  });
  return (
    <form
      className="hung p-5 max-w-[980px] grid grid-cols-2 gap-x-10 gap-y-6 max-[900px]:grid-cols-1"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!save.isPending) save.mutate();
      }}
    >
      <section className="grid gap-3 content-start">
        <h2 className="sec">Company</h2>
        <TextField label="Name" {...text('name')} />
        <TextField label="Phone, as customers see it" type="tel" {...text('phone')} />
        <TextField label="E-mail, as customers see it" type="email" {...text('email')} />
        <TextField
          label="Emergency number"
          type="tel"
          hint="The first thing on the phones’ page of first help."
          {...text('emergencyNumber')}
        />
        <SelectField
          label="Time zone"
          value={value.zone}
          error={fields['zone']}
          hint="Days, shifts and the workweek go by it, whatever a browser says."
          onChange={(event) => setValue({ ...value, zone: event.target.value })}
        >
          {zoneNames(value.zone).map((zone) => (
            <option key={zone} value={zone}>
              {zone.replaceAll('_', ' ')}
            </option>
          ))}
        </SelectField>
        <div className="grid grid-cols-2 gap-3">
          <SelectField
            label="Clock"
            value={value.clock}
            onChange={(event) => setValue({ ...value, clock: event.target.value as '12' | '24' })}
          >
            <option value="12">2:30 pm</option>
            <option value="24">14:30</option>
          </SelectField>
          <SelectField
            label="Units"
            value={value.units}
            onChange={(event) => setValue({ ...value, units: event.target.value as 'us' | 'metric' })}
          >
            <option value="us">Miles, gallons, °F</option>
            <option value="metric">Kilometers, liters, °C</option>
          </SelectField>
        </div>
      </section>
      <section className="grid gap-3 content-start">
        <h2 className="sec">Board and run sheet</h2>
        <div className="grid grid-cols-2 gap-3">
          <TextField label="The day starts" type="time" {...text('dayStartsAt')} />
          <TextField label="The day ends" type="time" {...text('dayEndsAt')} />
        </div>
        <TextField
          label="A mark can be taken back for (seconds)"
          type="number"
          min={0}
          max={600}
          value={value.undoSeconds}
          error={fields['undoSeconds']}
          onChange={(event) => setValue({ ...value, undoSeconds: Number(event.target.value) })}
        />
        <fieldset>
          <legend className="sec w-full">
            Warnings that need a reason <span>asked once per visit</span>
          </legend>
          {warningCodes.map((code) => (
            <CheckField
              key={code}
              label={warningNames[code]}
              checked={value.reasonKinds.includes(code)}
              onChange={(event) =>
                setValue({
                  ...value,
                  reasonKinds: event.target.checked
                    ? [...value.reasonKinds, code]
                    : value.reasonKinds.filter((c) => c !== code),
                })
              }
            />
          ))}
        </fieldset>
        <h2 className="sec">Invoices</h2>
        <SelectField
          label="Discount that dispatch gives alone"
          value={value.deskDiscountPercent}
          error={fields['deskDiscountPercent']}
          hint="More than that is for the owner."
          onChange={(event) => setValue({ ...value, deskDiscountPercent: Number(event.target.value) })}
        >
          {withSet([0, 5, 10, 15, 20, 30, 50, 100], value.deskDiscountPercent).map((percent) => (
            <option key={percent} value={percent}>
              {percent === 100 ? 'Any' : `Up to ${percent} percent`}
            </option>
          ))}
        </SelectField>
        <SelectField
          label="Invoices are due"
          value={value.invoiceDueDays}
          error={fields['invoiceDueDays']}
          hint="What was billed keeps its day."
          onChange={(event) => setValue({ ...value, invoiceDueDays: Number(event.target.value) })}
        >
          {withSet([0, 7, 10, 14, 15, 21, 30, 45, 60, 90], value.invoiceDueDays).map((days) => (
            <option key={days} value={days}>
              {days === 0 ? 'On the same day' : `After ${days} days`}
            </option>
          ))}
        </SelectField>
        <p className="t-2">
          <Link to={paths.taxes}>Sales taxes</Link> stand on invoices by place and day.
        </p>
        <p className="t-2">
          <Link to={paths.onlineBooking}>Online booking</Link> is what customers book by themselves.
        </p>
        <BreakFields value={value} fields={fields} onChange={(breaks) => setValue({ ...value, ...breaks })} />
        <fieldset>
          <legend className="sec w-full">Mail when a pay week is locked</legend>
          <CheckField
            label="Names gross and hours beside the link to the statement"
            checked={value.statementMailShowsFigures}
            onChange={(event) => setValue({ ...value, statementMailShowsFigures: event.target.checked })}
          />
          <p className="caution mt-2">
            <b>Caution.</b> Mail is not private: it may be read on shared phones and on its way. Without this the mail
            is a link, and the figures stay behind the sign-in.
          </p>
        </fieldset>
        <p className="t-2">
          Overtime, minimum wage, the crew split and the workweek are dated rules of pay:{' '}
          <Link to={paths.rates}>Rates and pay rules</Link>.
        </p>
      </section>
      <div className="col-span-full flex items-center gap-3">
        <Button type="submit" look="main" isBusy={save.isPending}>
          Save settings
        </Button>
        <FormFault error={save.error} fields={fields} />
        {save.isSuccess ? <p role="status">Saved.</p> : null}
      </div>
    </form>
  );
}
