import { useState } from 'react';
import type { LookOutcome } from '@driprail/shared/domain/walk-round/condition';
import { lookOutcomeNames, lookOutcomes } from '@driprail/shared/domain/walk-round/condition';
import { Icon } from '../../../components/icon.tsx';
import { Picks } from '../../../components/picks.tsx';
import type { useTaking } from '../photo/use-taking.ts';
import { PhotoButton } from './photo-button.tsx';

/** What was too dirty to see is looked at again: after the wash, before any machine touches the paint. */
export function SecondLook({
  taking,
  onAnswer,
}: {
  taking: ReturnType<typeof useTaking>;
  onAnswer: (outcome: LookOutcome) => void;
}) {
  const [outcome, setOutcome] = useState<LookOutcome | null>(null);
  return (
    <section className="caution" aria-label="Second look">
      <p>
        <b>Second look.</b> The car was too dirty to see. Look at it after the wash, before any machine.
      </p>
      <PhotoButton
        className="btn w-full my-2"
        isCamera
        isBusy={taking.isBusy}
        onFile={(file) => void taking.take(file, 'extra', 'second_look')}
      >
        <Icon name="camera" /> Photo of the clean paint
      </PhotoButton>
      <Picks
        options={lookOutcomes}
        value={outcome}
        nameOf={(word) => lookOutcomeNames[word]}
        onPick={setOutcome}
        className="grid grid-cols-2 gap-2 my-2"
      />
      <button
        type="button"
        className="btn seal w-full"
        disabled={outcome === null}
        onClick={() => outcome && onAnswer(outcome)}
      >
        <span>Second look done</span>
      </button>
    </section>
  );
}
