import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { PayPlaceDto } from '@driprail/shared/contracts/pay-plans.contract';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Button } from '../../../components/button.tsx';
import { Empty, Loaded } from '../../../components/states.tsx';
import { placesQuery, ruleSetsQuery } from '../api/plans.queries.ts';
import { rateText } from './ledger.ts';
import { PersonPlaceForm } from './person-place-form.tsx';
import { PlaceForm } from './place-form.tsx';
import { WageForm } from './wage-form.tsx';

const certaintyWords = {
  read: 'read in the source',
  'from memory': 'from memory: check before use',
  'set by the owner': 'set by the owner',
};

/** Where people work, and the rules and minimum wages that come with it; each starts on a date. */
export function PlacesSheet({ people, startsOn }: { people: PersonDto[]; startsOn: string }) {
  const places = useQuery(placesQuery);
  const ruleSets = useQuery(ruleSetsQuery).data?.ruleSets ?? [];
  const [open, setOpen] = useState<'place' | 'person' | PayPlaceDto | null>(null);
  const close = () => setOpen(null);
  return (
    <Loaded query={places} what="the places">
      {(found) => (
        <>
          {found.places.length === 0 ? (
            <Empty>No places yet. Everybody is paid by the company’s rules alone.</Empty>
          ) : (
            <ul className="dated-list">
              {found.places.map((place) => (
                <li key={place.id}>
                  <b>{place.name}</b>
                  <span>
                    {place.ruleSet.name === place.name ? 'Rules of its own' : place.ruleSet.name}.{' '}
                    {place.ruleSet.source}, {certaintyWords[place.ruleSet.certainty]}
                  </span>
                  <span>
                    {place.minimumWages
                      .map((wage) => `Minimum ${rateText(wage.amount)} from ${formatDate(wage.startsOn)}`)
                      .join(', ') || 'No minimum wage of its own'}
                  </span>
                  <span>
                    {found.people
                      .filter((one) => one.placeId === place.id)
                      .map((one) => `${one.personName} from ${formatDate(one.startsOn)}`)
                      .join(', ') || 'Nobody works here yet'}
                  </span>
                  <Button onClick={() => setOpen(place)}>New minimum wage</Button>
                </li>
              ))}
            </ul>
          )}
          <p className="mt-3">
            <Button onClick={() => setOpen('place')}>New place</Button>{' '}
            {found.places.length > 0 ? <Button onClick={() => setOpen('person')}>Place a person</Button> : null}
          </p>
          {open === 'place' ? <PlaceForm ruleSets={ruleSets} startsOn={startsOn} onDone={close} /> : null}
          {open === 'person' ? (
            <PersonPlaceForm people={people} places={found.places} startsOn={startsOn} onDone={close} />
          ) : null}
          {open !== null && typeof open === 'object' ? (
            <WageForm key={open.id} place={open} startsOn={startsOn} onDone={close} />
          ) : null}
          <p className="caution mt-4 mb-5">
            <b>Caution.</b> The federal rules always run beside a place’s, and the better is paid. Rules and wages of
            states and towns change: check each with the labor agency of the place, or ask a licensed payroll adviser.
          </p>
        </>
      )}
    </Loaded>
  );
}
