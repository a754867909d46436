import { useState } from 'react';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import type { Question } from './use-board-moves.ts';

const picks = ['Customer agreed', 'Spare comes along', 'Only crew free', 'Will be sorted before'];

/** A warning that the owner wants explained: asked once, with picks, and kept with the visit. */
export function ReasonSheet({
  question,
  isBusy,
  onAnswer,
  onClose,
}: {
  question: Question;
  isBusy: boolean;
  onAnswer: (accept: { visitId: string; key: string; reason: string }[]) => void;
  onClose: () => void;
}) {
  const [reasons, setReasons] = useState<Record<string, string>>({});
  const keyOf = (warning: { visitId: string; key: string }) => `${warning.visitId}:${warning.key}`;
  const isAnswered = question.warnings.every((warning) => (reasons[keyOf(warning)] ?? '').trim() !== '');
  return (
    <Sheet title="A reason keeps it" onClose={onClose} width={560}>
      {question.warnings.map((warning) => (
        <div key={keyOf(warning)} className="mb-4">
          <p className="tape mb-2">
            <b>{warning.message}</b>
          </p>
          <div className="flex flex-wrap gap-2 mb-2">
            {picks.map((pick) => (
              <Button key={pick} onClick={() => setReasons({ ...reasons, [keyOf(warning)]: pick })}>
                {pick}
              </Button>
            ))}
          </div>
          <TextField
            label="Reason"
            value={reasons[keyOf(warning)] ?? ''}
            onChange={(event) => setReasons({ ...reasons, [keyOf(warning)]: event.target.value })}
          />
        </div>
      ))}
      <SheetFoot>
        <Button onClick={onClose}>Put back</Button>
        <Button
          look="main"
          isBusy={isBusy}
          disabled={!isAnswered}
          onClick={() =>
            onAnswer(
              question.warnings.map((w) => ({
                visitId: w.visitId,
                key: w.key,
                reason: (reasons[keyOf(w)] ?? '').trim(),
              })),
            )
          }
        >
          Place with this reason
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
