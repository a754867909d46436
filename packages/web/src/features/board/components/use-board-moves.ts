import { useCallback, useMemo, useState } from 'react';
import type { BoardDto } from '@driprail/shared/contracts/board.contract';
import type { VisitDto } from '@driprail/shared/contracts/visit.dto';
import type { Finding } from '@driprail/shared/domain/board/findings';
import type { Move } from '@driprail/shared/domain/board/plan';
import { ApiError } from '../../../lib/call.ts';
import { useMoveVisits } from '../api/use-move-visits.ts';

export interface Notice {
  text: string;
  isTrouble: boolean;
}
export interface Question {
  moves: Move[];
  warnings: Finding[];
}
const UNDO_DEPTH = 20;

/** Moves on one day's board: saving, asking for reasons, saying what was refused, and taking moves back. */
export function useBoardMoves(board: BoardDto | undefined) {
  const { mutateAsync } = useMoveVisits();
  const [notice, setNotice] = useState<Notice | null>(null);
  const [question, setQuestion] = useState<Question | null>(null);
  const [undoable, setUndoable] = useState<Move[][]>([]);

  const save = useCallback(
    async (
      moves: Move[],
      words: string,
      accept: { visitId: string; key: string; reason: string }[] = [],
      isUndo = false,
    ): Promise<boolean> => {
      if (!board) return false;
      const known = [...board.visits, ...board.unplaced];
      const before = moves.flatMap((move) => known.find((visit) => visit.id === move.visitId) ?? []);
      const versioned = moves.map((move) => ({
        ...move,
        planVersion: before.find((v) => v.id === move.visitId)?.planVersion ?? 0,
      }));
      try {
        await mutateAsync({ day: board.day, moves: versioned, accept });
        setNotice({ text: words, isTrouble: false });
        setQuestion(null);
        if (!isUndo) setUndoable((stack) => [...stack.slice(1 - UNDO_DEPTH), before.map(planOf)]);
        return true;
      } catch (error) {
        if (error instanceof ApiError && error.code === 'needs_reason')
          setQuestion({ moves, warnings: error.hint.warnings ?? [] });
        else setNotice({ text: error instanceof Error ? error.message : 'That move was not saved.', isTrouble: true });
        return false;
      }
    },
    [board, mutateAsync],
  );

  const undo = useCallback(async () => {
    const moves = undoable.at(-1);
    if (!moves) return;
    setUndoable((stack) => stack.slice(0, -1));
    await save(moves, 'The last move is taken back.', [], true);
  }, [undoable, save]);

  const canUndo = undoable.length > 0;
  return useMemo(
    () => ({ save, undo, canUndo, notice, setNotice, question, closeQuestion: () => setQuestion(null) }),
    [save, undo, canUndo, notice, question],
  );
}
export type BoardMoves = ReturnType<typeof useBoardMoves>;

function planOf(visit: VisitDto): Move {
  return { visitId: visit.id, vanId: visit.vanId, from: visit.from, to: visit.to };
}
