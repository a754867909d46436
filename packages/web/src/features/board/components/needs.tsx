import { useState } from 'react';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { settleTrouble } from '@driprail/shared/contracts/board.contract';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import { CLASH, clashName, troubleNames } from '@driprail/shared/domain/board/trouble';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { TextField } from '../../../components/field.tsx';
import { Mark } from '../../../components/icon.tsx';
import { Sheet, SheetFoot } from '../../../components/sheet.tsx';
import { call } from '../../../lib/call.ts';
import { isPlacedVisit, lateOf, standingWarnings } from './board-model.ts';

export interface Need {
  key: string;
  visitId: string;
  who: string;
  words: string;
  troubleId?: string;
  /** Of another day's board. */
  day?: string | null;
}
const SHOWN = 3;

/** What needs somebody: trouble first, then who is late, then plans that do not fit. Each opens its visit. */
export function needsOf(board: BoardDto, now: string): Need[] {
  const name = (visitId: string) =>
    [...board.visits, ...board.unplaced].find((v) => v.id === visitId)?.customerName ?? '';
  const troubles = board.troubles.map((t) => ({
    key: t.id,
    visitId: t.visitId,
    troubleId: t.id,
    who: name(t.visitId),
    words: [troubleName(t.kind), t.note].filter(Boolean).join(': '),
  }));
  const late = board.visits
    .filter(isPlacedVisit)
    .map((visit) => ({ visit, minutes: lateOf(visit, now) }))
    .filter(({ minutes }) => minutes >= 5)
    .sort((a, b) => b.minutes - a.minutes)
    .map(({ visit, minutes }) => ({
      key: `late:${visit.id}`,
      visitId: visit.id,
      who: visit.customerName,
      words: `${formatMinutes(minutes)} ${visit.progress === 'working' || visit.progress === 'on_site' ? 'over the plan' : 'late'}`,
    }));
  const warnings = standingWarnings(board).map((w) => ({
    key: `${w.visitId}:${w.key}`,
    visitId: w.visitId,
    who: name(w.visitId),
    words: w.message,
  }));
  return [...troubles, ...late, ...warnings];
}

interface NeedsProps {
  board: BoardDto;
  now: string;
  /** From the crews; somebody waits at the car. */
  first: Need[];
  onOpen: (need: Need) => void;
}

export function Needs({ board, now, first, onOpen }: NeedsProps) {
  const [isAll, setAll] = useState(false);
  const [settling, setSettling] = useState<Need | null>(null);
  const needs = [...first, ...needsOf(board, now)];
  if (needs.length === 0) return <section className="need" aria-label="What needs you" />;
  const shown = isAll ? needs : needs.slice(0, SHOWN);
  return (
    <section className="need" aria-label="What needs you">
      <h2>
        {needs.length} need{needs.length === 1 ? 's' : ''} you
      </h2>
      <div className={isAll ? 'tape is-all' : 'tape'}>
        {shown.map((need) => (
          <p key={need.key}>
            <Mark name={need.troubleId ? 'm-off' : 'm-late'} />
            <button type="button" className="link" onClick={() => onOpen(need)}>
              {need.who}
            </button>
            <span>
              {need.words}{' '}
              {need.troubleId ? (
                <button type="button" className="link" onClick={() => setSettling(need)}>
                  Settle
                </button>
              ) : null}
            </span>
          </p>
        ))}
        {needs.length > SHOWN ? (
          <button type="button" className="link more" onClick={() => setAll(!isAll)}>
            {isAll ? 'Fewer' : `and ${needs.length - SHOWN} more`}
          </button>
        ) : null}
      </div>
      {settling?.troubleId ? (
        <SettleSheet need={settling} troubleId={settling.troubleId} onClose={() => setSettling(null)} />
      ) : null}
    </section>
  );
}

function troubleName(kind: string): string {
  return kind === CLASH ? clashName : (troubleNames[kind as keyof typeof troubleNames] ?? kind);
}

const picks = ['Customer called', 'Moved to another day', 'Crew carries on', 'Called off'];

function SettleSheet({ need, troubleId, onClose }: { need: Need; troubleId: string; onClose: () => void }) {
  const client = useQueryClient();
  const [outcome, setOutcome] = useState('');
  const settle = useMutation({
    mutationFn: () => call(settleTrouble, { params: { id: troubleId }, body: { outcome } }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['board'] }).then(onClose),
  });
  return (
    <Sheet title="Settle" onClose={onClose} width={480}>
      <p className="mb-3">
        <b>{need.who}</b>. {need.words}
      </p>
      <div className="flex flex-wrap gap-2 mb-3">
        {picks.map((pick) => (
          <Button key={pick} onClick={() => setOutcome(pick)}>
            {pick}
          </Button>
        ))}
      </div>
      <TextField
        label="How it was settled"
        value={outcome}
        onChange={(event) => setOutcome(event.target.value)}
        error={settle.error?.message}
      />
      <SheetFoot>
        <Button look="main" isBusy={settle.isPending} disabled={outcome.trim() === ''} onClick={() => settle.mutate()}>
          Mark as settled
        </Button>
      </SheetFoot>
    </Sheet>
  );
}
