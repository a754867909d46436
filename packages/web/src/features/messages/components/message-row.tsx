import type { ReactNode } from 'react';
import type { MessageDto } from '@driprail/shared/contracts/messages.contract';
import { messageKindNames } from '@driprail/shared/domain/messages/kinds';
import { messageStateNames } from '@driprail/shared/domain/messages/states';
import { formatDay } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { useFormats } from '../../../lib/format.ts';

/** One message: what it is about, how it stands and, once sent, its words. */
export function MessageRow({ message, who, acts }: { message: MessageDto; who?: ReactNode; acts?: ReactNode }) {
  const { zone, clock } = useFormats();
  const at = (instant: string) => `${formatDay(dayOf(instant, zone))}, ${clock(instant)}`;
  const { kind, channel, state, recipient, body, subject } = message;
  return (
    <li className={`ms-row is-${message.bouncedAt ? 'dead' : state}`}>
      <div className="ms-what">
        {who}
        <span>
          <b>{messageKindNames[kind]}</b>, {channel === 'mail' ? 'mail' : 'text'} about job {message.jobNumber}
        </span>
      </div>
      <div className="ms-how">
        <b className="ms-state">{message.bouncedAt ? 'Came back' : messageStateNames[state]}</b>{' '}
        <span>{momentOf(message, at)}</span>
        {message.reason ? <span className="ms-why">{message.reason}</span> : null}
        {message.lastError ? <span className="ms-why">{message.lastError}</span> : null}
      </div>
      <div className="ms-acts">{acts}</div>
      {body ? (
        <details className="ms-words">
          <summary>{subject || 'Words'}</summary>
          <p className="t-2">To {recipient}</p>
          <p className="ms-body" dir="auto">
            {body}
          </p>
        </details>
      ) : null}
    </li>
  );
}

function momentOf(message: MessageDto, at: (instant: string) => string): string {
  if (message.bouncedAt) return at(message.bouncedAt);
  if (message.sentAt) return at(message.sentAt);
  if (message.state === 'waiting')
    return message.tries > 0 ? `is tried again ${at(message.nextTryAt)}` : `until ${at(message.nextTryAt)}`;
  if (message.state === 'dead') return `after ${message.tries} ${message.tries === 1 ? 'try' : 'tries'}`;
  return at(message.createdAt);
}
