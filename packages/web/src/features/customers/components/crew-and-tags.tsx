import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { UseFormReturn } from 'react-hook-form';
import { useController } from 'react-hook-form';
import type { CustomerBody } from '@driprail/shared/contracts/customers-record.contract';
import { Button } from '../../../components/button.tsx';
import { NamedOptions, SelectField, TextField } from '../../../components/field.tsx';
import { Icon } from '../../../components/icon.tsx';
import { crewQuery } from '../api/customers.queries.ts';

/** Whom the customer likes to see, the most wanted first, and words to find the customer by. */
export function CrewAndTags({ form }: { form: UseFormReturn<CustomerBody> }) {
  return (
    <div className="cu-part">
      <PreferredCrewField form={form} />
      <TagsField form={form} />
    </div>
  );
}

function PreferredCrewField({ form }: { form: UseFormReturn<CustomerBody> }) {
  const people = useQuery(crewQuery);
  const { field, fieldState } = useController({ control: form.control, name: 'preferredCrew' });
  const chosen = field.value ?? [];
  const known = people.data?.people ?? [];
  return (
    <div className="is-3">
      <SelectField
        label="Preferred crew"
        value=""
        error={fieldState.error?.message}
        onChange={({ target }) => field.onChange([...chosen, target.value])}
      >
        <option value="">Add a person</option>
        <NamedOptions of={known.filter(({ id, isActive }) => isActive && !chosen.includes(id))} />
      </SelectField>
      <ul className="cu-picked">
        {chosen.map((id) => {
          const name = known.find((person) => person.id === id)?.name ?? '';
          return (
            <li key={id}>
              {name}
              <Button
                look="bare"
                aria-label={`Take ${name} off`}
                onClick={() => field.onChange(chosen.filter((one) => one !== id))}
              >
                <Icon name="x" />
              </Button>
            </li>
          );
        })}
      </ul>
    </div>
  );
}

function TagsField({ form }: { form: UseFormReturn<CustomerBody> }) {
  const { field } = useController({ control: form.control, name: 'tags' });
  const [text, setText] = useState((field.value ?? []).join(', '));
  // Zod names the tag, the form the whole of them.
  const wrong: unknown = form.formState.errors.tags;
  return (
    <TextField
      className="is-3"
      label="Tags, with commas between them"
      value={text}
      error={messageOf(Array.isArray(wrong) ? wrong.find(Boolean) : wrong)}
      onChange={({ target }) => {
        setText(target.value);
        const tags = target.value.split(',').map((tag) => tag.trim());
        field.onChange([...new Set(tags.filter(Boolean))]);
      }}
    />
  );
}

function messageOf(fault: unknown): string | undefined {
  return (fault as { message?: string } | undefined)?.message;
}
