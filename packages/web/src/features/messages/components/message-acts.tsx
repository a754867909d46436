import { Button } from '../../../components/button.tsx';
import type { MessageDto } from '@driprail/shared/contracts/messages.contract';
import { useDeskAct } from '../api/messages.queries.ts';

/** What the desk can do with a message that has not gone out. */
export function MessageActs({ message }: { message: MessageDto }) {
  const [retry, drop] = [useDeskAct('retry'), useDeskAct('drop')];
  if (message.state !== 'dead' && message.state !== 'waiting') return null;
  const error = retry.error ?? drop.error;
  return (
    <>
      {message.state === 'dead' ? (
        <Button isBusy={retry.isPending} onClick={() => retry.mutate(message.id)}>
          Try again
        </Button>
      ) : null}
      <Button look="bare" isBusy={drop.isPending} onClick={() => drop.mutate(message.id)}>
        Drop
      </Button>
      {error ? (
        <span className="ms-why" role="alert">
          {error.message}
        </span>
      ) : null}
    </>
  );
}
