import { useEffect } from 'react';
import { useQueryClient } from '@tanstack/react-query';
import { useNavigate } from 'react-router';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import type { ProgressAction } from '@driprail/shared/domain/board/progress';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { keepDays } from '../api/run-sheet.queries.ts';
import { isWalkDue } from '../components/walk-line.tsx';

type Marked = ProgressAction | 'undo';

/** Marks a visit; must-knows that nobody has confirmed, or what Done still needs, come first, on the job's page. */
export function useMark(
  { day, visits }: RunSheetDto,
  mark: (press: { visit: RunVisitDto; kind: Marked }) => void,
  askWalk: (visit: RunVisitDto) => void,
) {
  const client = useQueryClient();
  const navigate = useNavigate();
  const { user } = useSession();
  const today = useToday();
  // Fetched after the first screen has painted, so that a dead zone finds them on the phone.
  const plans = visits.map((visit) => `${visit.id}:${visit.planVersion}`).join(' ');
  useEffect(() => {
    void keepDays(client, user.id, addDays(today, 1));
    void jobWork().then((work) => work?.keepWork(client, user.id, [today, addDays(today, 1)]));
    void billing().then((bills) => bills?.keepBills(client, user.id, today));
  }, [client, user.id, today, plans]);
  const visitIds = visits.map((visit) => visit.id).join(' ');
  useEffect(() => {
    void walkRound().then((walk) => walk?.keepWalkSheets(client, user.id, visitIds.split(' ').filter(Boolean)));
  }, [client, user.id, visitIds]);
  return async (visit: RunVisitDto, kind: Marked) => {
    const work = kind === 'start_work' || kind === 'finish' ? await jobWork() : null;
    const part = await work?.partBefore(client, { userId: user.id, day, visitId: visit.id, kind });
    if (part) void navigate(paths.work(day, visit.id, part));
    else if (kind === 'start_work' && isWalkDue(visit)) askWalk(visit);
    else mark({ visit, kind });
  };
}

/** Null when it can't be fetched: then the server judges alone. */
function jobWork() {
  return import('../../job-work/index.ts').catch(() => null);
}

function billing() {
  return import('../../billing/index.ts').catch(() => null);
}

function walkRound() {
  return import('../../walk-round/index.ts').catch(() => null);
}

function useToday(): string {
  const { zone } = useSession().company;
  return dayOf(useNow(), zone);
}
