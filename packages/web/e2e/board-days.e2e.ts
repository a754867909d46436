import { expect, test } from 'vitest';

import { dragTag, ticketOn } from './support/board.ts';
import { openPage, useStage } from './support/stage.ts';
import { aSmallCompany } from './support/small-company.ts';

// The two days on which New York's clocks change, seen from a browser in Tokyo. Before the change and
// after it, a visit starts at the clock time of the row it was let go on, and keeps its hour.
const stage = useStage({ demo: false, now: '2026-03-06T15:00:00.000Z' });

test.each([
  { day: '2026-03-08', time: '01:30', from: '2026-03-08T06:30:00.000Z', to: '2026-03-08T07:30:00.000Z' },
  { day: '2026-03-08', time: '09:00', from: '2026-03-08T13:00:00.000Z', to: '2026-03-08T14:00:00.000Z' },
  { day: '2026-11-01', time: '00:30', from: '2026-11-01T04:30:00.000Z', to: '2026-11-01T05:30:00.000Z' },
  { day: '2026-11-01', time: '09:00', from: '2026-11-01T14:00:00.000Z', to: '2026-11-01T15:00:00.000Z' },
])('an hour from $time on $day', async ({ day, time, from, to }) => {
  const { owner, bookJob } = await company();
  const visitId = await bookJob();
  const page = await openPage(owner, `/board/${day}`);
  expect(await page.evaluate(() => Intl.DateTimeFormat().resolvedOptions().timeZone)).toBe('Asia/Tokyo');
  await page.locator(`[data-unplaced-id="${visitId}"]`).waitFor();
  await dragTag(page, 'Orla Finch', 'Heron', time);
  await expect
    .poll(async () => (await visitsOf(day)).find((visit) => visit.id === visitId))
    .toMatchObject({ from, to });

  // It hangs where it was let go, also after the board was fetched anew.
  await page.reload();
  const placed = await ticketOn(page, 'Heron', 'Orla Finch');
  await placed.first().waitFor();
  const row = await page.locator(`td.fc-timegrid-slot-lane[data-time="${time}:00"]`).boundingBox();
  const tops = await placed.evaluateAll((tickets) => tickets.map((ticket) => ticket.getBoundingClientRect().top));
  expect(tops.some((top) => Math.abs(top - (row?.y ?? 0)) <= 2)).toBe(true);
  await page.close();
});

let made: ReturnType<typeof aSmallCompany> | undefined;

/** One company for all days; its board shows the whole night. */
function company(): ReturnType<typeof aSmallCompany> {
  made ??= aSmallCompany(stage).then(async (small) => {
    const { settings } = (await (await small.owner.request.get('/api/settings')).json()) as { settings: object };
    const answer = await small.owner.request.put('/api/settings', {
      data: { ...settings, dayStartsAt: '00:00', dayEndsAt: '12:00' },
    });
    if (!answer.ok()) throw new Error(await answer.text());
    return small;
  });
  return made;
}

async function visitsOf(day: string): Promise<{ id: string; from: string | null; to: string | null }[]> {
  const { owner } = await company();
  const board = (await (await owner.request.get(`/api/board/${day}`)).json()) as {
    visits: { id: string; from: string | null; to: string | null }[];
  };
  return board.visits;
}
