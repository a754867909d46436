import { randomUUID } from 'node:crypto';
import type { ErrorRequestHandler } from 'express';
import { ExclusionConstraintError, UniqueConstraintError } from 'sequelize';
import type { Logger } from '../log.ts';
import { AppError, conflict, unprocessable } from './errors.ts';

/** Turns every failure into the one error shape; the unknown keeps its secrets and names a request id. */
export function errorHandler(log: Logger): ErrorRequestHandler {
  return (error: unknown, _req, res, next) => {
    if (res.headersSent) {
      next(error);
      return;
    }
    const known = asAppError(error);
    if (known) {
      res.status(known.status).json(known.toBody());
      return;
    }
    const requestId = randomUUID();
    log.error({ requestId, err: error }, 'request failed');
    res.status(500).json({
      error: {
        code: 'internal',
        message: 'Something went wrong here. Try again; what you entered is still on your screen.',
        hint: { requestId },
      },
    });
  };
}

function asAppError(error: unknown): AppError | null {
  if (error instanceof AppError) return error;
  if (error instanceof ExclusionConstraintError) return asOverlap(constraintOf(error));
  if (error instanceof UniqueConstraintError) return conflict('duplicate', 'This is already there.');
  if (codeOf(error) === 'DR001')
    return unprocessable('locked_week', 'This pay week is locked and never changes. Add a correction to an open week.');
  if (codeOf(error) === 'DR003')
    return conflict('handed_over', 'This payday is handed over and never changes. Look at it again.');
  if (codeOf(error) === 'DR004')
    return conflict('work_began', 'Work has begun, so the walk-round stays as it is. Add what you see now instead.');
  if (codeOf(error) === 'DR005')
    return unprocessable('more_than_received', 'That is more than was received. Look at the bill again.');
  const status = (error as { status?: unknown }).status;
  if (status === 413) return new AppError(413, 'too_large', 'That is too large to send.');
  if (status === 415) return new AppError(415, 'unsupported', 'Send JSON.');
  if (status === 400) return new AppError(400, 'bad_request', 'That request could not be read. Send JSON.');
  return null;
}

/** What the database refused, in the words of the rules that explain it beforehand. */
export function asOverlap(constraint: string): AppError {
  return constraint === 'van_crew_person_in_one_van'
    ? unprocessable('person_overlap', 'That person rides in another van at that time.')
    : unprocessable('refused', 'That van is at another stop at that time. One van can’t be at two stops.');
}

function constraintOf(error: ExclusionConstraintError): string {
  return error.constraint ?? (error.parent as { constraint?: string }).constraint ?? '';
}

function codeOf(error: unknown): string | undefined {
  return (error as { parent?: { code?: string } } | null)?.parent?.code;
}
