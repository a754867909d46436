import { commissionTest } from '@driprail/shared/domain/pay/commission-test';
import type { CommissionTest, TestedWeek } from '@driprail/shared/domain/pay/commission-test';
import { select } from '../../db/sequelize.ts';

/** The newest 52 locked weeks of a person under the two tests of 29 USC 207(i) that figures can answer. */
export async function testCommission(personId: string): Promise<CommissionTest> {
  const weeks = await select<TestedWeek>(
    `SELECT w.snapshot->'rules'->>'minimumWage' AS "minimumWage", s.summary AS person
       FROM pay_statements s JOIN pay_weeks w ON w.id = s.pay_week_id
      WHERE s.person_id = :personId AND w.state = 'locked' ORDER BY w.starts_on DESC LIMIT 52`,
    { personId },
  );
  return commissionTest(weeks);
}
