import { useState } from 'react';
import { troubleKinds, troubleNames } from '@driprail/shared/domain/board/trouble';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { nextActions } from '@driprail/shared/domain/board/progress';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';

type Trouble = (typeof troubleKinds)[number];

/** Tells the board what is wrong. In an injury first aid and the emergency number come first. */
export function TroubleSheet({
  visit,
  isBusy,
  error,
  onSend,
  onCallOff,
  onClose,
}: {
  visit: RunVisitDto;
  isBusy: boolean;
  error: string | undefined;
  onSend: (trouble: { trouble: Trouble; reason: string }) => void;
  onCallOff: (trouble: { trouble: Trouble; reason: string }) => void;
  onClose: () => void;
}) {
  const [trouble, setTrouble] = useState<Trouble | null>(null);
  const [note, setNote] = useState('');
  return (
    <Sheet title="Trouble" onClose={onClose} width={460}>
      <div className="ph-sheet">
        <p className="caution">
          <b>Somebody hurt?</b> Help first: call <a href="tel:911">911</a>, give the address below, follow the data
          sheet’s first aid. The board comes after.
        </p>
        <p className="mb-3">
          {visit.address}
          {visit.area ? `, ${visit.area}` : ''}
        </p>
        <div className="grid grid-cols-2 gap-2 mb-3" role="radiogroup" aria-label="What is wrong">
          {troubleKinds.map((kind) => (
            <button
              key={kind}
              type="button"
              role="radio"
              aria-checked={trouble === kind}
              className={trouble === kind ? 'btn is-picked' : 'btn'}
              onClick={() => setTrouble(kind)}
            >
              {troubleNames[kind]}
            </button>
          ))}
        </div>
        <TextField
          label="More, if it helps"
          value={note}
          onChange={(event) => setNote(event.target.value)}
          error={error}
        />
      </div>
      <SheetFoot>
        {nextActions(visit.progress).includes('call_off') ? (
          <Button
            isBusy={isBusy}
            disabled={trouble === null}
            onClick={() =>
              trouble && onCallOff({ trouble, reason: [troubleNames[trouble], note.trim()].filter(Boolean).join(': ') })
            }
          >
            Call the visit off
          </Button>
        ) : null}
        <Button
          look="main"
          isBusy={isBusy}
          disabled={trouble === null}
          onClick={() => trouble && onSend({ trouble, reason: note })}
        >
          Tell the board
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
