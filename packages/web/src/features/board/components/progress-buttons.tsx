import { useState } from 'react';
import { useMutation, useQueryClient } from '@tanstack/react-query';
import { v4 as uuid } from 'uuid';
import { postVisitAction } from '@driprail/shared/contracts/run-sheet.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import { actionNames, nextActions } from '@driprail/shared/domain/board/progress';
import { skipReasons } from '@driprail/shared/domain/walk-round/views';
import { Button } from '../../../components/button.tsx';
import { SelectField } from '../../../components/field.tsx';
import { call } from '../../../lib/call.ts';
import { deviceOffsetMs } from '../../../lib/device-clock.ts';

/** Marks progress for a crew whose phone can't; part done and calling off have their own ways. */
export function ProgressButtons({ visit }: { visit: VisitDto }) {
  const client = useQueryClient();
  const mark = useMutation({
    mutationFn: (action: { kind: ProgressAction; key: string; reason: string }) =>
      call(postVisitAction, {
        params: { id: visit.id },
        body: { ...action, deviceAt: new Date().toISOString(), offsetMs: deviceOffsetMs() },
      }),
    onSettled: () =>
      Promise.all([
        client.invalidateQueries({ queryKey: ['board'] }),
        client.invalidateQueries({ queryKey: ['jobs'] }),
      ]),
  });
  const [reason, setReason] = useState('');
  const isWalkDue = visit.progress === 'on_site' && visit.walkRound.made < visit.walkRound.cars;
  const actions = nextActions(visit.progress).filter((action) => action !== 'part_done' && action !== 'call_off');
  if (actions.length === 0) return null;
  return (
    <section>
      <h3 className="sec">
        Mark for the crew <span>when their phone can’t</span>
      </h3>
      {isWalkDue ? (
        <SelectField
          className="mt-2"
          label="No walk-round is made. Work starts without it because"
          value={reason}
          onChange={(event) => setReason(event.target.value)}
        >
          <option value="">Choose a reason</option>
          {skipReasons.map((word) => (
            <option key={word}>{word}</option>
          ))}
        </SelectField>
      ) : null}
      <div className="flex flex-wrap gap-2 mt-2">
        {actions.map((kind) => (
          <Button
            key={kind}
            isBusy={mark.isPending}
            disabled={kind === 'start_work' && isWalkDue && reason === ''}
            onClick={() => mark.mutate({ kind, key: uuid(), reason: kind === 'start_work' && isWalkDue ? reason : '' })}
          >
            {actionNames[kind]}
          </Button>
        ))}
      </div>
      {mark.error ? <p className="tape mt-2">{mark.error.message}</p> : null}
    </section>
  );
}
