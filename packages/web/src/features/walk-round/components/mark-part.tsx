import { useState } from 'react';
import type { MarkBody } from '@driprail/shared/contracts/walk-round.contract';
import { bodies, bodyNames } from '@driprail/shared/domain/walk-round/body';
import { CheckField, SelectField } from '../../../components/field.tsx';
import { LastMarks } from './last-marks.tsx';
import { MarkList } from './mark-list.tsx';
import { MarkSheet, newMark } from './mark-sheet.tsx';
import { Outline } from './outline.tsx';
import type { ShownCar } from './shown-walk.ts';
import type { WalkDraft } from './walk-draft.ts';

/** Marks are put down by touching the outline, or from a list of places. */
export function MarkPart({
  car,
  draft,
  onChange,
}: {
  car: ShownCar;
  draft: WalkDraft;
  onChange: (draft: WalkDraft) => void;
}) {
  const [open, setOpen] = useState<MarkBody | null>(null);
  const isKnown = draft.marks.some((mark) => mark.id === open?.id);
  const put = (marks: MarkBody[]) => {
    onChange({ ...draft, marks });
    setOpen(null);
  };
  return (
    <>
      <LastMarks
        last={car.lastMarks}
        lastAt={car.lastAt}
        marks={draft.marks}
        onChange={(marks) => onChange({ ...draft, marks })}
      />
      <p className="t-2 my-2">Touch the place of each mark.</p>
      <Outline body={draft.body} marks={draft.marks} onPlace={(x, y) => setOpen(newMark({ x, y }))} />
      <button type="button" className="btn w-full my-2" onClick={() => setOpen(newMark(null))}>
        Add a mark from a list of places
      </button>
      <MarkList marks={draft.marks} onOpen={setOpen} />
      <CheckField
        label="Too dirty to see. Look again after the wash, before any machine."
        checked={draft.isTooDirty}
        onChange={(event) => onChange({ ...draft, isTooDirty: event.target.checked })}
      />
      <SelectField
        label="Outline"
        value={draft.body}
        onChange={(event) =>
          onChange({ ...draft, body: bodies.find((body) => body === event.target.value) ?? draft.body })
        }
      >
        {bodies.map((body) => (
          <option key={body} value={body}>
            {bodyNames[body]}
          </option>
        ))}
      </SelectField>
      {open ? (
        <MarkSheet
          mark={open}
          isKnown={isKnown}
          onClose={() => setOpen(null)}
          onRemove={() => put(draft.marks.filter((mark) => mark.id !== open.id))}
          onSave={(mark) =>
            put(isKnown ? draft.marks.map((other) => (other.id === mark.id ? mark : other)) : [...draft.marks, mark])
          }
        />
      ) : null}
    </>
  );
}
