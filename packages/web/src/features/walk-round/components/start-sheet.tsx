import { useState } from 'react';
import { Link } from 'react-router';
import { skipReasons } from '@driprail/shared/domain/walk-round/views';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Picks } from '../../../components/picks.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';

/** Start work was pressed and no walk-round is made: make it, or say why not. The board shows the reason. */
export function StartSheet({
  visitId,
  customerName,
  onStart,
  onClose,
}: {
  visitId: string;
  customerName: string;
  onStart: (reason: string) => void;
  onClose: () => void;
}) {
  const [reason, setReason] = useState<string | null>(null);
  return (
    <Sheet title="No walk-round yet" onClose={onClose} width={460}>
      <div className="ph-sheet">
        <p className="mb-3">
          Nobody has put down how the car of {customerName} came. Once work starts, marks can only be added with their
          time.
        </p>
        <Link className="ph-main" to={paths.walkRound(visitId)}>
          Make the walk-round
        </Link>
        <h3 className="sec mt-4">Or start without it, because</h3>
        <Picks options={skipReasons} value={reason} onPick={setReason} className="grid grid-cols-2 gap-2 my-2" />
      </div>
      <SheetFoot>
        <Button onClick={onClose}>Not yet</Button>
        <Button disabled={reason === null} onClick={() => reason && onStart(reason)}>
          Start without it
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
