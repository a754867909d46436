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

/** Sent when the session ends elsewhere: the screen goes to sign-in. */
export const signedOutEvent = 'signed_out';
