import { useState } from 'react';
import { Link } from 'react-router';
import { comesAfterHelp, troubleKinds, troubleNames } from '@driprail/shared/domain/board/trouble';
import type { TroubleKind } from '@driprail/shared/domain/board/trouble';
import type { RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { nextActions } from '@driprail/shared/domain/board/progress';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { useSession } from '../../../lib/session.tsx';
import { LatePart } from './late-part.tsx';
import { troublePicks } from './trouble-picks.ts';

interface TroubleSheetProps {
  visit: RunVisitDto;
  /** The visit after it, whose promise a delay may touch. */
  next: RunVisitDto | undefined;
  isBusy: boolean;
  error: string | undefined;
  onSend: (trouble: { trouble: TroubleKind; reason: string }) => void;
  onCallOff: (trouble: { trouble: TroubleKind; reason: string }) => void;
  onClose: () => void;
}

/** Tells the board what is wrong. When a person is in trouble, the call for help comes before anything else. */
export function TroubleSheet({ visit, next, isBusy, error, onSend, onCallOff, onClose }: TroubleSheetProps) {
  const { company } = useSession();
  const [trouble, setTrouble] = useState<TroubleKind | null>(null);
  const [picked, setPicked] = useState<string[]>([]);
  const [note, setNote] = useState('');
  const isHelpFirst = trouble !== null && comesAfterHelp(trouble);
  const words = [...picked, note.trim()].filter(Boolean).join(', ');
  const pick = (kind: TroubleKind | null) => {
    setTrouble(kind);
    setPicked([]);
  };
  const toggle = (word: string) =>
    setPicked(picked.includes(word) ? picked.filter((one) => one !== word) : [...picked, word]);
  return (
    <Sheet title="Trouble" onClose={onClose} width={460}>
      <div className="ph-sheet">
        <div className={isHelpFirst ? 'caution help-first' : 'caution'} role={isHelpFirst ? 'alert' : undefined}>
          <p>
            <b>{isHelpFirst ? 'First call for help.' : 'Somebody hurt?'}</b>{' '}
            {isHelpFirst ? 'The board comes after.' : 'Help first; the board comes after.'}
          </p>
          {isHelpFirst ? (
            <a className="ph-main" href={`tel:${company.emergencyNumber}`}>
              Call {company.emergencyNumber}
            </a>
          ) : (
            <p>
              Call <a href={`tel:${company.emergencyNumber}`}>{company.emergencyNumber}</a> and give this address:
            </p>
          )}
          <p>
            {visit.address}
            {visit.area ? `, ${visit.area}` : ''}
          </p>
          <Link className="btn" to={paths.firstAid}>
            First help, step by step
          </Link>
        </div>
        <div className="grid grid-cols-2 gap-2 mb-3" role="radiogroup" aria-label="What is wrong">
          {troubleKinds
            .filter((kind) => trouble === null || kind === trouble)
            .map((kind) => (
              <button
                key={kind}
                type="button"
                role="radio"
                aria-checked={trouble === kind}
                className={trouble === kind ? 'btn is-picked' : 'btn'}
                onClick={() => pick(kind === trouble ? null : kind)}
              >
                {troubleNames[kind]}
              </button>
            ))}
          {trouble ? (
            <button type="button" className="btn bare" onClick={() => pick(null)}>
              Something else
            </button>
          ) : null}
        </div>
        {trouble ? (
          <div className="grid grid-cols-2 gap-2 mb-3" role="group" aria-label={`${troubleNames[trouble]}: more`}>
            {troublePicks[trouble].map((word) => (
              <button
                key={word}
                type="button"
                aria-pressed={picked.includes(word)}
                className={picked.includes(word) ? 'btn is-picked' : 'btn'}
                onClick={() => toggle(word)}
              >
                {word}
              </button>
            ))}
          </div>
        ) : null}
        {trouble === 'running_late' ? <LatePart visit={visit} next={next} picked={picked} /> : null}
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
              trouble && onCallOff({ trouble, reason: [troubleNames[trouble], words].filter(Boolean).join(': ') })
            }
          >
            Call the visit off
          </Button>
        ) : null}
        <Button
          look={isHelpFirst ? 'plain' : 'main'}
          isBusy={isBusy}
          disabled={trouble === null}
          onClick={() => trouble && onSend({ trouble, reason: words })}
        >
          Tell the board
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
