import type { Locator, Page } from 'playwright-core';

/** A visit's ticket on a lane, by its customer's name. */
export function ticket(page: Page, customer: string): Locator {
  return page.locator(`[data-event-id][aria-label^="${customer}, "]:not(.fc-event-mirror)`);
}

/** A visit's tag on Unplaced. */
export function tag(page: Page, customer: string): Locator {
  return page.locator('[data-unplaced-id]', { hasText: customer });
}

/** A visit's ticket in the lane of one van; waits for nothing. */
export async function ticketOn(page: Page, van: string, customer: string): Promise<Locator> {
  return (await lane(page, van)).locator(`[data-event-id][aria-label^="${customer}, "]:not(.fc-event-mirror)`);
}

async function lane(page: Page, van: string): Promise<Locator> {
  const vanId = await page.locator('th[data-resource-id]', { hasText: van }).getAttribute('data-resource-id');
  return page.locator(`td.fc-timegrid-col[data-resource-id="${vanId}"]`);
}

/** The time a ticket shows, like "11:15–12:10". */
export function timeOn(found: Locator): Promise<string> {
  return found.locator('.tm').innerText();
}

/** Drags a placed ticket with the mouse, so that it starts at a clock time ("13:05") of a van's lane. */
export async function dragTicket(page: Page, customer: string, van: string, time: string): Promise<void> {
  const found = ticket(page, customer);
  await isStill(page);
  const box = await boxOf(found);
  const from = await timeAt(page, box.y);
  const x = await middleOf(await lane(page, van));
  // A ticket moves by as much as the pointer: where in it one grabs does not matter.
  const y = (await heightOf(page, time)) - (await heightOf(page, from));
  const grab = { x: box.x + box.width / 2, y: box.y + 4 };
  await dragMouse(page, grab, { x, y: grab.y + y }, await lane(page, van));
}

/** Drags a tag down from Unplaced onto a lane. */
export async function dragTag(page: Page, customer: string, van: string, time: string): Promise<void> {
  await isStill(page);
  const box = await boxOf(tag(page, customer));
  const to = { x: await middleOf(await lane(page, van)), y: (await heightOf(page, time)) + 2 };
  await dragMouse(page, { x: box.x + box.width / 2, y: box.y + 12 }, to, await lane(page, van));
}

/** Drags a ticket back up to Unplaced. */
export async function dragToRoof(page: Page, customer: string): Promise<void> {
  await isStill(page);
  const box = await boxOf(ticket(page, customer));
  const roof = await boxOf(page.getByRole('heading', { name: /^Unplaced/ }));
  await dragMouse(page, { x: box.x + box.width / 2, y: box.y + 4 }, { x: roof.x + 40, y: roof.y + roof.height / 2 });
}

/** Pulls a ticket's lower edge to a clock time. */
export async function resizeTicket(page: Page, customer: string, time: string): Promise<void> {
  await isStill(page);
  const found = ticket(page, customer);
  await found.hover(); // The edge can be taken once the pointer is over the ticket.
  const box = await boxOf(found);
  const end = await heightOf(page, await timeAt(page, box.y + box.height));
  const from = { x: box.x + box.width / 2, y: box.y + box.height - 2 };
  await dragMouse(page, from, { x: from.x, y: from.y + (await heightOf(page, time)) - end });
}

async function dragMouse(page: Page, from: Point, to: Point, over?: Locator): Promise<void> {
  await page.mouse.move(from.x, from.y);
  await page.mouse.down();
  await page.mouse.move(from.x + 4, from.y + 4);
  await page.mouse.move(from.x + 12, from.y + 12); // Past the distance that makes a press a drag.
  await page.mouse.move(to.x, to.y, { steps: 5 });
  await page.mouse.move(to.x + 1, to.y);
  // The calendar has taken this place: letting go earlier would drop nowhere.
  await over?.locator('.fc-event-mirror').first().waitFor();
  await page.mouse.up();
  await isStill(page);
}

/** Nothing hangs in the air: a drag that is being put back would swallow the next one. */
async function isStill(page: Page): Promise<void> {
  await page.waitForFunction(() => !document.querySelector('.fc-event-mirror, .fc-event-dragging'));
}

interface Point {
  x: number;
  y: number;
}

async function boxOf(found: Locator) {
  const box = await found.boundingBox();
  if (!box) throw new Error('What should be dragged is not on the screen.');
  return box;
}

async function middleOf(found: Locator): Promise<number> {
  const box = await boxOf(found);
  return box.x + box.width / 2;
}

/** The clock time of the row nearest to a height: labels count to twelve, rows to twenty-four. */
async function timeAt(page: Page, y: number): Promise<string> {
  const times = await page
    .locator('td.fc-timegrid-slot-lane')
    .evaluateAll((cells) =>
      cells.map((cell) => ({ time: cell.getAttribute('data-time') ?? '', top: cell.getBoundingClientRect().top })),
    );
  const [nearest] = times.sort((a, b) => Math.abs(a.top - y) - Math.abs(b.top - y));
  return nearest?.time.slice(0, 5) ?? '';
}

/** Where a clock time lies on the screen; a row of the lanes is five minutes. */
async function heightOf(page: Page, time: string): Promise<number> {
  return (await boxOf(page.locator(`td.fc-timegrid-slot-lane[data-time="${time}:00"]`))).y;
}
