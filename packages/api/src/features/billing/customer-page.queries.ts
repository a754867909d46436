import type { CustomerPageDto, CustomerPhotoDto } from '@driprail/shared/contracts/customer-page.contract';
import { isEnded } from '@driprail/shared/domain/board/progress';
import { dayOf } from '@driprail/shared/domain/time/zone';
import { companyOf } from '../../db/company.ts';
import { select } from '../../db/sequelize.ts';
import { notFound } from '../../http/errors.ts';
import { readVisits } from '../board/index.ts';
import { listCustomerPhotos } from '../walk-round/index.ts';
import { isOver, readBill } from './bill.presenter.ts';
import { readJobRow } from './bill.queries.ts';

type Visits = Awaited<ReturnType<typeof readVisits>>;

/** What a customer sees of a job. @throws 404 */
export async function readCustomerPage(jobId: string, now: Date): Promise<CustomerPageDto> {
  const [company, bill, visits, extras, photos] = await Promise.all([
    companyOf(),
    readBill(jobId, now),
    readVisits({ jobId }),
    readExtras(jobId),
    readShownPhotos(jobId),
  ]);
  const visit = shownVisit(visits);
  if (!visit || !extras) throw notFound('That page');
  const isToday = visit.from !== null && dayOf(visit.from, company.zone) === dayOf(now.toISOString(), company.zone);
  const { customerId: _id, billTo: _to, refunds: _refunds, ...shownBill } = bill;
  return {
    ...{ companyName: company.name, companyPhone: company.phone, zone: company.zone, clock: company.clock },
    name: extras.isCompany ? extras.customerName : (extras.customerName.split(/\s+/)[0] ?? ''),
    ...{ jobNumber: bill.jobNumber, progress: visit.progress, since: visit.since },
    ...{ windowFrom: visit.windowFrom, windowTo: visit.windowTo },
    expectedAt: visit.progress === 'on_the_way' && isToday ? visit.from : null,
    vanName: extras.vans[visit.vanId ?? ''] ?? '',
    crewNames: visit.crew.map((person) => person.name.split(/\s+/)[0] ?? ''),
    bill: shownBill,
    photos,
    ...{ tipCents: extras.tipCents, isPaying: extras.isPaying, feedback: extras.feedback },
  };
}

/** Before and after come with the work done: earlier, they are the crew's record alone. */
export async function readShownPhotos(jobId: string): Promise<CustomerPhotoDto[]> {
  const job = await readJobRow(jobId);
  return job && isOver(job) ? listCustomerPhotos(jobId) : [];
}

/** The one under way, else the next to come, else the last. */
function shownVisit(visits: Visits): Visits[number] | undefined {
  const open = visits.filter((visit) => !isEnded(visit.progress));
  const underWay = open.find((visit) => ['on_the_way', 'on_site', 'working'].includes(visit.progress));
  const next = open.toSorted((a, b) => (a.from ?? '9').localeCompare(b.from ?? '9'))[0];
  return underWay ?? next ?? visits.at(-1);
}

interface Extras {
  customerName: string;
  isCompany: boolean;
  vans: Record<string, string>;
  tipCents: number;
  isPaying: boolean;
  feedback: { stars: number; words: string } | null;
}

async function readExtras(jobId: string): Promise<Extras | null> {
  const [row] = await select<Extras>(
    `SELECT c.name AS "customerName", c.is_company AS "isCompany",
            coalesce((SELECT json_object_agg(v.id, v.name) FROM vans v), '{}') AS vans,
            (SELECT coalesce(sum(amount_cents), 0)::bigint FROM tips WHERE job_id = j.id) AS "tipCents",
            EXISTS (SELECT 1 FROM card_attempts a WHERE a.job_id = j.id AND a.state = 'open') AS "isPaying",
            (SELECT json_build_object('stars', f.stars, 'words', f.words) FROM feedback f WHERE f.job_id = j.id) AS feedback
       FROM jobs j JOIN customers c ON c.id = j.customer_id WHERE j.id = :jobId`,
    { jobId },
  );
  return row ?? null;
}
