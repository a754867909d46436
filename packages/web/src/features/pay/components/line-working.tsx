import { Link } from 'react-router';
import type { CorrectedLine } from '@driprail/shared/contracts/pay.contract';
import { formatDate } from '@driprail/shared/domain/time/format';
import type { PayLine, PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { paths } from '../../../app/paths.ts';
import { money } from '../../../lib/format.ts';
import { areaDrawing, moreThanHourly } from './area-drawing.ts';
import { kindTitles, lineWords } from './ledger.ts';
import type { Customers } from './ledger.ts';
import { OvertimeArea } from './overtime-area.tsx';
import { WorkingSteps } from './working-steps.tsx';

interface Props {
  person: PersonWeek;
  line: PayLine;
  customers: Customers;
  /** The line's place on the statement, from 1, and how many there are. */
  place: { at: number; of: number };
  corrected: CorrectedLine | undefined;
  /** Since when the rules of the week hold. */
  rulesFrom: string | null;
}

function rounding(line: PayLine): string {
  if (line.kind === 'overtime_premium')
    return 'The rate carried exactly and shown to 4 places; this line to the cent, half up';
  if (line.kind === 'minimum_wage_make_up') return 'Up to the next cent: a floor set by law is never rounded down';
  if (line.kind === 'hourly') return 'Hours carried exactly; this line to the cent, half up';
  if (line.kind === 'flat' || line.kind === 'commission')
    return 'The whole line to the cent, half up; shares in whole cents that add up to it';
  return 'Whole cents';
}

/** The chosen line's paper: what it is called, its amount, and everything it came from. */
export function LineWorking({ person, line, customers, place, corrected, rulesFrom }: Props) {
  const drawing = areaDrawing(person, line);
  const say = moreThanHourly(person, line);
  return (
    <article className="hung wk2" aria-labelledby="working-title" aria-live="polite">
      <div className="wk2-head">
        <div>
          <h2 className="t-hang" id="working-title">
            {kindTitles[line.kind]}
          </h2>
          <p>
            {lineWords(line, customers)}. How {money(line.amountCents)} was worked, line {place.at} of {place.of}
          </p>
        </div>
        <p className="t-level amt">{money(line.amountCents)}</p>
      </div>
      <WorkingSteps line={line} lines={person.lines} customers={customers} hasLinks />
      <div className={drawing ? 'dg' : 'dg is-alone'}>
        {drawing ? (
          <figure>
            <OvertimeArea drawing={drawing} />
          </figure>
        ) : null}
        <div>
          <dl>
            <dt>Rule</dt>
            <dd>
              {line.rule}. <Link to={`${paths.rates}#rules`}>Company rules</Link>
            </dd>
            {rulesFrom ? (
              <>
                <dt>Set here</dt>
                <dd>as from {formatDate(rulesFrom)}</dd>
              </>
            ) : null}
            <dt>Rounding</dt>
            <dd>{rounding(line)}</dd>
            <dt>Regular rate</dt>
            <dd>{line.inRegularRate ? 'This line counts in it' : 'This line does not count in it'}</dd>
            {corrected ? (
              <>
                <dt>Corrects</dt>
                <dd>
                  Week {corrected.number}, line {corrected.position + 1}, {corrected.label}.{' '}
                  <Link
                    to={`${paths.payWorking(corrected.startsOn, line.personId)}?line=${encodeURIComponent(corrected.key)}`}
                  >
                    Open week {corrected.number}, locked
                  </Link>
                </dd>
              </>
            ) : null}
          </dl>
          {line.isPayable ? null : <p className="say">Kept on the spot: shown here, adds nothing to what is paid.</p>}
          {say ? <p className="say">{say}</p> : null}
        </div>
      </div>
    </article>
  );
}
