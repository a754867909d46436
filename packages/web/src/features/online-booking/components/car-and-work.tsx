import { useState } from 'react';
import type { OnlineMenuDto } from '@driprail/shared/contracts/online-booking.contract';
import { sizeClassNames, sizeClasses } from '@driprail/shared/contracts/fields';
import { formatMinutes } from '@driprail/shared/domain/time/format';
import { Picks } from '../../../components/picks.tsx';
import { money } from '../../../lib/format.ts';
import type { BookDraft } from './book-draft.ts';
import { servicesFor } from './book-draft.ts';
import { StepFoot } from './book-step.tsx';

export interface PartProps {
  menu: OnlineMenuDto;
  draft: BookDraft;
  cents: number;
  set: (next: Partial<BookDraft>) => void;
  onNext: () => void;
}

export function CarPart({ menu, draft, set, onNext }: PartProps) {
  const sold = sizeClasses.filter((size) => servicesFor(menu, size).length > 0);
  return (
    <Picks
      className="book-sizes"
      options={sold}
      value={draft.sizeClass}
      nameOf={(size) => sizeClassNames[size]}
      onPick={(sizeClass) => {
        // Another size takes another time: what was held is let go by its own clock.
        set({ sizeClass, hold: null, isCodeSent: false });
        onNext();
      }}
    />
  );
}

export function WorkPart({ menu, draft, cents, set, onNext }: PartProps) {
  const [fault, setFault] = useState('');
  const services = servicesFor(menu, draft.sizeClass);
  const isChosen = (id: string) => draft.serviceIds.includes(id);
  return (
    <form
      noValidate
      onSubmit={(event) => {
        event.preventDefault();
        if (services.some(({ id, kind }) => kind !== 'add_on' && isChosen(id))) onNext();
        else setFault('Choose a service first; add-ons come with one.');
      }}
    >
      {services.map(({ id, name, description, priceCents, minutes, kind }) => (
        <label key={id} className="book-service">
          <input
            type="checkbox"
            checked={isChosen(id)}
            onChange={({ target }) => {
              setFault('');
              const others = draft.serviceIds.filter((one) => one !== id);
              set({ serviceIds: target.checked ? [...others, id] : others, hold: null, isCodeSent: false });
            }}
          />
          <span>
            <b>{name}</b>
            <small>
              {description} {kind === 'add_on' ? 'Comes with a service.' : ''} {formatMinutes(minutes)} for one person.
            </small>
          </span>
          <span className="t-fig">{money(priceCents)}</span>
        </label>
      ))}
      {fault ? (
        <p className="tape my-2" role="alert">
          <b>{fault}</b>
        </p>
      ) : null}
      <StepFoot cents={cents} label="Where to" />
    </form>
  );
}
