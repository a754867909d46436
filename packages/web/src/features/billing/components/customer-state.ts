import type { CustomerPageDto } from '@driprail/shared/contracts/customer-page.contract';

import { formatClock, formatDate, formatSpan } from '@driprail/shared/domain/time/format';
import { dayOf } from '@driprail/shared/domain/time/zone';

/** What a customer reads first: a short head, a time if there is one, and a sentence. */
export function customerState(page: CustomerPageDto): { head: string; time: string | null; words: string } {
  const { zone, clock, name, since, windowFrom, windowTo } = page;
  const crew = crewWords(page);
  const at = since ? formatClock(since, zone, clock) : '';
  const day = windowFrom ? formatDate(dayOf(windowFrom, zone)) : '';
  const window = windowFrom && windowTo ? formatSpan(windowFrom, windowTo, zone, clock) : null;
  switch (page.progress) {
    case 'unplaced':
    case 'placed':
      return {
        head: `Booked, ${name}`,
        time: window,
        words: window ? `${day}. ${comes(page)} in this window.` : 'The time is still to be agreed. We call you.',
      };
    case 'on_the_way':
      return {
        head: 'On the way',
        time: page.expectedAt ? `about ${formatClock(page.expectedAt, zone, clock)}` : null,
        words: `${crew} set off at ${at}. ${page.expectedAt ? 'The time is an estimate.' : ''}`.trim(),
      };
    case 'on_site':
      return { head: 'We are here', time: null, words: `${crew} arrived at ${at}.` };
    case 'working':
      return { head: 'At work', time: null, words: `${crew} started at ${at}.` };
    case 'part_done':
      return {
        head: 'Part done',
        time: null,
        words: `A part is finished. The rest comes on another day; we call you.`,
      };
    case 'done':
      return { head: `Done, ${name}`, time: null, words: `${crew} finished at ${at}.` };
    case 'called_off':
      return { head: 'Called off', time: null, words: 'Nobody comes. Call us for another day.' };
  }
}

function crewWords({ crewNames }: CustomerPageDto): string {
  return crewNames.length === 0 ? 'The crew' : crewNames.join(' and ');
}

function comes(page: CustomerPageDto): string {
  const { crewNames, vanName } = page;
  if (crewNames.length === 0) return 'A crew comes';
  return `${crewNames.join(' and ')} ${crewNames.length === 1 ? 'comes' : 'come'}${vanName ? ` in the van ${vanName}` : ''}`;
}
