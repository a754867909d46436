import { useState } from 'react';
import { Link } from 'react-router';
import type { Change, ChangeFacts } from '@driprail/shared/domain/job-work/judge-change';
import { judgeChange } from '@driprail/shared/domain/job-work/judge-change';
import { paths } from '../../../app/paths.ts';
import { Icon } from '../../../components/icon.tsx';
import { Picks } from '../../../components/picks.tsx';
import type { AtVisit } from '../api/work.queries.ts';
import { ChangeVerdict } from './change-verdict.tsx';
import { ConditionFields } from './condition-fields.tsx';
import { OfferPicks } from './offer-picks.tsx';

type Kind = Change['kind'];
const kinds: readonly Kind[] = ['add', 'swap', 'drop', 'condition'];
const kindNames: Record<Kind, string> = {
  add: 'Add a service',
  swap: 'Swap a service',
  drop: 'Drop a service',
  condition: 'Raise the condition',
};

interface ChangeFormProps {
  facts: ChangeFacts;
  at: AtVisit;
  now: string;
  onDone: () => void;
}

/** A change of the job, pick by pick; below it what it costs, when the crew is through and what stands in the way. */
export function ChangeForm({ facts, at, now, onDone }: ChangeFormProps) {
  const [kind, setKind] = useState<Kind | null>(null);
  const [lineId, setLineId] = useState<string | null>(null);
  const [change, setChange] = useState<Change | null>(null);
  const open = facts.lines.filter((line) => !line.isFinished);
  const choices = kind === 'add' ? firstOfEachCar(open) : open.map((one) => one.id);
  const line = open.find((one) => one.id === (choices.length === 1 ? choices[0] : lineId));
  const pickKind = (next: Kind) => {
    const only = open.length === 1 ? open[0] : undefined;
    setKind(next);
    setLineId(null);
    setChange(next === 'drop' && only ? { kind: 'drop', lineId: only.id } : null);
  };
  const pickLine = (id: string) => {
    setLineId(id);
    setChange(kind === 'drop' ? { kind: 'drop', lineId: id } : null);
  };
  const judgement = change ? judgeChange(facts, change, now) : null;
  const names = new Map(open.map((one) => [one.id, [one.serviceName, one.vehicle].filter(Boolean).join(', ')]));
  return (
    <div className="wk-change">
      <button type="button" className="btn bare wk-back" onClick={onDone}>
        <Icon name="left" /> Leave it as booked
      </button>
      <h2 className="sec">What changes</h2>
      <Picks
        options={kinds}
        value={kind}
        onPick={pickKind}
        nameOf={(one) => kindNames[one]}
        className="grid grid-cols-2 gap-2 my-2"
      />
      {kind && choices.length > 1 ? (
        <>
          <h2 className="sec">{kind === 'add' ? 'On which car' : 'Which service'}</h2>
          <Picks
            options={choices}
            value={line?.id ?? null}
            onPick={pickLine}
            nameOf={(id) => (kind === 'add' ? carOf(open, id) : (names.get(id) ?? ''))}
            className="grid gap-2 my-2"
          />
        </>
      ) : null}
      {line && (kind === 'add' || kind === 'swap') ? (
        <OfferPicks
          offers={facts.offers.filter((offer) => offer.serviceId !== line.serviceId)}
          sizeClass={line.sizeClass}
          pickedId={change && 'serviceId' in change ? change.serviceId : null}
          onPick={(serviceId) =>
            setChange(
              serviceId === null
                ? null
                : kind === 'add'
                  ? { kind, serviceId, vehicleId: line.vehicleId, sizeClass: line.sizeClass }
                  : { kind, lineId: line.id, serviceId },
            )
          }
        />
      ) : null}
      {line && kind === 'condition' ? (
        <>
          <ConditionFields
            key={line.id}
            line={line}
            surcharges={facts.surcharges}
            onChange={(fields) => setChange(fields && { kind: 'condition', lineId: line.id, ...fields })}
          />
          <Link className="btn w-full" to={paths.walkRound(at.visitId)}>
            <Icon name="camera" /> Photos of it, dated, in the walk-round
          </Link>
        </>
      ) : null}
      {judgement && !judgement.ok ? (
        <p className="tape my-3" role="alert">
          <b>{judgement.message}</b>
        </p>
      ) : null}
      {change && judgement?.ok ? (
        <ChangeVerdict change={change} judged={judgement.change} at={at} onDone={onDone} />
      ) : (
        <footer className="ph-act">
          <p className="t-2 py-2">Pick what changes; price and time show here.</p>
        </footer>
      )}
    </div>
  );
}

type Line = ChangeFacts['lines'][number];

function firstOfEachCar(lines: readonly Line[]): string[] {
  return lines
    .filter((line, index) => lines.findIndex((one) => one.vehicleId === line.vehicleId) === index)
    .map((line) => line.id);
}

function carOf(lines: readonly Line[], id: string): string {
  return lines.find((one) => one.id === id)?.vehicle || 'The car';
}
