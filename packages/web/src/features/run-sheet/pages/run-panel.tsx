import { Suspense, lazy } from 'react';
import type { RunSheetDto, RunVisitDto } from '@driprail/shared/contracts/run-sheet.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import { lazyPage } from '../../../app/lazy-page.ts';
import { paths } from '../../../app/paths.ts';
import { Sheet } from '../../../components/sheet.tsx';
import type { usePressVisit } from '../api/run-sheet.queries.ts';
import { NextCard } from '../components/next-card.tsx';

// Sheets come after the first screen has painted; the worker keeps them for a dead zone.
const TroubleSheet = lazyPage(async () => (await import('../components/trouble-sheet.tsx')).TroubleSheet);
const PartDoneSheet = lazyPage(async () => (await import('../components/part-done-sheet.tsx')).PartDoneSheet);
const TipSheet = lazyPage(async () => (await import('../components/tip-sheet.tsx')).TipSheet);

const StartSheet = lazy(async () => ({ default: (await import('../../walk-round/index.ts')).StartSheet }));

export interface Panel {
  kind: 'trouble' | 'part_done' | 'tip' | 'look' | 'start';
  visitId: string;
}

/** What opens over the run sheet for one visit. */
export function RunPanel({
  sheet,
  visit,
  kind,
  now,
  press,
  onPanel,
}: {
  sheet: RunSheetDto;
  visit: RunVisitDto;
  kind: Panel['kind'];
  now: string;
  press: ReturnType<typeof usePressVisit>;
  onPanel: (panel: Panel | null) => void;
}) {
  const close = () => {
    press.reset();
    onPanel(null);
  };
  const shared = { visit, isBusy: press.isPending, error: press.error?.message, onClose: close };
  switch (kind) {
    case 'trouble':
      return (
        <Suspense>
          <TroubleSheet
            {...shared}
            next={sheet.visits.slice(sheet.visits.indexOf(visit) + 1).find((later) => !isEnded(later.progress))}
            onSend={(trouble) => press.mutate({ visit, kind, ...trouble }, { onSuccess: close })}
            onCallOff={(trouble) => press.mutate({ visit, kind: 'call_off', ...trouble }, { onSuccess: close })}
          />
        </Suspense>
      );
    case 'part_done':
      return (
        <Suspense>
          <PartDoneSheet {...shared} onSend={(part) => press.mutate({ visit, kind, ...part }, { onSuccess: close })} />
        </Suspense>
      );
    case 'start':
      return (
        <Suspense>
          <StartSheet
            visitId={visit.id}
            customerName={visit.customerName}
            onClose={close}
            onStart={(reason) => press.mutate({ visit, kind: 'start_work', reason }, { onSuccess: close })}
          />
        </Suspense>
      );
    case 'tip':
      return (
        <Suspense>
          <TipSheet visit={visit} tipsGoTo={sheet.tipsGoTo} onClose={close} />
        </Suspense>
      );
    case 'look':
      return (
        <Sheet title={visit.customerName} onClose={close} width={480}>
          <div className="ph-sheet pb-4">
            <NextCard
              visit={visit}
              now={now}
              workPath={paths.work(sheet.day, visit.id)}
              collectPath={paths.collect(sheet.day, visit.id)}
              onTrouble={() => onPanel({ kind: 'trouble', visitId: visit.id })}
              onTip={() => onPanel({ kind: 'tip', visitId: visit.id })}
            />
          </div>
        </Sheet>
      );
  }
}
