import { useQuery } from '@tanstack/react-query';
import { useSearchParams } from 'react-router';
import type { OnlineMenuDto } from '@driprail/shared/contracts/online-booking.contract';
import { sizeClassNames } from '@driprail/shared/contracts/fields';
import { formatDay, formatSpan } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { Loaded } from '../../../components/states.tsx';
import { useDraft } from '../../../lib/use-draft.ts';
import { onlineMenuQuery } from '../api/online-booking.queries.ts';
import type { BookDraft, BookStep } from '../components/book-draft.ts';
import { bookSteps, chosenServices, emptyDraft, reachable } from '../components/book-draft.ts';
import { Step } from '../components/book-step.tsx';
import { Booked } from '../components/booked.tsx';
import { CarPart, WorkPart } from '../components/car-and-work.tsx';
import { CodePart } from '../components/code-part.tsx';
import { PlacePart } from '../components/place-part.tsx';
import { TimePart } from '../components/time-part.tsx';
import { YouPart } from '../components/you-part.tsx';
import './book.css';

/** Where anybody books without an account; what is filled in stays in this tab, and Back goes a step back. */
export function BookPage() {
  const query = useQuery(onlineMenuQuery);
  return (
    <main className="ph book-page" id="main">
      <Loaded query={query} what="the menu">
        {({ menu }) => (
          <>
            <header className="book-top">
              <h1 className="t-hang">{menu.companyName}</h1>
            </header>
            {menu.isOn && menu.services.length > 0 ? <Booking menu={menu} /> : <Closed menu={menu} />}
          </>
        )}
      </Loaded>
    </main>
  );
}

function Closed({ menu: { companyPhone } }: { menu: OnlineMenuDto }) {
  return (
    <div className="book-leg">
      <div className="rail" />
      <i className="bead" aria-hidden />
      <h2 className="t-hang">Call us to book</h2>
      <p className="py-2">Booking online is closed just now.</p>
      {companyPhone ? (
        <a className="btn w-full" href={`tel:${companyPhone}`}>
          Call {companyPhone}
        </a>
      ) : null}
    </div>
  );
}

function Booking({ menu }: { menu: OnlineMenuDto }) {
  const [search, setSearch] = useSearchParams();
  const { value: draft, set: keep } = useDraft<BookDraft>('book', () => emptyDraft);
  if (draft.booked) return <Booked menu={menu} booked={draft.booked} onAgain={() => keep(emptyDraft)} />;
  const wanted = bookSteps.find((step) => step === search.get('step')) ?? 'car';
  const now = reachable(wanted, menu, draft);
  const goTo = (step: BookStep) => setSearch({ step });
  const chosen = chosenServices(menu, draft);
  const part = {
    ...{ menu, draft, cents: chosen.reduce((sum, { priceCents }) => sum + priceCents, 0) },
    set: (next: Partial<BookDraft>) => keep({ ...draft, ...next }),
  };
  const step = (name: BookStep) => ({
    state:
      name === now
        ? ('now' as const)
        : bookSteps.indexOf(name) < bookSteps.indexOf(now)
          ? ('done' as const)
          : ('later' as const),
    onChange: () => goTo(name),
  });
  return (
    <div className="book">
      <div className="rail" />
      <ol>
        <Step
          title="Your car"
          head="Which car"
          {...step('car')}
          summary={draft.sizeClass ? sizeClassNames[draft.sizeClass] : null}
        >
          <CarPart {...part} onNext={() => goTo('work')} />
        </Step>
        <Step title="The work" head="What to do" {...step('work')} summary={chosen.map(({ name }) => name).join(', ')}>
          <WorkPart {...part} onNext={() => goTo('place')} />
        </Step>
        <Step title="The place" head="Where to" {...step('place')} summary={`${draft.line}, ${draft.city}`}>
          <PlacePart {...part} onNext={() => goTo('time')} />
        </Step>
        <Step
          title="The time"
          head="Pick a time"
          {...step('time')}
          summary={draft.hold ? timeWords(draft.hold, menu) : null}
        >
          <TimePart {...part} onNext={() => goTo('you')} />
        </Step>
        <Step title="You" head="Who you are" {...step('you')} summary={`${draft.name}, ${draft.email}`}>
          <YouPart {...part} onNext={() => goTo('code')} onTime={() => goTo('time')} />
        </Step>
        <Step title="The code" head="Type the code" {...step('code')}>
          <CodePart {...part} onTime={() => goTo('time')} onYou={() => goTo('you')} />
        </Step>
      </ol>
    </div>
  );
}

function timeWords({ from, to }: { from: string; to: string }, { zone, clock }: OnlineMenuDto): string {
  return `${formatDay(dayOf(from, zone))}, ${formatSpan(from, to, zone, clock)}`;
}
