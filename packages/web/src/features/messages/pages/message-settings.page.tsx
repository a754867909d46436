import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';
import type { MessageKindDto } from '@driprail/shared/contracts/message-settings.contract';
import { messageKindNames } from '@driprail/shared/domain/messages/kinds';
import type { MessageKind } from '@driprail/shared/domain/messages/kinds';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Loaded } from '../../../components/states.tsx';
import { messageSettingsQuery } from '../api/message-settings.queries.ts';
import { HoursForm } from '../components/hours-form.tsx';
import { KindForm } from '../components/kind-form.tsx';
import '../components/messages.css';

/** For the owner: which messages go out, when, and in which words. */
export function MessageSettingsPage() {
  const settings = useQuery(messageSettingsQuery);
  const [chosen, setChosen] = useState<MessageKind>('booked');
  return (
    <>
      <PageHead
        title="Words to customers"
        above={
          <>
            <Link to={paths.messages} aria-label="Back to messages">
              <Icon name="left" />
            </Link>
            Messages, their hours and words
          </>
        }
      />
      <RailPage>
        <Loaded query={settings} what="the words">
          {({ hours, kinds }) => {
            const kind = kinds.find((one) => one.kind === chosen);
            return (
              <div className="hung ms-set">
                <div className="grid gap-6">
                  <section aria-label="Kinds" className="ms-kinds">
                    <h2 className="sec">Kinds</h2>
                    {kinds.map((one) => (
                      <KindButton key={one.kind} kind={one} isChosen={one.kind === chosen} onChoose={setChosen} />
                    ))}
                  </section>
                  <HoursForm key={hours.version} hours={hours} />
                </div>
                {kind ? <KindForm key={`${kind.kind}-${kind.version}`} kind={kind} /> : null}
              </div>
            );
          }}
        </Loaded>
      </RailPage>
    </>
  );
}

interface ButtonProps {
  kind: MessageKindDto;
  isChosen: boolean;
  onChoose: (kind: MessageKind) => void;
}

function KindButton({ kind, isChosen, onChoose }: ButtonProps) {
  return (
    <button type="button" aria-pressed={isChosen} onClick={() => onChoose(kind.kind)}>
      {messageKindNames[kind.kind]}
      <span>{kind.isOn ? (kind.isOurs ? 'on' : 'on, own words') : 'off'}</span>
    </button>
  );
}
