import type { KeyboardEvent } from 'react';
import { useState } from 'react';
import { useQuery } from '@tanstack/react-query';
import { Link, useNavigate, useParams, useSearchParams } from 'react-router';
import type { PayWeekDto } from '@driprail/shared/contracts/pay.contract';
import { exact } from '@driprail/shared/domain/money/exact';
import { decimalText } from '@driprail/shared/domain/money/rounding';
import type { PersonWeek } from '@driprail/shared/domain/pay/pay-week.types';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty } from '../../../components/states.tsx';
import { hoursMinutes, money, useFormats } from '../../../lib/format.ts';
import { useNow } from '../../../lib/now.ts';
import { weekQuery, weeksQuery } from '../api/pay.queries.ts';
import { rulesQuery } from '../api/rates.queries.ts';
import { LoadedPage } from '../components/loaded-page.tsx';
import { AdjustmentSheet } from '../components/adjustment-sheet.tsx';
import { ledgerGroups } from '../components/ledger.ts';
import { LedgerSection, LineCells } from '../components/ledger-line.tsx';
import { LineWorking } from '../components/line-working.tsx';
import { rulesOn } from '../components/plan-words.ts';
import { StageRail } from '../components/stage-rail.tsx';
import { openWeeks, troubles, weekSpan } from '../components/week-model.ts';
import './pay.css';
import './pay-working.css';

/** Why each amount of a person's week is what it is. */
export function PayWorkingPage() {
  const { day = '', personId = '' } = useParams();
  const week = useQuery(weekQuery(day));
  return (
    <LoadedPage title="Pay" query={week} what="the pay week">
      {(dto) => {
        const person = dto.people.find((own) => own.personId === personId);
        if (person) return <Working key={personId} dto={dto} person={person} />;
        return (
          <>
            <PageHead title="Pay" above={weekSpan(dto.week)} />
            <RailPage>
              <Empty>
                No pay for this person in week {dto.week.number}. <Link to={paths.payWeek(day)}>Open the week</Link>
              </Empty>
            </RailPage>
          </>
        );
      }}
    </LoadedPage>
  );
}

function Working({ dto, person }: { dto: PayWeekDto; person: PersonWeek }) {
  const { zone } = useFormats();
  const now = useNow();
  const [search] = useSearchParams();
  const [isCorrecting, setCorrecting] = useState(false);
  const rules = useQuery(rulesQuery).data?.rules;
  const weeks = useQuery(weeksQuery).data?.weeks ?? [];
  const { week, people } = dto;
  const groups = ledgerGroups(person);
  const lines = groups.flatMap((group) => group.lines);
  const chosen = lines.find((line) => line.key === search.get('line')) ?? lines[0];
  const at = people.indexOf(person);
  const toSettle = troubles(dto, now, zone).filter((warning) => warning.isBlocking).length;
  const next = openWeeks(weeks)[0];
  const isLocked = week.state === 'locked';
  return (
    <>
      <PageHead
        title={person.name}
        above={
          <>
            <PersonLink dto={dto} person={people[at - 1]} label="Person before" icon="left" />
            <Link to={`${paths.payWeek(week.startsOn)}?person=${person.personId}`} className="!w-auto !inline">
              Pay week {week.number}, {weekSpan(week)}
            </Link>
            <PersonLink dto={dto} person={people[at + 1]} label="Next person" icon="right" />
          </>
        }
        sums={[
          { label: 'Gross', value: money(person.totals.gross) },
          { label: 'Hours', value: hoursMinutes(person.hoursWorked) },
          { label: 'Over 40 h', value: hoursMinutes(person.overtimeHours) },
          {
            label: 'Regular rate',
            value: person.regularRate === null ? '–' : decimalText(exact(person.regularRate), 2),
          },
        ]}
        actions={
          <>
            <Link className="btn" to={paths.statement(week.startsOn, person.personId)}>
              <Icon name="print" /> Print statement
            </Link>
            <Link className="btn" to={`${paths.rates}?person=${person.personId}`}>
              Rates
            </Link>
          </>
        }
      />
      <RailPage>
        <StageRail dto={dto} toSettle={toSettle} now={now} />
        <div className="pay-working">
          <nav className="st4" aria-label="Pay lines" onKeyDown={stepThroughLines}>
            <h2 className="sr">Pay lines</h2>
            {groups.map((group) => (
              <LedgerSection key={group.key} group={group}>
                {group.lines.map((line) => (
                  <li key={line.key}>
                    <Link
                      className="pl plain"
                      to={`?line=${encodeURIComponent(line.key)}`}
                      replace
                      preventScrollReset
                      aria-current={line === chosen ? 'true' : undefined}
                    >
                      <LineCells
                        line={line}
                        customers={dto.customers}
                        corrected={line.correctsLineId ? dto.correctedLines[line.correctsLineId] : undefined}
                      />
                    </Link>
                  </li>
                ))}
              </LedgerSection>
            ))}
            <p className="total">
              Gross <span className="t-level">{money(person.totals.gross)}</span>
            </p>
            {isLocked ? (
              <div className="lk">
                <Icon name="lock" />
                <p>These lines stay as they are. What is wrong is corrected by a line in an open week that names it.</p>
                <Button onClick={() => setCorrecting(true)}>Correct in week {next?.number ?? week.number + 1}</Button>
              </div>
            ) : null}
          </nav>
          {chosen ? (
            <LineWorking
              person={person}
              line={chosen}
              customers={dto.customers}
              place={{ at: lines.indexOf(chosen) + 1, of: lines.length }}
              corrected={chosen.correctsLineId ? dto.correctedLines[chosen.correctsLineId] : undefined}
              rulesFrom={rules ? (rulesOn(rules, week.startsOn)?.startsOn ?? null) : null}
            />
          ) : (
            <Empty>No pay in this week yet.</Empty>
          )}
        </div>
      </RailPage>
      {isCorrecting ? (
        <CorrectLine dto={dto} person={person} lineKey={chosen?.key ?? null} onClose={() => setCorrecting(false)} />
      ) : null}
    </>
  );
}

interface CorrectProps {
  dto: PayWeekDto;
  person: PersonWeek;
  lineKey: string | null;
  onClose: () => void;
}

function CorrectLine({ dto, person, lineKey, onClose }: CorrectProps) {
  const navigate = useNavigate();
  const { personId, name } = person;
  return (
    <AdjustmentSheet
      start={{ personId, name, startsOn: null, kind: 'correction', amount: '', mends: dto.week.startsOn, lineKey }}
      onClose={(addedTo) => {
        onClose();
        if (addedTo) void navigate(`${paths.payWeek(addedTo)}?person=${personId}`);
      }}
    />
  );
}

function PersonLink({
  dto,
  person,
  label,
  icon,
}: {
  dto: PayWeekDto;
  person: PersonWeek | undefined;
  label: string;
  icon: string;
}) {
  if (!person) return null;
  return (
    <Link to={paths.payWorking(dto.week.startsOn, person.personId)} aria-label={`${label}: ${person.name}`}>
      <Icon name={icon} />
    </Link>
  );
}

/** Up and down go from line to line and choose it; the link that gets the focus is followed. */
function stepThroughLines(event: KeyboardEvent<HTMLElement>): void {
  const by = event.key === 'ArrowDown' ? 1 : event.key === 'ArrowUp' ? -1 : 0;
  if (by === 0) return;
  const links = [...event.currentTarget.querySelectorAll<HTMLAnchorElement>('a.pl')];
  const at = links.findIndex((link) => link === document.activeElement);
  const next = links[at + by];
  if (!next) return;
  event.preventDefault();
  next.focus();
  next.click();
}
