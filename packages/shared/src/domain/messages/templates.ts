import type { MessageKind } from './kinds.ts';

export interface MessageTemplate {
  /** Of a mail; a text has none. */
  subject: string;
  /** Of a mail: paragraphs with an empty line between. */
  body: string;
  /** Of a text message. */
  text: string;
}

/** The words each company starts with. */
export const ourTemplates: Record<MessageKind, MessageTemplate> = {
  booked: {
    subject: 'Booked: {day}, {window}',
    body: 'Hello {name},\n\nYour visit is booked for {day}. We arrive {window}.\n\n{services}\n\nThe calendar file is attached. If something changes, call {phone}.',
    text: '{company}: booked for {day}, {window}. {link}',
  },
  moved: {
    subject: 'New time: {day}, {window}',
    body: 'Hello {name},\n\nYour visit has a new time: {day}, {window}.\n\n{services}\n\nThe calendar file is attached and replaces the earlier one. If the new time does not suit you, call {phone}.',
    text: '{company}: your visit has a new time, {day}, {window}. Does not suit? Call {phone}. {link}',
  },
  reminder: {
    subject: 'Tomorrow: {window}',
    body: 'Hello {name},\n\nWe come on {day}, {window}.\n\n{services}\n\nPlease leave room around the car. If something changes, call {phone}.',
    text: '{company}: we come on {day}, {window}. Something changed? Call {phone}.',
  },
  on_the_way: {
    subject: '{crew} on the way, about {estimate}',
    body: 'Hello {name},\n\n{crew} set off in the van {van}. We expect to be with you about {estimate}.\n\nYour page shows how the work goes. Something changed? Call {phone}.',
    text: '{company}: on the way, with you about {estimate}. {link}',
  },
  done: {
    subject: 'Done: your invoice and photos',
    body: 'Hello {name},\n\nThe work is done:\n\n{services}\n\nTo pay: {amount}. Your page has the invoice and the photos.\n\nQuestions? Call {phone}.',
    text: '{company}: done. To pay {amount}. Invoice and photos: {link}',
  },
  receipt: {
    subject: 'Received: {amount}',
    body: 'Hello {name},\n\nWe received {amount}. Thank you.\n\nYour page shows the invoice with what was paid.',
    text: '{company}: received {amount}. Thank you. {link}',
  },
  refund: {
    subject: 'Given back: {amount}',
    body: 'Hello {name},\n\nWe gave {amount} back. With a card it may take some days until it shows on the statement.\n\nQuestions? Call {phone}.',
    text: '{company}: {amount} was given back. {link}',
  },
  called_off: {
    subject: 'Called off: {day}',
    body: 'Hello {name},\n\nThe visit on {day} is called off. Nobody comes.\n\nFor another time, call {phone}.',
    text: '{company}: the visit on {day} is called off. For another time, call {phone}.',
  },
  feedback: {
    subject: 'How did it go?',
    body: 'Hello {name},\n\nHow was the visit of {crew}? One to five stars and a few words on your page help us.\n\nIf something is not right, call {phone} and we put it right.',
    text: '{company}: how did it go? Tell us on your page: {link}',
  },
};

/** What the button of a mail says; it leads to the customer's own page. */
export const linkWords: Record<MessageKind, string> = {
  booked: 'Open your page',
  moved: 'Open your page',
  reminder: 'Open your page',
  on_the_way: 'See how it goes',
  done: 'Invoice and photos',
  receipt: 'See the invoice',
  refund: 'See the invoice',
  called_off: 'Open your page',
  feedback: 'Say how it went',
};
