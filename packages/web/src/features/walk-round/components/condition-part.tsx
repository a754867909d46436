import { conditions, interiorNames, paintNames } from '@driprail/shared/domain/walk-round/condition';
import { TextField } from '../../../components/field.tsx';
import { Picks } from '../../../components/picks.tsx';
import { useSession } from '../../../lib/session.tsx';
import type { WalkDraft } from './walk-draft.ts';
import { readOdometer } from './walk-draft.ts';

const yesNo = ['yes', 'no'] as const;
const wordOf = (is: boolean | null) => (is === null ? null : is ? 'yes' : 'no');

/** Yes or no under a question. */
export function YesNo({
  question,
  value,
  names,
  onPick,
}: {
  question: string;
  value: boolean | null;
  names: [yes: string, no: string];
  onPick: (is: boolean) => void;
}) {
  return (
    <div role="group" aria-label={question}>
      <h2 className="sec">{question}</h2>
      <Picks
        options={yesNo}
        value={wordOf(value)}
        nameOf={(word) => (word === 'yes' ? names[0] : names[1])}
        onPick={(word) => onPick(word === 'yes')}
        className="grid grid-cols-2 gap-2 my-2"
      />
    </div>
  );
}

/** How the car is, in picks; only the odometer is typed. */
export function ConditionPart({ draft, onChange }: { draft: WalkDraft; onChange: (draft: WalkDraft) => void }) {
  const { company } = useSession();
  return (
    <>
      <div role="group" aria-label="Paint">
        <h2 className="sec">Paint</h2>
        <Picks
          options={conditions}
          value={draft.paint}
          nameOf={(step) => paintNames[step]}
          onPick={(paint) => onChange({ ...draft, paint })}
          className="grid grid-cols-3 gap-2 my-2"
        />
      </div>
      <div role="group" aria-label="Interior">
        <h2 className="sec">Interior</h2>
        <Picks
          options={conditions}
          value={draft.interior}
          nameOf={(step) => interiorNames[step]}
          onPick={(interior) => onChange({ ...draft, interior })}
          className="grid grid-cols-3 gap-2 my-2"
        />
      </div>
      <TextField
        className="my-3"
        label={`Odometer, ${company.units === 'us' ? 'miles' : 'km'}, if it shows`}
        inputMode="numeric"
        value={draft.odometer}
        error={
          readOdometer(draft.odometer) === undefined ? 'Give whole numbers, like 41200, or leave it empty.' : undefined
        }
        onChange={(event) => onChange({ ...draft, odometer: event.target.value })}
      />
      <YesNo
        question="Personal items in the car"
        value={draft.hasItems}
        names={['Yes', 'None seen']}
        onPick={(hasItems) => onChange({ ...draft, hasItems, itemsNote: hasItems ? draft.itemsNote : '' })}
      />
      {draft.hasItems ? (
        <TextField
          label="Which, and where they go"
          value={draft.itemsNote}
          maxLength={300}
          onChange={(event) => onChange({ ...draft, itemsNote: event.target.value })}
        />
      ) : null}
    </>
  );
}
