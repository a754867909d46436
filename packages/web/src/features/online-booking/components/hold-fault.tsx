import type { ApiError } from '../../../lib/call.ts';

/** A refusal of what is held; where the time is gone, the way back to the times. */
export function HoldFault({ error, onTime }: { error: ApiError; onTime: () => void }) {
  return (
    <p className="tape my-2" role="alert">
      <b>{error.message}</b>{' '}
      {['hold_over', 'too_many_codes'].includes(error.code) ? (
        <button type="button" className="link" onClick={onTime}>
          Choose a time
        </button>
      ) : null}
    </p>
  );
}
