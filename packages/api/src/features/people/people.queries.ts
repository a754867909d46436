import type { Transaction } from 'sequelize';
import type { PersonDto } from '@driprail/shared/contracts/people.contract';
import { select } from '../../db/sequelize.ts';

/** People with their standing today; `id` narrows to one. */
export async function listPeople(today: string, id: string | null = null, tx?: Transaction): Promise<PersonDto[]> {
  return select<PersonDto>(
    `SELECT p.id, p.name, p.phone, p.skills, p.is_trainee AS "isTrainee", p.is_active AS "isActive", p.version,
            coalesce((SELECT shares_tips FROM tip_standings s WHERE s.person_id = p.id AND s.starts_on <= :today
                       ORDER BY starts_on DESC LIMIT 1), true) AS "sharesTips",
            (SELECT u.role FROM users u WHERE u.person_id = p.id AND u.is_active) AS "loginRole",
            coalesce((SELECT json_agg(json_build_object('id', t.id, 'startsOn', t.starts_on, 'endsOn', t.ends_on, 'note', t.note)
                       ORDER BY t.starts_on) FROM time_off t WHERE t.person_id = p.id AND t.ends_on >= :today), '[]') AS "timeOff"
       FROM people p WHERE (:id::uuid IS NULL OR p.id = :id::uuid) ORDER BY p.is_active DESC, p.name`,
    { today, id },
    tx,
  );
}
