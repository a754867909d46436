import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import type { ShowUpRuleDto, TimeOffRuleDto } from '@driprail/shared/contracts/time-off.contract';
import { showUpKindOf, showUpRuleWords } from '@driprail/shared/domain/pay/time-off/show-up-rule';
import { timeOffKindNames, timeOffRuleWords } from '@driprail/shared/domain/pay/time-off/time-off-rule';
import { formatDate } from '@driprail/shared/domain/time/format';
import { Button } from '../../../../components/button.tsx';
import { Icon } from '../../../../components/icon.tsx';
import { Sheet } from '../../../../components/sheet.tsx';
import { Empty, Loaded } from '../../../../components/states.tsx';
import { placesQuery } from '../../api/plans.queries.ts';
import { timeOffRulesQuery } from '../../api/time-off.queries.ts';
import { LedgerAdjustForm } from './ledger-adjust-form.tsx';
import { ShowUpRuleForm } from './show-up-rule-form.tsx';
import { TimeOffBalances } from './time-off-balances.tsx';
import { TimeOffRuleForm } from './time-off-rule-form.tsx';
import './time-off.css';

interface Props {
  people: PersonDto[];
  /** Whose rates are open; null for the company. */
  person: PersonDto | null;
  today: string;
  /** First day on which a rule may start, and from which a ledger may be changed. */
  nextWeek: string;
  earliest: string;
}

interface RuleRow {
  id: string;
  name: string;
  whose: string;
  words: string;
  startsOn: string;
  setBy: string;
  /** What it replaces and is replaced by. */
  line: string;
}

/** The dated rules of paid time off and of days cut short, and the chosen person's hours. */
export function TimeOffPart({ people, person, today, nextWeek, earliest }: Props) {
  const rules = useQuery(timeOffRulesQuery);
  const places = useQuery(placesQuery).data?.places ?? [];
  const [adding, setAdding] = useState<'rule' | 'show-up' | 'ledger' | null>(null);
  const close = () => setAdding(null);
  return (
    <section className="to-part" aria-labelledby="time-off-part">
      <header>
        <h2 className="sec" id="time-off-part">
          Time off and show-up
        </h2>
        <Button onClick={() => setAdding('rule')}>
          <Icon name="plus" /> Time off rule
        </Button>
        <Button onClick={() => setAdding('show-up')}>
          <Icon name="plus" /> Show-up rule
        </Button>
        {person ? <Button onClick={() => setAdding('ledger')}>Adjust balance</Button> : null}
      </header>
      <div className="to-cols">
        <Loaded query={rules} what="the rules of time off">
          {({ timeOff, showUp }) => <RuleTable rows={rowsOf(timeOff, showUp, person)} today={today} />}
        </Loaded>
        <div>
          {person ? <TimeOffBalances personId={person.id} title={`Hours of ${person.name}`} /> : null}
          <p className="caution">
            <b>Caution.</b> Sick leave, reporting time and what becomes of unused vacation are set by states and towns,
            and differ. Driprail works by the rules entered here; it knows none of these laws. Check with the labor
            agency of the place or a licensed payroll adviser.
          </p>
        </div>
      </div>
      {adding === 'rule' ? (
        <Sheet title="Time off rule" onClose={close} width={680}>
          <TimeOffRuleForm people={people} personId={person?.id ?? null} startsOn={nextWeek} onDone={close} />
        </Sheet>
      ) : null}
      {adding === 'show-up' ? (
        <Sheet title="Show-up rule" onClose={close} width={680}>
          <ShowUpRuleForm places={places} startsOn={nextWeek} onDone={close} />
        </Sheet>
      ) : null}
      {adding === 'ledger' && person ? (
        <Sheet title="Adjust balance" onClose={close} width={620}>
          <LedgerAdjustForm personId={person.id} on={today > earliest ? today : earliest} onDone={close} />
        </Sheet>
      ) : null}
    </section>
  );
}

function RuleTable({ rows, today }: { rows: RuleRow[]; today: string }) {
  if (rows.length === 0)
    return <Empty>No rules yet: no hours are earned, and days cut short pay what was worked.</Empty>;
  return (
    <table className="grid-t to-rules">
      <thead>
        <tr>
          <th scope="col">Rule</th>
          <th scope="col">Pays</th>
          <th scope="col">From</th>
        </tr>
      </thead>
      <tbody>
        {rows.map((row) => {
          const state = stateOf(row, rows, today);
          return (
            <tr key={row.id} className={`is-${state}`}>
              <th scope="row">
                {row.name}
                <small>{row.whose}</small>
              </th>
              <td>{row.words}</td>
              <td>
                {formatDate(row.startsOn)}
                <small>
                  {{ now: 'now', past: 'past', 'to-come': 'to come' }[state]}
                  {row.setBy === '' ? '' : `, set by ${row.setBy}`}
                </small>
              </td>
            </tr>
          );
        })}
      </tbody>
    </table>
  );
}

function stateOf(row: RuleRow, rows: RuleRow[], today: string): 'now' | 'past' | 'to-come' {
  if (row.startsOn > today) return 'to-come';
  const later = rows.some(
    (other) => other.line === row.line && other.startsOn > row.startsOn && other.startsOn <= today,
  );
  return later ? 'past' : 'now';
}

function rowsOf(timeOff: TimeOffRuleDto[], showUp: ShowUpRuleDto[], person: PersonDto | null): RuleRow[] {
  const ofPerson = timeOff.filter((rule) => rule.personId === null || person === null || rule.personId === person.id);
  return [
    ...ofPerson.map(({ id, kind, personId, personName, rule, startsOn, setBy }) => ({
      ...{ id, startsOn, setBy, name: timeOffKindNames[kind], whose: personName ?? 'Company' },
      ...{ words: timeOffRuleWords(rule), line: `${kind} ${personId ?? ''}` },
    })),
    ...showUp.map(({ id, placeId, placeName, rule, startsOn, setBy, source }) => ({
      ...{ id, startsOn, setBy, whose: placeName ?? 'Company', line: `${showUpKindOf(rule)} ${placeId ?? ''}` },
      name: showUpKindOf(rule) === 'show_up' ? 'Show-up pay' : 'No-show trip',
      words: [showUpRuleWords(rule), source].filter(Boolean).join('. '),
    })),
  ];
}
