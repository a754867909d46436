/** What a customer is written to about, in the order of a job. */
export const messageKinds = [
  'booked',
  'moved',
  'reminder',
  'on_the_way',
  'done',
  'receipt',
  'refund',
  'called_off',
  'feedback',
] as const;
export type MessageKind = (typeof messageKinds)[number];

export const messageKindNames: Record<MessageKind, string> = {
  booked: 'Booked',
  moved: 'New time',
  reminder: 'Reminder',
  on_the_way: 'On the way',
  done: 'Done, with the invoice',
  receipt: 'Receipt',
  refund: 'Refund',
  called_off: 'Called off',
  feedback: 'How it went',
};

/** When each kind goes out, in a sentence for whoever switches it on or off. */
export const messageKindMoments: Record<MessageKind, string> = {
  booked: 'When a job has an arrival window, with a calendar file.',
  moved: 'When the arrival window changes, with the calendar file again.',
  reminder: 'The day before the visit, at the hour set above.',
  on_the_way: 'After “On my way”, once it can’t be taken back; never after “Arrived”.',
  done: 'When the invoice is issued, with the link to it and to the photos.',
  receipt: 'When a payment is recorded.',
  refund: 'When money is given back.',
  called_off: 'When a job is called off; the calendar entry is struck.',
  feedback: 'Some hours after the work, unless the customer has said how it went.',
};

/** What a customer can stop by a link, apart from each other. */
export const messageGroups = ['job', 'care'] as const;
export type MessageGroup = (typeof messageGroups)[number];
export const messageGroupNames: Record<MessageGroup, string> = {
  job: 'news about your jobs',
  care: 'reminders and questions about how it went',
};

export function groupOf(kind: MessageKind): MessageGroup {
  return kind === 'reminder' || kind === 'feedback' ? 'care' : 'job';
}

/** Kinds that carry a calendar file. */
export function hasCalendar(kind: MessageKind): boolean {
  return kind === 'booked' || kind === 'moved' || kind === 'called_off';
}
