import { useState } from 'react';
import type { CustomerPageDto } from '@driprail/shared/contracts/customer-page.contract';
import { Button } from '../../../components/button.tsx';
import { TextArea } from '../../../components/field.tsx';
import { FormFault } from '../../../components/form-fault.tsx';
import { fieldsOf } from '../../../lib/fields.ts';
import { useGiveFeedback } from '../api/customer-page.queries.ts';

const steps = [
  [1, 'Poor'],
  [2, 'Fair'],
  [3, 'Good'],
  [4, 'Great'],
  [5, 'Spotless'],
] as const;

/** How it went: a word of five, and room to say more. Given again it replaces what was said. */
export function CustomerFeedback({ token, given }: { token: string; given: CustomerPageDto['feedback'] }) {
  const [stars, setStars] = useState(given?.stars ?? null);
  const [words, setWords] = useState(given?.words ?? '');
  const [isOpen, setOpen] = useState(given === null);
  const give = useGiveFeedback(token);
  const fields = fieldsOf(give.error);
  if (!isOpen)
    return (
      <section aria-label="How it went">
        <h2 className="sec mt-5">How it went</h2>
        <p className="py-1">
          <b>{steps.find(([value]) => value === given?.stars)?.[1]}.</b> Thank you, {given?.words ? 'we read it.' : ''}{' '}
          <button type="button" className="link" onClick={() => setOpen(true)}>
            Change it
          </button>
        </p>
      </section>
    );
  return (
    <section aria-label="How it went">
      <h2 className="sec mt-5">How did it go?</h2>
      <div className="tips words" role="radiogroup" aria-label="How it went">
        {steps.map(([value, label]) => (
          <button key={value} type="button" role="radio" aria-checked={stars === value} onClick={() => setStars(value)}>
            {label}
          </button>
        ))}
      </div>
      {stars === null ? null : (
        <div className="mt-2">
          <TextArea
            label="Anything to tell us? (may stay empty)"
            value={words}
            rows={3}
            maxLength={2000}
            error={fields['words']}
            onChange={(event) => setWords(event.target.value)}
          />
          <FormFault error={give.error} fields={fields} />
          <Button
            className="w-full mt-2"
            isBusy={give.isPending}
            onClick={() => give.mutate({ stars, words }, { onSuccess: () => setOpen(false) })}
          >
            Send it
          </Button>
        </div>
      )}
    </section>
  );
}
