import type { BrowserContext, Page } from 'playwright-core';

import type { DemoLogin, sizes } from './browser.ts';
import { TODAY } from './moment.ts';

/** A screen as one role sees it. */
export interface Screen {
  /** For file names, together with the role. */
  name: string;
  role: 'owner' | 'dispatcher' | 'technician' | 'crew' | 'nobody';
  /** Where it is; some lie behind an id that only the server knows. */
  path: string | ((context: BrowserContext) => Promise<string>);
  /** What has to be pressed for it to open. */
  open?: (page: Page) => Promise<void>;
  /** Drawn for the phone alone. */
  isPhoneOnly?: boolean;
  /** Looked at in the night and in the sun as well. */
  hasGrounds?: boolean;
}

export type Size = keyof typeof sizes;

/** The last week that is over, and not locked yet; the one before it is. */
const LAST_WEEK = '2026-05-04';
const LOCKED_WEEK = '2026-04-27';

export const logins = {
  owner: 'owner',
  dispatcher: 'dispatch',
  technician: 'tech1',
  /** A technician whose crew is at work at this hour. */
  crew: 'tech5',
} as const satisfies Record<string, DemoLogin>;

async function read<T>(context: BrowserContext, path: string): Promise<T> {
  const answer = await context.request.get(path);
  if (!answer.ok()) throw new Error(`${path} answered ${answer.status()}.`);
  return (await answer.json()) as T;
}

async function ownPersonId(context: BrowserContext): Promise<string> {
  const { user } = await read<{ user: { personId: string } }>(context, '/api/session');
  return user.personId;
}

async function somebodyId(context: BrowserContext): Promise<string> {
  const { people } = await read<{ people: { id: string; name: string }[] }>(context, '/api/people');
  return people.find(({ name }) => name === 'Idris Vale')?.id ?? '';
}

async function customerPath(context: BrowserContext): Promise<string> {
  const { customers } = await read<{ customers: { id: string }[] }>(context, '/api/customers?find=Odette');
  return `/customers/${customers[0]?.id ?? ''}`;
}

async function openVisitPath(context: BrowserContext): Promise<string> {
  const board = await read<{ visits: { id: string; customerName: string }[] }>(context, `/api/board/${TODAY}`);
  return `/board?visit=${board.visits.find((visit) => visit.customerName === 'Odette Yarrow')?.id ?? ''}`;
}

/** The visit of the technician who is at the car, or about to be. */
async function ownVisit(context: BrowserContext): Promise<{ id: string }> {
  const { visits } = await read<{ visits: { id: string; progress: string }[] }>(context, `/api/run-sheet/${TODAY}`);
  const open = visits.find(({ progress }) => ['on_site', 'on_the_way', 'placed'].includes(progress));
  return open ?? visits[0] ?? { id: '' };
}

const walkPath = async (context: BrowserContext) => `/walk-round/${(await ownVisit(context)).id}`;

async function begunWalkPath(context: BrowserContext): Promise<string> {
  const { visits } = await read<{ visits: { id: string; progress: string }[] }>(context, `/api/run-sheet/${TODAY}`);
  return `/walk-round/${visits.find(({ progress }) => progress === 'working' || progress === 'done')?.id ?? ''}`;
}

async function walkRecordPath(context: BrowserContext): Promise<string> {
  return `${(await openVisitPath(context)).replace('/board?visit=', '/visits/')}/walk-round`;
}

/** The job's page of a technician's visit: one that is worked on, or one with something to know first. */
const jobPath = (part: string, isIt: (work: { progress: string; mustKnows: object[] }) => boolean) =>
  async function path(context: BrowserContext): Promise<string> {
    type Work = { visitId: string; progress: string; mustKnows: object[] };
    const { works } = await read<{ works: Work[] }>(context, `/api/run-sheet/${TODAY}/work`);
    return `/run-sheet/${TODAY}/job/${works.find(isIt)?.visitId ?? ''}/${part}`;
  };
const isWorking = (work: { progress: string }) => work.progress === 'working';

/** The bill of a visit that is done, at the car. */
async function collectPath(context: BrowserContext): Promise<string> {
  const { visits } = await read<{ visits: { id: string; progress: string }[] }>(context, `/api/run-sheet/${TODAY}`);
  return `/run-sheet/${TODAY}/job/${visits.findLast(({ progress }) => progress === 'done')?.id ?? ''}/pay`;
}

/** The customer's own page of that job. */
async function customerPagePath(context: BrowserContext): Promise<string> {
  const { visits } = await read<{ visits: { jobId: string; progress: string }[] }>(context, `/api/run-sheet/${TODAY}`);
  const jobId = visits.findLast(({ progress }) => progress === 'done')?.jobId ?? '';
  const answer = await context.request.post(`/api/jobs/${jobId}/pay-link`);
  return new URL(((await answer.json()) as { url: string }).url).pathname;
}

async function openChange(page: Page): Promise<void> {
  for (const name of ['Change the job', 'Add a service', /^Odor treatment/])
    await page.getByRole('button', { name }).first().click();
}

async function openSteps(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Steps of Two-step polish' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Change', exact: true }).first().click();
}

const openFiles = (page: Page) => page.locator('.files-menu summary').click();
const press = (name: string | RegExp) => (page: Page) =>
  page
    .getByRole('button', { name, exact: typeof name === 'string' })
    .first()
    .click();

async function openBill(page: Page): Promise<void> {
  await page.locator('.mo-table tbody a').first().click();
  await page.locator('.bl-head').waitFor();
}

async function openMark(page: Page): Promise<void> {
  await press(/^Marks/)(page);
  await press('Add a mark from a list of places')(page);
}

const door: Screen[] = [
  { name: 'sign-in', role: 'nobody', path: '/sign-in' },
  { name: 'forgotten', role: 'nobody', path: '/forgotten' },
];

const desk: Screen[] = (['owner', 'dispatcher'] as const).flatMap((role) => [
  { name: 'board', role, path: '/board', hasGrounds: role === 'dispatcher' },
  { name: 'board-open', role, path: openVisitPath },
  { name: 'job-new', role, path: '/board', open: press('New job') },
  { name: 'walk-record', role, path: walkRecordPath },
  { name: 'customers', role, path: '/customers' },
  { name: 'customer', role, path: customerPath },
  { name: 'customer-edit', role, path: customerPath, open: press('Edit') },
  { name: 'customer-duplicates', role, path: '/customers', open: press(/^Likely duplicates/) },
  { name: 'customer-data', role, path: async (context) => `${await customerPath(context)}/data` },
  { name: 'due-again', role, path: '/due-again' },
  { name: 'messages', role, path: '/messages' },
  { name: 'service-menu', role, path: '/service-menu' },
  { name: 'vans', role, path: '/vans' },
  { name: 'people', role, path: '/people' },
  { name: 'hours', role, path: '/hours' },
  { name: 'money', role, path: '/money', hasGrounds: role === 'dispatcher' },
  { name: 'money-bill', role, path: '/money?state=all', open: openBill },
  { name: 'cash', role, path: '/money/cash' },
  { name: 'money-day', role, path: `/money/day/${TODAY}` },
  { name: 'account', role, path: '/account' },
]);

const office: Screen[] = [
  { name: 'message-words', role: 'owner', path: '/messages/words' },
  { name: 'van', role: 'owner', path: '/vans', open: press('Edit Plover') },
  { name: 'person', role: 'owner', path: '/people', open: press('Edit') },
  { name: 'service', role: 'owner', path: '/service-menu', open: press('Edit') },
  { name: 'service-steps', role: 'owner', path: '/service-menu', open: openSteps },
  { name: 'surcharge', role: 'owner', path: '/service-menu', open: press('Change') },
  { name: 'pay-week', role: 'owner', path: `/pay/${LAST_WEEK}` },
  { name: 'pay-week-locked', role: 'owner', path: `/pay/${LOCKED_WEEK}` },
  { name: 'pay-week-files', role: 'owner', path: `/pay/${LOCKED_WEEK}`, open: openFiles },
  { name: 'paydays', role: 'owner', path: '/pay/paydays', hasGrounds: true },
  { name: 'pay-working', role: 'owner', path: async (context) => `/pay/${LAST_WEEK}/${await somebodyId(context)}` },
  { name: 'pay-rates', role: 'owner', path: '/pay-rates' },
  {
    name: 'statement',
    role: 'owner',
    path: async (context) => `/statements/${LOCKED_WEEK}/${await somebodyId(context)}`,
  },
  { name: 'settings', role: 'owner', path: '/settings' },
  { name: 'taxes', role: 'owner', path: '/settings/taxes' },
  { name: 'online-booking', role: 'owner', path: '/settings/online-booking' },
  { name: 'logins', role: 'owner', path: '/logins' },
  { name: 'local-mail', role: 'owner', path: '/local-mail' },
];

const own: Screen[] = (['dispatcher', 'technician'] as const).flatMap((role) => [
  { name: 'statements', role, path: '/statements' },
  { name: 'statement', role, path: async (context) => `/statements/${LOCKED_WEEK}/${await ownPersonId(context)}` },
]);

const phone: Screen[] = [
  { name: 'book', role: 'nobody', path: '/book', hasGrounds: true },
  { name: 'first-help', role: 'nobody', path: '/first-aid', hasGrounds: true },
  { name: 'run-sheet', role: 'technician', path: '/run-sheet', isPhoneOnly: true, hasGrounds: true },
  { name: 'run-sheet-tomorrow', role: 'technician', path: '/run-sheet/2026-05-15', isPhoneOnly: true },
  { name: 'trouble', role: 'technician', path: '/run-sheet', open: press('Trouble'), isPhoneOnly: true },
  { name: 'collect', role: 'technician', path: collectPath, isPhoneOnly: true, hasGrounds: true },
  { name: 'customer-page', role: 'technician', path: customerPagePath, isPhoneOnly: true, hasGrounds: true },
  {
    ...{ name: 'job-know', role: 'technician', isPhoneOnly: true, hasGrounds: true },
    path: jobPath('know', ({ progress, mustKnows }) => progress === 'placed' && mustKnows.length > 0),
  },
  { name: 'job-steps', role: 'crew', path: jobPath('steps', isWorking), isPhoneOnly: true, hasGrounds: true },
  { name: 'job-change', role: 'crew', path: jobPath('change', isWorking), open: openChange, isPhoneOnly: true },
  { name: 'job-done', role: 'crew', path: jobPath('done', isWorking), isPhoneOnly: true },
  { name: 'clock', role: 'technician', path: '/clock', isPhoneOnly: true },
  { name: 'walk-round', role: 'technician', path: walkPath, isPhoneOnly: true, hasGrounds: true },
  {
    name: 'walk-round-marks',
    role: 'technician',
    path: walkPath,
    open: press(/^Marks/),
    isPhoneOnly: true,
    hasGrounds: true,
  },
  { name: 'walk-round-mark', role: 'technician', path: walkPath, open: openMark, isPhoneOnly: true },
  { name: 'walk-round-condition', role: 'technician', path: walkPath, open: press(/^Condition/), isPhoneOnly: true },
  { name: 'walk-round-customer', role: 'technician', path: walkPath, open: press(/^Customer/), isPhoneOnly: true },
  { name: 'walk-round-after', role: 'technician', path: begunWalkPath, isPhoneOnly: true },
  { name: 'account', role: 'technician', path: '/account' },
];

/** Every screen of the demo company; setting up an empty one is looked at beside them. */
export const screens: Screen[] = [...door, ...desk, ...office, ...own, ...phone];

/** Opens a screen and waits until nothing is being fetched any more. */
export async function show(page: Page, context: BrowserContext, { path, open }: Screen): Promise<void> {
  await page.goto(typeof path === 'string' ? path : await path(context));
  await settled(page);
  if (!open) return;
  await open(page);
  await settled(page);
}

/** The page's name is there, and no bead runs along a rail. */
export async function settled(page: Page): Promise<void> {
  await page.locator('main h1, .dk-head h1, .board-page h1').first().waitFor();
  await page.locator('.fetching').first().waitFor({ state: 'detached' });
  await page.evaluate(() => document.fonts.ready);
}
