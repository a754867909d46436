import { useState } from 'react';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Picks } from '../../../components/picks.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';

interface SaySheetProps {
  title: string;
  label: string;
  action: string;
  picks: readonly string[];
  isBusy: boolean;
  onSay: (words: string) => void;
  onClose: () => void;
}

/** A few words: picked with a thumb, or typed. */
export function SaySheet({ title, label, action, picks, isBusy, onSay, onClose }: SaySheetProps) {
  const [words, setWords] = useState('');
  return (
    <Sheet title={title} onClose={onClose} width={460}>
      <div className="ph-sheet">
        <Picks options={picks} value={words} onPick={setWords} className="grid grid-cols-2 gap-2 mb-3" />
        <TextField label={label} value={words} maxLength={300} onChange={(event) => setWords(event.target.value)} />
      </div>
      <SheetFoot>
        <Button look="main" isBusy={isBusy} disabled={words.trim() === ''} onClick={() => onSay(words.trim())}>
          {action}
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
