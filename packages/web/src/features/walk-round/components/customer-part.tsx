import { absentReasons } from '@driprail/shared/domain/walk-round/condition';
import { Picks } from '../../../components/picks.tsx';
import { YesNo } from './condition-part.tsx';
import { Signature } from './signature.tsx';
import type { WalkDraft } from './walk-draft.ts';

/** The customer's part: may the car be moved, and initials, or why there are none. */
export function CustomerPart({ draft, onChange }: { draft: WalkDraft; onChange: (draft: WalkDraft) => void }) {
  return (
    <>
      <YesNo
        question="May the crew move the car"
        value={draft.mayMove}
        names={['Yes', 'No, it stays']}
        onPick={(mayMove) => onChange({ ...draft, mayMove })}
      />
      <h2 className="sec">The customer’s initials</h2>
      <p className="t-2 my-1">For the marks and the condition put down here.</p>
      <Signature
        key={draft.absentReason === '' ? 'pad' : 'absent'}
        value={draft.initials}
        onChange={(initials) => onChange({ ...draft, initials, absentReason: initials ? '' : draft.absentReason })}
      />
      <div role="group" aria-label="Customer not present">
        <h2 className="sec mt-3">Customer not present</h2>
        <Picks
          options={absentReasons}
          value={absentReasons.find((reason) => reason === draft.absentReason) ?? null}
          onPick={(absentReason) => onChange({ ...draft, absentReason, initials: null })}
          className="grid grid-cols-2 gap-2 my-2"
        />
      </div>
    </>
  );
}
