import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import type { PayRulesDto, RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import type { PayPlan } from '@driprail/shared/domain/pay/plans/pay-plan';
import { exact } from '@driprail/shared/domain/money/exact';
import { formatDate } from '@driprail/shared/domain/time/format';
import { addDays, dayOf, weekStartOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { NamedOptions } from '../../../components/field.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { weeksQuery } from '../api/pay.queries.ts';
import { placesQuery, plansQuery } from '../api/plans.queries.ts';
import { payPeopleQuery, payServicesQuery, ratesQuery, rulesQuery } from '../api/rates.queries.ts';
import { LoadedPage } from '../components/loaded-page.tsx';
import { CommissionTest } from '../components/commission-test.tsx';
import { AgreementsSheet } from '../components/agreements/agreements-sheet.tsx';
import { BandChart } from '../components/band-chart.tsx';
import { rateText } from '../components/ledger.ts';
import { ratesOn, rulesOn } from '../components/plan-words.ts';
import { planRows, rateRows, rateWords, ruleRows } from '../components/rate-bands.ts';
import { PlacesSheet } from '../components/places-sheet.tsx';
import { minimumWageOn } from '../components/minimum-wage.ts';
import { planOn } from '../components/plan-base-words.ts';
import { planKinds } from '../components/plan-draft.ts';
import { PlanForm } from '../components/plan-form.tsx';
import { RateForm } from '../components/rate-form.tsx';
import { RatesNow } from '../components/rates-now.tsx';
import { RulesForm } from '../components/rules-form.tsx';
import { WhatIf } from '../components/what-if.tsx';
import { TimeOffPart } from '../components/time-off/time-off-part.tsx';
import { timeAxis } from '../components/time-axis.ts';
import './rates.css';

/** Start-dated rates of a person or the company, and the company's pay rules: history, now, and to come. */
export function RatesPage() {
  const rates = useQuery(ratesQuery);
  const rules = useQuery(rulesQuery);
  const query = rates.data ? rules : { ...rules, data: undefined, error: rates.error, refetch: rates.refetch };
  return (
    <LoadedPage title="Rates" query={query} what="the rates">
      {(found) => <Rates rates={rates.data?.rates ?? []} rules={found.rules} />}
    </LoadedPage>
  );
}

function Rates({ rates, rules }: { rates: RateDto[]; rules: PayRulesDto[] }) {
  const { zone, clock } = useSession().company;
  const now = useNow();
  const today = dayOf(now, zone);
  const [search, setSearch] = useSearchParams();
  const [adding, setAdding] = useState<'rate' | 'rules' | 'plan' | 'places' | 'papers' | 'trial' | null>(null);
  const [trial, setTrial] = useState<PayPlan | null>(null);
  const people = useQuery(payPeopleQuery).data?.people ?? [];
  const services = useQuery(payServicesQuery).data?.services ?? [];
  const plans = useQuery(plansQuery).data?.plans ?? [];
  const places = useQuery(placesQuery).data;
  const weeks = useQuery(weeksQuery).data?.weeks ?? [];
  const asked = rates.find((rate) => rate.id === search.get('rate'));
  const person = people.find((own) => own.id === (asked ? asked.personId : search.get('person'))) ?? null;
  const personId = person?.id ?? null;
  const shown = rates.filter((rate) => rate.personId === null || rate.personId === personId);
  const axis = timeAxis(
    [...shown, ...rules, ...plans.filter((plan) => plan.personId === personId)].map((dated) => dated.startsOn),
    today,
  );
  const locked = weeks.filter((week) => week.state === 'locked');
  const lockedTo =
    locked
      .map((week) => week.endsOn)
      .sort()
      .at(-1) ?? null;
  const earliest = lockedTo ? addDays(lockedTo, 1) : today;
  const choose = (id: string) => setSearch(id ? { person: id } : {}, { replace: true, preventScrollReset: true });
  const active = people.filter((own) => own.isActive);
  const planned = personId ? planOn(plans, personId, today) : null;
  const companyWage = rulesOn(rules, today)?.minimumWage ?? null;
  const sums = sumsOf(
    rates,
    places ? minimumWageOn(places, companyWage, personId, today) : companyWage,
    personId,
    today,
  );
  const [hour, commission, minimum] = sums;
  const over = weeks.filter((week) => week.endsAt <= now).sort((a, b) => a.startsOn.localeCompare(b.startsOn));
  const first = rulesOn(rules, today)?.workweekStartsOn ?? 1;
  const nextWeek = lockedTo && lockedTo >= today ? earliest : weekStartOf(addDays(today, 6), first);
  return (
    <>
      <PageHead
        title={person?.name ?? 'Company'}
        above={
          <>
            Rates and rules of
            <select
              className="who-pick"
              aria-label="Whose rates"
              value={personId ?? ''}
              onChange={(event) => choose(event.target.value)}
            >
              <option value="">the company</option>
              <NamedOptions of={people} />
            </select>
          </>
        }
        sums={
          planned && minimum ? [{ label: 'Plan, now', value: planKinds[planned.plan.base.kind].label }, minimum] : sums
        }
        actions={
          <>
            <Link className="btn" to={paths.payWeeks}>
              Pay week
            </Link>
            <Button onClick={() => setAdding('places')}>Places</Button>
            <Button onClick={() => setAdding('papers')}>Agreements</Button>
            <Button onClick={() => setAdding('rules')}>New rules</Button>
            <Button onClick={() => setAdding('plan')}>New plan</Button>
            <Button look="main" onClick={() => setAdding('rate')}>
              <Icon name="plus" /> New rate
            </Button>
          </>
        }
      />
      <RailPage>
        <BandChart
          axis={axis}
          today={today}
          rows={[...planRows(plans, personId, today), ...rateRows(rates, personId, today)]}
          rules={ruleRows(rules, today, clock)}
          askedId={asked?.id ?? null}
        />
        <div className="two3">
          <section className="ru" aria-label="How the bands behave">
            <h2 className="sec">How the bands behave</h2>
            <dl>
              <dt>A job or an hour takes the band of its own day</dt>
              <dd>not of payday</dd>
              <dt>Locked weeks</dt>
              <dd>{locked.length === 0 ? 'none yet' : `${locked.length}, untouched`}</dd>
              <dt>A band may start</dt>
              <dd>{lockedTo ? `from ${formatDate(earliest)} on` : 'on any day'}</dd>
              <dt>Start before that</dt>
              <dd>a correction line</dd>
            </dl>
            <p className="caution">
              <b>Caution.</b> Driprail works out pay by what is set here. It is not legal advice: states and towns set
              higher minimum wages, daily overtime, meal and rest rules, and how a change of pay is told. Ask a licensed
              payroll adviser before the first locked week.
            </p>
            {person ? <CommissionTest person={person} /> : null}
          </section>
          <RatesNow people={active} rates={rates} plans={plans} today={today} chosenId={personId} />
        </div>
        <TimeOffPart people={active} person={person} today={today} nextWeek={nextWeek} earliest={earliest} />
        {person && over.length > 0 ? (
          <WhatIf
            key={person.id}
            person={person}
            weeks={over}
            now={{
              hourly: planned ? 'by the plan' : (hour?.value ?? ''),
              percent: planned ? 'by the plan' : (commission?.value ?? ''),
            }}
            plan={trial}
            onChoosePlan={() => setAdding('trial')}
            onDropPlan={() => setTrial(null)}
          />
        ) : null}
      </RailPage>
      {adding === 'places' ? (
        <Sheet title="Places" onClose={() => setAdding(null)} width={760}>
          <PlacesSheet people={active} startsOn={nextWeek} />
        </Sheet>
      ) : null}
      {adding === 'papers' ? (
        <Sheet title="Agreements and refunds" onClose={() => setAdding(null)} width={760}>
          <AgreementsSheet people={active} personId={personId} startsOn={nextWeek} today={today} />
        </Sheet>
      ) : null}
      {adding === 'plan' || adding === 'trial' ? (
        <Sheet title={adding === 'plan' ? 'New plan' : 'Plan to try'} onClose={() => setAdding(null)} width={720}>
          <PlanForm
            people={active}
            services={services}
            personId={personId}
            startsOn={nextWeek}
            onDone={(id) => {
              setAdding(null);
              choose(id);
            }}
            {...(adding === 'trial'
              ? {
                  onTry: (plan: PayPlan) => {
                    setTrial(plan);
                    setAdding(null);
                  },
                }
              : {})}
          />
        </Sheet>
      ) : null}
      {adding === 'rate' ? (
        <Sheet title="New rate" onClose={() => setAdding(null)} width={640}>
          <RateForm
            people={active}
            services={services}
            personId={personId}
            startsOn={today > earliest ? today : earliest}
            onDone={(rate) => {
              setAdding(null);
              setSearch({ rate: rate.id }, { replace: true, preventScrollReset: true });
            }}
          />
        </Sheet>
      ) : null}
      {adding === 'rules' ? (
        <Sheet title="New rules" onClose={() => setAdding(null)} width={640}>
          <RulesForm
            current={rulesOn(rules, today)}
            startsOn={today > earliest ? today : earliest}
            onDone={() => setAdding(null)}
          />
        </Sheet>
      ) : null}
    </>
  );
}

function sumsOf(rates: RateDto[], minimum: string | null, personId: string | null, today: string) {
  const now = ratesOn(rates, today).filter((rate) => rate.personId === null || rate.personId === personId);
  const hourly = now.filter((rate) => rate.kind === 'hourly' && rate.clockKind === null && rate.serviceId === null);
  const hour = hourly.find((rate) => rate.personId !== null) ?? hourly[0];
  const percents = now.filter((rate) => rate.kind === 'commission_percent');
  const own = percents.filter((rate) => rate.personId !== null);
  const words = [
    ...new Set((own.length > 0 ? own : percents).filter((rate) => exact(rate.value).gt(0)).map(rateWords)),
  ];
  return [
    { label: 'An hour, now', value: hour ? rateWords(hour) : '–' },
    { label: 'Commission, now', value: words.join(', ') || '–' },
    { label: 'Minimum here', value: minimum ? rateText(minimum) : '–' },
  ];
}
