import { useState } from 'react';
import { skillNames, skills } from '@driprail/shared/contracts/fields';
import type { Skill } from '@driprail/shared/contracts/fields';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextField } from '../../../components/field.tsx';
import { SheetFoot } from '../../../components/sheet.tsx';
import { useSavePerson, useTimeOff } from '../api/people.queries.ts';
import { fieldsOf } from '../../../lib/fields.ts';
import { FormFault } from '../../../components/form-fault.tsx';

export function PersonForm({ person, onDone }: { person: PersonDto | null; onDone: () => void }) {
  const save = useSavePerson();
  const [value, setValue] = useState({
    name: person?.name ?? '',
    phone: person?.phone ?? '',
    skills: person?.skills ?? [],
    isTrainee: person?.isTrainee ?? false,
    isActive: person?.isActive ?? true,
    sharesTips: person?.sharesTips ?? true,
  });
  const fields = fieldsOf(save.error);
  return (
    <>
      <form
        noValidate
        onSubmit={(event) => {
          event.preventDefault();
          if (!save.isPending)
            save.mutate({ id: person?.id ?? null, version: person?.version ?? 0, body: value }, { onSuccess: onDone });
        }}
      >
        <div className="grid grid-cols-2 gap-3">
          <TextField
            label="Name"
            value={value.name}
            error={fields['name']}
            onChange={(event) => setValue({ ...value, name: event.target.value })}
          />
          <TextField
            label="Phone"
            type="tel"
            value={value.phone}
            error={fields['phone']}
            onChange={(event) => setValue({ ...value, phone: event.target.value })}
          />
        </div>
        <div className="grid grid-cols-2 gap-6 mt-3">
          <fieldset>
            <legend className="sec w-full">Skills</legend>
            {skills.map((skill: Skill) => (
              <CheckField
                key={skill}
                label={skillNames[skill]}
                checked={value.skills.includes(skill)}
                onChange={(event) =>
                  setValue({
                    ...value,
                    skills: event.target.checked ? [...value.skills, skill] : value.skills.filter((s) => s !== skill),
                  })
                }
              />
            ))}
          </fieldset>
          <fieldset>
            <legend className="sec w-full">Standing</legend>
            <CheckField
              label="Works here"
              checked={value.isActive}
              onChange={(event) => setValue({ ...value, isActive: event.target.checked })}
            />
            <CheckField
              label="Trainee: rides along, adds no speed, no skill, no share"
              checked={value.isTrainee}
              onChange={(event) => setValue({ ...value, isTrainee: event.target.checked })}
            />
            <CheckField
              label="Shares in tips, from today on"
              checked={value.sharesTips}
              onChange={(event) => setValue({ ...value, sharesTips: event.target.checked })}
            />
            <p className="t-2 mt-1">
              Owners, managers and supervisors by their duties may not keep tips (29 USC 203(m)(2)(B)).
            </p>
          </fieldset>
        </div>
        <FormFault error={save.error} fields={fields} className="mt-3" />
        <SheetFoot>
          <Button type="submit" look="main" isBusy={save.isPending}>
            {person ? 'Save person' : 'Add person'}
          </Button>
        </SheetFoot>
      </form>
      {person ? <TimeOffList person={person} /> : null}
    </>
  );
}

function TimeOffList({ person }: { person: PersonDto }) {
  const { add, remove } = useTimeOff(person.id);
  const [off, setOff] = useState({ startsOn: '', endsOn: '', note: '' });
  const fields = fieldsOf(add.error);
  return (
    <form
      className="pb-5"
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        const body = { ...off, endsOn: off.endsOn || off.startsOn };
        if (!add.isPending) add.mutate(body, { onSuccess: () => setOff({ startsOn: '', endsOn: '', note: '' }) });
      }}
    >
      <h3 className="sec mt-2">Time off</h3>
      {person.timeOff.map((row) => (
        <p key={row.id} className="flex items-center justify-between border-b border-line py-1">
          <span>
            {formatDate(row.startsOn)}
            {row.endsOn === row.startsOn ? '' : ` to ${formatDate(row.endsOn)}`}
            {row.note ? <span className="t-2">, {row.note}</span> : null}
          </span>
          <Button look="bare" onClick={() => remove.mutate(row.id)}>
            Take back
          </Button>
        </p>
      ))}
      <div className="grid grid-cols-[1fr_1fr_1.4fr_auto] gap-2 items-end mt-2 max-[560px]:grid-cols-2">
        <TextField
          label="First day"
          type="date"
          value={off.startsOn}
          error={fields['startsOn']}
          onChange={(event) => setOff({ ...off, startsOn: event.target.value })}
        />
        <TextField
          label="Last day"
          type="date"
          value={off.endsOn}
          error={fields['endsOn']}
          onChange={(event) => setOff({ ...off, endsOn: event.target.value })}
        />
        <TextField label="Note" value={off.note} onChange={(event) => setOff({ ...off, note: event.target.value })} />
        <Button type="submit" isBusy={add.isPending}>
          Add days off
        </Button>
      </div>
      <FormFault error={add.error} fields={fields} className="mt-2" />
    </form>
  );
}
