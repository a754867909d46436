import { useState } from 'react';
import type { MessageKindDto } from '@driprail/shared/contracts/message-settings.contract';
import { messageKindMoments, messageKindNames } from '@driprail/shared/domain/messages/kinds';
import { placeholderFault, placeholderNames, placeholders } from '@driprail/shared/domain/messages/placeholders';
import { ourTemplates } from '@driprail/shared/domain/messages/templates';
import { Button } from '../../../components/button.tsx';
import { CheckField, TextArea, TextField } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { usePreview, useSaveKind } from '../api/message-settings.queries.ts';
import { KindPreview } from './kind-preview.tsx';

/** One kind: whether it goes out, its words, and how they read. */
export function KindForm({ kind }: { kind: MessageKindDto }) {
  const [value, setValue] = useState(kind);
  const [save, preview] = [useSaveKind(), usePreview()];
  const refused = { ...fieldsOf(preview.error), ...fieldsOf(save.error) };
  const words = (name: 'subject' | 'body' | 'text') => ({
    value: value[name],
    error: placeholderFault(value[name]) ?? refused[name],
    onChange: (event: React.ChangeEvent<HTMLInputElement | HTMLTextAreaElement>) =>
      setValue({ ...value, [name]: event.target.value }),
  });
  const ours = ourTemplates[kind.kind];
  const isOurs = (['subject', 'body', 'text'] as const).every((name) => value[name] === ours[name]);
  return (
    <form
      className="ms-edit"
      aria-label={messageKindNames[kind.kind]}
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (!save.isPending) save.mutate(value);
      }}
    >
      <div className="grid gap-3">
        <h2 className="sec">{messageKindNames[kind.kind]}</h2>
        <p className="t-2">{messageKindMoments[kind.kind]}</p>
        <CheckField
          label="Goes out"
          checked={value.isOn}
          onChange={(event) => setValue({ ...value, isOn: event.target.checked })}
        />
        <TextField label="Subject of the mail" {...words('subject')} />
        <TextArea label="Words of the mail" rows={11} {...words('body')} />
        <TextArea
          label="Words of the text message"
          rows={3}
          hint="Only to customers who said yes."
          {...words('text')}
        />
        <FormFault error={save.error ?? preview.error} fields={refused} />
        <p className="flex flex-wrap items-center gap-3">
          <Button type="submit" look="main" isBusy={save.isPending}>
            Save words
          </Button>
          <Button isBusy={preview.isPending} onClick={() => preview.mutate(value)}>
            Show how it reads
          </Button>
          {isOurs ? null : (
            <Button look="bare" onClick={() => setValue({ ...value, ...ours })}>
              Back to our words
            </Button>
          )}
          {save.isSuccess ? <span role="status">Saved.</span> : null}
        </p>
        <details>
          <summary>What can stand in braces</summary>
          <dl className="ms-known">
            {placeholders.map((word) => (
              <div key={word}>
                <dt className="inline">
                  <b>{`{${word}}`}</b>
                </dt>{' '}
                <dd className="inline">{placeholderNames[word]}</dd>
              </div>
            ))}
          </dl>
        </details>
      </div>
      <KindPreview shown={preview.data} />
    </form>
  );
}
