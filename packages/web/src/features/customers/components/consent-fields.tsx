import type { UseFormReturn } from 'react-hook-form';
import { useController } from 'react-hook-form';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { channelNames, channels } from '@driprail/shared/domain/customer/consent';
import type { Channel } from '@driprail/shared/domain/customer/consent';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { SelectField, TextField } from '../../../components/field.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useFormats } from '../../../lib/format.ts';

type Consents = NonNullable<CustomerBody['consents']>;

/** Yes or no to each channel, with the day and how it was said. Without an answer nobody gets a text. */
export function ConsentFields({ form, asked }: { form: UseFormReturn<CustomerBody>; asked: readonly Channel[] }) {
  const { zone } = useFormats();
  const { field } = useController({ control: form.control, name: 'consents' });
  const consents = field.value ?? [];
  const change = (channel: Channel, more: Partial<Consents[number]> | null) => {
    const others = consents.filter((consent) => consent.channel !== channel);
    const known = consents.find((consent) => consent.channel === channel);
    const fresh = { channel, isGiven: true, on: dayOf(serverNow().toISOString(), zone), how: '' };
    field.onChange(more === null ? others : [...others, { ...(known ?? fresh), ...more }]);
  };
  return (
    <fieldset className="mt-4">
      <legend className="sec w-full">
        Consent <span>texts go only after a yes</span>
      </legend>
      {channels.map((channel) => {
        const index = consents.findIndex((consent) => consent.channel === channel);
        const answer = consents[index];
        const wrong = form.formState.errors.consents?.[index];
        return (
          <div key={channel} className="cu-part">
            <SelectField
              className="is-2"
              label={channelNames[channel]}
              value={answer ? (answer.isGiven ? 'yes' : 'no') : ''}
              onChange={({ target }) =>
                change(channel, target.value === '' ? null : { isGiven: target.value === 'yes' })
              }
            >
              {asked.includes(channel) ? null : <option value="">Never asked</option>}
              <option value="yes">Yes</option>
              <option value="no">No</option>
            </SelectField>
            {answer ? (
              <>
                <TextField
                  label="Said on"
                  type="date"
                  value={answer.on}
                  onChange={({ target }) => change(channel, { on: target.value })}
                  error={wrong?.on?.message}
                />
                <TextField
                  className="is-3"
                  label="How it was given"
                  placeholder="At the car, by phone, on the web"
                  value={answer.how}
                  onChange={({ target }) => change(channel, { how: target.value })}
                  error={wrong?.how?.message}
                />
              </>
            ) : null}
          </div>
        );
      })}
    </fieldset>
  );
}
