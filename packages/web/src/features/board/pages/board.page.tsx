import { Suspense, useCallback, useEffect, useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { useNavigate, useParams, useSearchParams } from 'react-router';
import type { JobDto } from '@driprail/shared/contracts/jobs.contract';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { Move } from '@driprail/shared/domain/board/plan';
import { formatClock } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Loaded } from '../../../components/states.tsx';
import { serverNow } from '../../../lib/device-clock.ts';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { useMedia } from '../../../lib/use-media.ts';
import { BillSheet } from '../../billing/index.ts';
import { AddVisitSheet, CallBackSheet, CallOffSheet, JobSheet } from '../../booking/index.ts';
import { CustomerForm } from '../../customers/index.ts';
import { VisitWork, useWorkNeeds } from '../../job-work/index.ts';
import { boardQuery } from '../api/board.queries.ts';
import { BoardCalendar } from '../components/board-calendar.tsx';
import { BoardHead } from '../components/board-head.tsx';
import { isPlacedVisit, preview } from '../components/board-model.ts';
import { CrewSheet } from '../components/crew-sheet.tsx';
import { LaneList } from '../components/lane-list.tsx';
import { Needs } from '../components/needs.tsx';
import type { Need } from '../components/needs.tsx';
import { ReasonSheet } from '../components/reason-sheet.tsx';
import { Roof } from '../components/roof.tsx';
import { Sill } from '../components/sill.tsx';
import { useBoardMoves } from '../components/use-board-moves.ts';
import { useHeld } from '../components/use-held.ts';
import { VisitSheet } from '../components/visit-sheet.tsx';
import './board.css';

type JobTask =
  { kind: 'new' } | { kind: 'edit' | 'copy' | 'callOff' | 'addVisit' | 'bill' | 'callBack'; jobId: string };

/** The day by vans. */
export function BoardPage() {
  const { zone } = useSession().company;
  const { day = dayOf(serverNow().toISOString(), zone) } = useParams();
  const board = useQuery(boardQuery(day));
  return (
    <Loaded query={board} what="the board">
      {(data) => <Board key={zone} board={data} />}
    </Loaded>
  );
}

function Board({ board }: { board: BoardDto }) {
  const navigate = useNavigate();
  const [search, setSearch] = useSearchParams();
  const now = useNow();
  const isWide = useMedia('(min-width: 901px)');
  const [filter, setFilter] = useState('');
  const [hover, setHover] = useState<string | null>(null);
  const [crewVanId, setCrewVanId] = useState<string | null>(null);
  const [task, setTask] = useState<JobTask | null>(null);
  const moves = useBoardMoves(board);

  const all = [...board.visits, ...board.unplaced];
  const wanted = search.get('visit') ?? all.find((v) => v.jobId === search.get('job'))?.id ?? null;
  const open = all.find((visit) => visit.id === wanted) ?? null;
  const setOpen = useCallback(
    (visitId: string | null) => setSearch(visitId ? { visit: visitId } : {}, { replace: true }),
    [setSearch],
  );
  const workNeeds = useWorkNeeds(board.day);
  const openNeed = ({ visitId, day }: Need) => {
    if (day && day !== board.day) void navigate(`${paths.boardDay(day)}?visit=${visitId}`);
    else setOpen(visitId);
  };
  const held = useHeld({ board, now, moves, onOpen: setOpen });

  const goTo = useCallback((next: string) => void navigate(paths.boardDay(next)), [navigate]);
  useBoardKeys({ onUndo: () => void moves.undo(), onClose: () => setOpen(null), isOpen: open !== null && !held.held });

  const move = useCallback(
    (next: Move) => {
      setHover(null);
      const visit = [...board.visits, ...board.unplaced].find((v) => v.id === next.visitId);
      const van = board.vans.find((v) => v.id === next.vanId);
      const words =
        van && next.from
          ? `${visit?.customerName ?? ''} is on ${van.name} at ${formatClock(next.from, board.zone, board.clock)}.`
          : `${visit?.customerName ?? ''} is back on Unplaced.`;
      void moves.save([next], words);
    },
    [board, moves],
  );
  const hoverOver = useCallback((next: Move | null) => setHover(next && hoverWords(board, next)), [board]);
  const step = (by: 1 | -1) => {
    const row = board.visits.filter(isPlacedVisit).sort((a, b) => Date.parse(a.from) - Date.parse(b.from));
    const lane = open?.vanId ? row.filter((visit) => visit.vanId === open.vanId) : board.unplaced;
    const next = lane[lane.findIndex((visit) => visit.id === open?.id) + by];
    if (next) setOpen(next.id);
  };
  const crewVan = board.vans.find((van) => van.id === crewVanId);

  return (
    <main className={open ? 'board-page has-open' : 'board-page'} id="main" onKeyDown={held.onKeyDown}>
      <div className="roof">
        <BoardHead
          board={board}
          now={now}
          filter={filter}
          onFilter={setFilter}
          onDay={goTo}
          onNew={() => setTask({ kind: 'new' })}
        />
        <Roof board={board} filter={filter} heldId={held.held?.visitId ?? null} isDraggable={isWide} onOpen={setOpen} />
        <Needs board={board} now={now} first={workNeeds} onOpen={openNeed} />
      </div>
      <div className="board">
        <div className="rail" />
        {board.vans.length === 0 ? (
          <p className="empty">No vans yet. Add the first under Vans, then set its crew here.</p>
        ) : isWide ? (
          <BoardCalendar
            board={board}
            now={now}
            filter={filter}
            openId={open?.id ?? null}
            held={held.held}
            onOpen={setOpen}
            onCrew={setCrewVanId}
            onHover={hoverOver}
            onMove={move}
          />
        ) : (
          <LaneList board={board} now={now} filter={filter} onOpen={setOpen} onCrew={setCrewVanId} />
        )}
        {open ? (
          <VisitSheet
            board={board}
            visit={open}
            isBusy={false}
            work={<VisitWork visitId={open.id} />}
            onMove={(next, words) => {
              void moves.save([next], words).then((isSaved) => {
                if (isSaved && next.from && dayOf(next.from, board.zone) !== board.day)
                  goTo(dayOf(next.from, board.zone));
              });
            }}
            onClose={() => setOpen(null)}
            onStep={step}
            onEdit={(jobId) => setTask({ kind: 'edit', jobId })}
            onCopy={(jobId) => setTask({ kind: 'copy', jobId })}
            onCallOff={(jobId) => setTask({ kind: 'callOff', jobId })}
            onAddVisit={(jobId) => setTask({ kind: 'addVisit', jobId })}
            onCallBack={(jobId) => setTask({ kind: 'callBack', jobId })}
            onBill={(jobId) => setTask({ kind: 'bill', jobId })}
          />
        ) : null}
      </div>
      <Sill
        board={board}
        hover={held.words ?? hover}
        notice={moves.notice}
        heldName={held.heldName}
        canUndo={moves.canUndo}
        onUndo={() => void moves.undo()}
        onDismiss={() => moves.setNotice(null)}
      />
      {moves.question ? (
        <ReasonSheet
          question={moves.question}
          isBusy={false}
          onClose={moves.closeQuestion}
          onAnswer={(accept) => void moves.save(moves.question?.moves ?? [], 'Placed with a reason.', accept)}
        />
      ) : null}
      {crewVan ? <CrewSheet board={board} van={crewVan} onClose={() => setCrewVanId(null)} /> : null}
      <JobTasks
        task={task}
        day={board.day}
        visits={board}
        onClose={() => setTask(null)}
        onMade={(visitId) => setOpen(visitId)}
      />
    </main>
  );
}

function JobTasks({
  task,
  day,
  visits,
  onClose,
  onMade,
}: {
  task: JobTask | null;
  day: string;
  visits: BoardDto;
  onClose: () => void;
  onMade: (visitId: string) => void;
}) {
  if (!task) return null;
  if (task.kind === 'bill')
    return (
      <Suspense>
        <BillSheet jobId={task.jobId} onClose={onClose} />
      </Suspense>
    );
  if (task.kind === 'callOff') return <CallOffSheet jobId={task.jobId} onClose={onClose} />;
  if (task.kind === 'addVisit')
    return <AddVisitSheet jobId={task.jobId} visits={[...visits.visits, ...visits.unplaced]} onClose={onClose} />;
  const show = (job: JobDto) => {
    onClose();
    const visit = job.visits.find((v) => v.progress === 'unplaced') ?? job.visits[0];
    if (visit) onMade(visit.id);
  };
  if (task.kind === 'callBack') return <CallBackSheet jobId={task.jobId} day={day} onClose={onClose} onMade={show} />;
  return (
    <JobSheet
      jobId={task.kind === 'new' ? null : task.jobId}
      isCopy={task.kind === 'copy'}
      day={day}
      newCustomer={({ name, onSaved, onCancel }) => (
        <CustomerForm customer={null} name={name} onSaved={onSaved} onCancel={onCancel} />
      )}
      onClose={onClose}
      onSaved={show}
    />
  );
}

function hoverWords(board: BoardDto, move: Move): string {
  const visit = [...board.visits, ...board.unplaced].find((v) => v.id === move.visitId);
  const van = board.vans.find((v) => v.id === move.vanId);
  if (!visit || !van || !move.from) return '';
  const { refusals, warnings } = preview(board, move);
  const fit = refusals[0]?.message ?? (warnings.length > 0 ? warnings.map((w) => w.message).join(' ') : 'Fits.');
  return `${visit.customerName}, ${van.name} ${formatClock(move.from, board.zone, board.clock)}. ${fit}`;
}

/** Keys of the whole page: undo, and Esc for the open ticket. */
function useBoardKeys({ onUndo, onClose, isOpen }: { onUndo: () => void; onClose: () => void; isOpen: boolean }): void {
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      const isTyping = event.target instanceof HTMLElement && event.target.closest('input, textarea, select, dialog');
      if (isTyping) return;
      if ((event.ctrlKey || event.metaKey) && event.key === 'z') onUndo();
      else if (event.key === 'Escape' && isOpen) onClose();
    };
    document.addEventListener('keydown', press);
    return () => document.removeEventListener('keydown', press);
  });
}
