/** A hint only says that something changed; the client fetches it again through the authorised API. */
export const hintEvent = 'hint';

export type HintEntity =
  | 'visit'
  | 'work'
  | 'job'
  | 'crew'
  | 'customer'
  | 'person'
  | 'van'
  | 'service'
  | 'clock'
  | 'settings'
  | 'pay'
  | 'bill'
  | 'login'
  | 'message';

export interface Hint {
  entity: HintEntity;
  id: string;
  version: number;
}

/** Where a customer's own page listens: opened by the link's token, without a session. */
export const customerNamespace = '/customer';
/** All that such a page hears, and nothing with it: its job changed, fetch the page again. */
export const changedEvent = 'changed';

/** Sent when the session ends elsewhere: the screen goes to sign-in. */
export const signedOutEvent = 'signed_out';
