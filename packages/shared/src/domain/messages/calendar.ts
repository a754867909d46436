import ICAL from 'ical.js';

export interface CalendarEntry {
  /** The visit's id: the same for its whole life, so that a later file replaces the earlier one. */
  visitId: string;
  /** Higher with each change that matters. */
  sequence: number;
  /** ISO instants. */
  from: string;
  to: string;
  madeAt: string;
  summary: string;
  description: string;
  /** The customer's own page. */
  url: string;
  isCalledOff: boolean;
}

/**
 * A calendar file of one arrival window. Times are in UTC; the street is not in it, and no code.
 * Source: RFC 5545 sections 3.4, 3.6.1, 3.8.1.11 (STATUS), 3.8.7.4 (SEQUENCE).
 * @returns text with CRLF line ends, folded at 75 octets
 */
export function calendarFile(entry: CalendarEntry): string {
  const calendar = new ICAL.Component('vcalendar');
  calendar.updatePropertyWithValue('prodid', '-//Driprail//Messages//EN');
  calendar.updatePropertyWithValue('version', '2.0');
  calendar.updatePropertyWithValue('method', 'PUBLISH');
  const event = new ICAL.Component('vevent');
  event.updatePropertyWithValue('uid', `visit-${entry.visitId}@driprail`);
  event.updatePropertyWithValue('sequence', entry.sequence);
  event.updatePropertyWithValue('dtstamp', utc(entry.madeAt));
  event.updatePropertyWithValue('dtstart', utc(entry.from));
  event.updatePropertyWithValue('dtend', utc(entry.to));
  event.updatePropertyWithValue('summary', oneBreak(entry.summary));
  event.updatePropertyWithValue('description', oneBreak(entry.description));
  event.updatePropertyWithValue('url', entry.url);
  event.updatePropertyWithValue('status', entry.isCalledOff ? 'CANCELLED' : 'CONFIRMED');
  calendar.addSubcomponent(event);
  return `${calendar.toString()}\r\n`;
}

/** The library escapes a line feed and would let a carriage return through. */
function oneBreak(text: string): string {
  return text.replace(/\r\n?/g, '\n');
}

function utc(instant: string): ICAL.Time {
  return ICAL.Time.fromJSDate(new Date(instant), true);
}
