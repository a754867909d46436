import { Link } from 'react-router';
import type { RateDto } from '@driprail/shared/contracts/pay-rates.contract';
import type { PayPlanDto } from '@driprail/shared/contracts/pay-plans.contract';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { basePlanWords, planOn } from './plan-base-words.ts';
import { planWords, ratesOn } from './plan-words.ts';
import { rateWords } from './rate-bands.ts';

interface Props {
  people: PersonDto[];
  rates: RateDto[];
  plans: PayPlanDto[];
  today: string;
  chosenId: string | null;
}

/** How everybody is paid today; each name opens the bands behind it. */
export function RatesNow({ people, rates, plans, today, chosenId }: Props) {
  const now = ratesOn(rates, today);
  const hourOf = (personId: string | null) =>
    now.find((r) => r.kind === 'hourly' && r.clockKind === null && r.personId === personId);
  const company = hourOf(null);
  return (
    <section className="hung rates-now" aria-labelledby="rates-now">
      <h2 className="t-hang" id="rates-now">
        Everybody, now
      </h2>
      <table className="grid-t">
        <thead>
          <tr>
            <th scope="col">Name</th>
            <th scope="col">Paid by</th>
            <th scope="col" className="r">
              An hour
            </th>
          </tr>
        </thead>
        <tbody>
          <tr>
            <th scope="row">
              <Link to="?" replace preventScrollReset aria-current={chosenId === null ? 'true' : undefined}>
                <b>Company-wide</b>
              </Link>
            </th>
            <td className="t-2">{planWords(rates, '', today, true).replace('No hourly rate, ', '')}</td>
            <td className="r t-fig">{company ? rateWords(company) : '–'}</td>
          </tr>
          {people.map((person) => {
            const planned = planOn(plans, person.id, today);
            const hour = planned ? null : (hourOf(person.id) ?? company);
            return (
              <tr key={person.id}>
                <th scope="row">
                  <Link
                    to={`?person=${person.id}`}
                    replace
                    preventScrollReset
                    aria-current={chosenId === person.id ? 'true' : undefined}
                  >
                    <b>{person.name}</b>
                  </Link>
                </th>
                <td className="t-2">
                  {planned ? basePlanWords(planned.plan) : planWords(rates, person.id, today, true)}
                </td>
                <td className="r t-fig">{hour ? rateWords(hour) : '–'}</td>
              </tr>
            );
          })}
        </tbody>
      </table>
    </section>
  );
}
