import { useState } from 'react';
import type { MessageHours } from '@driprail/shared/contracts/message-settings.contract';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useSaveHours } from '../api/message-settings.queries.ts';

/** When texts rest, when the reminder goes out, and how long after the work the question does. */
export function HoursForm({ hours }: { hours: MessageHours }) {
  const [value, setValue] = useState(hours);
  const save = useSaveHours();
  const fields = fieldsOf(save.error);
  const time = (name: 'quietFrom' | 'quietTo' | 'reminderAt') => ({
    type: 'time',
    value: value[name],
    error: fields[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) => setValue({ ...value, [name]: event.target.value }),
  });
  return (
    <form
      className="grid gap-3"
      aria-label="Hours"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!save.isPending) save.mutate(value);
      }}
    >
      <h2 className="sec">Hours</h2>
      <div className="grid grid-cols-2 gap-3">
        <TextField label="Texts rest from" {...time('quietFrom')} />
        <TextField label="until" {...time('quietTo')} />
      </div>
      <p className="t-2">Mails go out at any hour. “On the way” goes out within the promised window.</p>
      <TextField label="Reminder, the day before at" {...time('reminderAt')} />
      <TextField
        label="Ask how it went after (hours)"
        type="number"
        min={1}
        max={72}
        value={value.feedbackHours}
        error={fields['feedbackHours']}
        onChange={(event) => setValue({ ...value, feedbackHours: Number(event.target.value) })}
      />
      <FormFault error={save.error} fields={fields} />
      <p className="flex items-center gap-3">
        <Button type="submit" isBusy={save.isPending}>
          Save hours
        </Button>
        {save.isSuccess ? <span role="status">Saved.</span> : null}
      </p>
    </form>
  );
}
