import { useState } from 'react';
import { v4 as uuid } from 'uuid';
import type { MarkBody } from '@driprail/shared/contracts/walk-round.contract';
import { markKindNames, markKinds, markSizeNames, markSizes } from '@driprail/shared/domain/walk-round/marks';
import { middleOf, placeAt, placeNames } from '@driprail/shared/domain/walk-round/places';
import { Button } from '../../../components/button.tsx';
import { SelectField, TextField } from '../../../components/field.tsx';
import { Picks } from '../../../components/picks.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';

/** A new mark where the outline was touched; without a touch the place is picked from the list. */
export function newMark(at: { x: number; y: number } | null): MarkBody {
  const { x, y } = at ?? { x: 500, y: 500 };
  const place = at ? placeAt(x, y) : '';
  return { id: uuid(), x, y, place, kind: 'scratch', size: 'small', note: '', carriedFrom: null, answer: null };
}

/** What a mark is, how large, and where. Nothing must be typed. */
export function MarkSheet({
  mark,
  isKnown,
  onSave,
  onRemove,
  onClose,
}: {
  mark: MarkBody;
  /** It is in the list already, and may be taken out. */
  isKnown: boolean;
  onSave: (mark: MarkBody) => void;
  onRemove: () => void;
  onClose: () => void;
}) {
  const [value, setValue] = useState(mark);
  const [isPicked, setPicked] = useState(isKnown);
  const putAt = (place: string) => {
    const middle = middleOf(place);
    // A place that was touched keeps the very spot.
    const spot = placeAt(value.x, value.y) === place ? null : middle;
    setValue({ ...value, place, ...spot });
  };
  return (
    <Sheet title="Mark" onClose={onClose} width={460}>
      <div className="ph-sheet">
        <SelectField label="Where" value={value.place} onChange={(event) => putAt(event.target.value)}>
          {value.place === '' ? <option value="">Choose a place</option> : null}
          {[...new Set([...(value.place === '' ? [] : [value.place]), ...placeNames])].map((place) => (
            <option key={place}>{place}</option>
          ))}
        </SelectField>
        <h3 className="sec mt-3">What it is</h3>
        <Picks
          options={markKinds}
          value={isPicked ? value.kind : null}
          nameOf={(kind) => markKindNames[kind]}
          onPick={(kind) => {
            setPicked(true);
            setValue({ ...value, kind });
          }}
          className="wr-kinds"
        />
        <h3 className="sec mt-3">How large</h3>
        <Picks
          options={markSizes}
          value={value.size}
          nameOf={(size) => markSizeNames[size]}
          onPick={(size) => setValue({ ...value, size })}
          className="grid grid-cols-3 gap-2 my-2"
        />
        <TextField
          label="More, if it helps"
          value={value.note}
          maxLength={300}
          onChange={(event) => setValue({ ...value, note: event.target.value })}
        />
      </div>
      <SheetFoot>
        {isKnown ? <Button onClick={onRemove}>Take it out</Button> : null}
        <Button look="main" disabled={!isPicked || value.place === ''} onClick={() => onSave(value)}>
          {isKnown ? 'Keep the change' : 'Put it down'}
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
