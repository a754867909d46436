import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';
import type { PayRulesDto, RateDto } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { formatDate } from '@driprail/shared/domain/time/format';
import { addDays, dayOf } from '@driprail/shared/domain/time/zone';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Sheet } from '../../../components/sheet.tsx';
import { useNow } from '../../../lib/now.ts';
import { useSession } from '../../../lib/session.tsx';
import { weeksQuery } from '../api/pay.queries.ts';
import { payPeopleQuery, payServicesQuery, ratesQuery, rulesQuery } from '../api/rates.queries.ts';
import { LoadedPage } from '../components/loaded-page.tsx';
import { BandChart } from '../components/band-chart.tsx';
import { rateText } from '../components/ledger.ts';
import { ratesOn, rulesOn } from '../components/plan-words.ts';
import { rateRows, rateWords, ruleRows } from '../components/rate-bands.ts';
import { RateForm } from '../components/rate-form.tsx';
import { RatesNow } from '../components/rates-now.tsx';
import { RulesForm } from '../components/rules-form.tsx';
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
  const today = dayOf(useNow(), zone);
  const [search, setSearch] = useSearchParams();
  const [adding, setAdding] = useState<'rate' | 'rules' | null>(null);
  const people = useQuery(payPeopleQuery).data?.people ?? [];
  const services = useQuery(payServicesQuery).data?.services ?? [];
  const weeks = useQuery(weeksQuery).data?.weeks ?? [];
  const asked = rates.find((rate) => rate.id === search.get('rate'));
  const person = people.find((own) => own.id === (asked ? asked.personId : search.get('person'))) ?? null;
  const personId = person?.id ?? null;
  const shown = rates.filter((rate) => rate.personId === null || rate.personId === personId);
  const axis = timeAxis(
    [...shown, ...rules].map((dated) => dated.startsOn),
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
              {people.map((own) => (
                <option key={own.id} value={own.id}>
                  {own.name}
                </option>
              ))}
            </select>
          </>
        }
        sums={sumsOf(rates, rules, personId, today)}
        actions={
          <>
            <Link className="btn" to={paths.payWeeks}>
              Pay week
            </Link>
            <Button onClick={() => setAdding('rules')}>New rules</Button>
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
          rows={rateRows(rates, personId, today)}
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
          </section>
          <RatesNow people={people.filter((own) => own.isActive)} rates={rates} today={today} chosenId={personId} />
        </div>
      </RailPage>
      {adding === 'rate' ? (
        <Sheet title="New rate" onClose={() => setAdding(null)} width={640}>
          <RateForm
            people={people.filter((own) => own.isActive)}
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

function sumsOf(rates: RateDto[], rules: PayRulesDto[], personId: string | null, today: string) {
  const now = ratesOn(rates, today).filter((rate) => rate.personId === null || rate.personId === personId);
  const hourly = now.filter((rate) => rate.kind === 'hourly' && rate.clockKind === null);
  const hour = hourly.find((rate) => rate.personId !== null) ?? hourly[0];
  const percents = now.filter((rate) => rate.kind === 'commission_percent');
  const own = percents.filter((rate) => rate.personId !== null);
  const words = [
    ...new Set((own.length > 0 ? own : percents).filter((rate) => exact(rate.value).gt(0)).map(rateWords)),
  ];
  const minimum = rulesOn(rules, today)?.minimumWage;
  return [
    { label: 'An hour, now', value: hour ? rateWords(hour) : '–' },
    { label: 'Commission, now', value: words.join(', ') || '–' },
    { label: 'Minimum here', value: minimum ? rateText(minimum) : '–' },
  ];
}
