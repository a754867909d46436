export interface OutgoingText {
  /** A phone number as the customer gave it. */
  to: string;
  body: string;
  /** The same key is the same text: a service that knows it sends it once. */
  key: string;
}

/** Who sends text messages. */
export interface Texts {
  /** @throws Error when it was not taken; it is tried again */
  send: (text: OutgoingText) => Promise<void>;
}
