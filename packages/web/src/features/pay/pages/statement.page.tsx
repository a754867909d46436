import { useQuery } from '@tanstack/react-query';
import { useAbility } from '@casl/react';
import { Link, useParams } from 'react-router';
import type { AppAbility } from '@driprail/shared/authz/ability';
import type { PayWeekDto, StatementDto } from '@driprail/shared/contracts/pay.contract';
import { paths } from '../../../app/paths.ts';
import { Button } from '../../../components/button.tsx';
import { Icon } from '../../../components/icon.tsx';
import { PageHead, RailPage } from '../../../components/page-head.tsx';
import { Empty } from '../../../components/states.tsx';
import { hoursMinutes, money } from '../../../lib/format.ts';
import { useSession } from '../../../lib/session.tsx';
import { statementQuery, wholeWeekQuery } from '../api/pay.queries.ts';
import { LoadedPage } from '../components/loaded-page.tsx';
import { StatementPaper } from '../components/statement-paper.tsx';
import { hoursSum, weekSpan, weekSums } from '../components/week-model.ts';
import './pay.css';
import './pay-working.css';
import './statement.css';

/** One person's statement of a week, or everybody's, one a page. */
export function StatementPage() {
  const { day = '', personId = '' } = useParams();
  return personId === 'all' ? <EveryStatement day={day} /> : <OneStatement day={day} personId={personId} />;
}

function OneStatement({ day, personId }: { day: string; personId: string }) {
  const statement = useQuery(statementQuery(day, personId));
  return (
    <LoadedPage title="Statement" query={statement} what="the statement">
      {(found) => <Papers week={found.week} statements={[found]} />}
    </LoadedPage>
  );
}

function statementsOf(dto: PayWeekDto, companyName: string): StatementDto[] {
  const { week, correctedLines, customers } = dto;
  return dto.people.flatMap((person) => {
    const yearToDate = dto.yearsToDate[person.personId];
    const timeOff = dto.timeOff[person.personId] ?? [];
    return yearToDate ? [{ week, person, companyName, correctedLines, customers, yearToDate, timeOff }] : [];
  });
}

function EveryStatement({ day }: { day: string }) {
  const { company } = useSession();
  const week = useQuery(wholeWeekQuery(day));
  return (
    <LoadedPage title="Statement" query={week} what="the pay week">
      {(dto) => <Papers week={dto.week} statements={statementsOf(dto, company.name)} />}
    </LoadedPage>
  );
}

function Papers({ week, statements }: { week: StatementDto['week']; statements: StatementDto[] }) {
  const ability = useAbility<AppAbility>();
  const isOwner = ability.can('read', 'PayWeek');
  const people = statements.map((statement) => statement.person);
  return (
    <>
      <div className="no-print">
        <PageHead
          title={`Week ${week.number}`}
          above={
            isOwner ? (
              <Link className="back" to={paths.payWeek(week.startsOn)}>
                <Icon name="left" /> Pay week
              </Link>
            ) : (
              <Link className="back" to={paths.statements}>
                <Icon name="left" /> My pay
              </Link>
            )
          }
          sums={[
            { label: 'Gross', value: money(weekSums(people).gross) },
            { label: 'Hours', value: hoursMinutes(hoursSum(people, 'hoursWorked')) },
            { label: 'Over 40 h', value: hoursMinutes(hoursSum(people, 'overtimeHours')) },
          ]}
          actions={
            <>
              {people.length === 1 && people[0] ? (
                <a
                  className="btn"
                  href={pdfOf(week.startsOn, people[0].personId)}
                  download={`statement-${week.startsOn}.pdf`}
                >
                  <Icon name="dn" /> PDF
                </a>
              ) : null}
              <Button onClick={() => window.print()}>
                <Icon name="print" /> {people.length === 1 ? 'Print statement' : `Print ${people.length} statements`}
              </Button>
            </>
          }
        />
      </div>
      <RailPage>
        <h2 className="sr">Statements, {weekSpan(week)}</h2>
        {statements.length === 0 ? <Empty>Nobody has pay in this week.</Empty> : null}
        <div className="papers">
          {statements.map((statement) => (
            <StatementPaper key={statement.person.personId} statement={statement} hasLinks={isOwner} />
          ))}
        </div>
      </RailPage>
    </>
  );
}

function pdfOf(startsOn: string, personId: string): string {
  return `/api/pay/statements/${startsOn}/${personId}/statement.pdf`;
}
