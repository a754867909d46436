import { useOutbox, dismiss } from '../../../lib/outbox/outbox.ts';
import { Icon } from '../../../components/icon.tsx';

/** What waits on this phone, in one line; and what the server refused, with what to do. Nothing is dropped in silence. */
export function OutboxLine({ isOnline, isLive }: { isOnline: boolean; isLive: boolean }) {
  const { waiting, refused } = useOutbox();
  return (
    <>
      {isOnline && isLive && waiting.length === 0 ? null : (
        <p className="adrift" role="status">
          <Icon name={isOnline ? 'up' : 'offline'} /> {signalWords(isOnline)}
          {waiting.length > 0
            ? ` ${waiting.length} change${waiting.length === 1 ? '' : 's'} kept here, waiting to send.`
            : ''}
        </p>
      )}
      {refused.map((press) => (
        <div key={press.key} className="tape my-2" role="alert">
          <b>{press.words}.</b> {press.refused} What you did stands on this phone; dispatch settles it.{' '}
          <button type="button" className="link" onClick={() => void dismiss(press.key)}>
            Settled
          </button>
        </div>
      ))}
    </>
  );
}

function signalWords(isOnline: boolean): string {
  return isOnline ? 'Not in step yet.' : 'No signal. Every press is kept.';
}
