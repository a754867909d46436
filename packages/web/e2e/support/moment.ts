/** Thursday 14 May 2026, 11:00 in New York: the morning the demo's board is scripted for. */
export const NOON = '2026-05-14T15:00:00.000Z';
export const TODAY = '2026-05-14';
