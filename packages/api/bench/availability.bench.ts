import { addDays } from '@driprail/shared/domain/time/zone';
import { dayBounds } from '@driprail/shared/domain/time/zone-instants';
import { companyOf } from '../src/db/company.ts';
import { inTransaction, run, select } from '../src/db/sequelize.ts';
import { readVanDays, readWindows, vanDaysSql } from '../src/features/online-booking/index.ts';
import type { Ratio } from './measure.ts';
import { inTurn, median, timed } from './measure.ts';
import type { BenchStage } from './stage.ts';

const ROUNDS = 100;
const DAYS = 30;
const VANS = 6;
const work = {
  ...{ lineMinutes: [90], skills: [], equipment: [], bringsWater: false, bringsPower: false },
  place: { lat: 40.62, lng: -70.35 },
};

/** All free arrival windows of six vans over thirty days, against the plain statement that reads the same rows. */
export async function benchAvailability({ day, now }: BenchStage): Promise<Ratio> {
  await fillDays(day);
  const at = new Date(now);
  const { zone } = await companyOf();
  const span = { from: dayBounds(day, zone).startsAt, to: dayBounds(addDays(day, DAYS), zone).endsAt };
  const ask = { ...span, now: at.toISOString(), ownHold: null, ownJob: null };
  const { vans } = await readVanDays(ask);
  const offered = (await readWindows(work, at)).flatMap((one) => one.windows).filter(({ isFree }) => isFree).length;
  const [search, plain] = await inTurn(
    ROUNDS,
    10,
    () => timed(() => readWindows(work, at)),
    () => timed(() => select(vanDaysSql, ask)),
  );
  const [a, b] = [median(search), median(plain)];
  const stops = vans.reduce((sum, van) => sum + van.busy.length, 0);
  return {
    what: `availability of ${vans.length} vans over ${DAYS} days / the plain statement that reads the same rows`,
    ratio: a / b,
    goal: 8,
    note: `${a.toFixed(1)} ms / ${b.toFixed(1)} ms, ${stops} stops, ${offered} windows free, median of ${ROUNDS}`,
  };
}

/** The demo plans a week ahead: today's crews and stops stand for each day after that has none. */
function fillDays(day: string): Promise<void> {
  const isOn = (span: string, on: string) => `(lower(${span}) AT TIME ZONE c.zone)::date = ${on}::date`;
  const later = (span: string) =>
    `tstzrange(lower(${span}) + :ahead * interval '1 day', upper(${span}) + :ahead * interval '1 day')`;
  return inTransaction(async (tx) => {
    await run(
      'UPDATE vans SET is_active = false WHERE id NOT IN (SELECT id FROM vans ORDER BY position LIMIT :vans)',
      { vans: VANS },
      tx,
    );
    await run('UPDATE online_booking_settings SET farthest_days = :days, notice_hours = 0', { days: DAYS }, tx);
    for (let ahead = 1; ahead <= DAYS; ahead += 1) {
      const copy = { day, on: addDays(day, ahead), ahead };
      await run(
        `INSERT INTO van_crew (id, person_id, van_id, span, position)
         SELECT gen_random_uuid(), r.person_id, r.van_id, ${later('r.span')}, r.position FROM van_crew r, company_settings c
          WHERE ${isOn('r.span', ':day')} AND NOT EXISTS (SELECT 1 FROM van_crew o WHERE ${isOn('o.span', ':on')})`,
        copy,
        tx,
      );
      await run(
        `INSERT INTO visits (id, job_id, stop_id, part, van_id, planned, minutes, progress)
         SELECT gen_random_uuid(), v.job_id, v.stop_id, v.part + 100 * :ahead, v.van_id, ${later('v.planned')}, v.minutes, 'placed'
           FROM visits v, company_settings c
          WHERE ${isOn('v.planned', ':day')} AND v.progress <> 'called_off'
            AND NOT EXISTS (SELECT 1 FROM visits o WHERE ${isOn('o.planned', ':on')})`,
        copy,
        tx,
      );
    }
  });
}
