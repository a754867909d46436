export const channels = ['mail', 'text'] as const;
export type Channel = (typeof channels)[number];
export const channelNames: Record<Channel, string> = { mail: 'Mail about jobs', text: 'Texts about jobs' };

export interface Consent {
  channel: Channel;
  isGiven: boolean;
  /** The day it was given or taken back. */
  on: string;
  /** In words: at the car, by phone, on the web. */
  how: string;
}

/**
 * Whether the company may write there: texts only after a yes, mail about the customer's own jobs until a no. The
 * house's rule, no source; what the law asks of each channel is for the law to say.
 */
export function mayWrite(channel: Channel, consents: readonly Consent[]): boolean {
  const answer = consents.find((consent) => consent.channel === channel);
  return answer?.isGiven ?? channel === 'mail';
}

/**
 * The answers after two records become one. A no of either stands. A yes was given for one number or mailbox, so the
 * other record's counts only where that is the same.
 */
export function mergeConsents(
  stays: readonly Consent[],
  goes: readonly Consent[],
  isSame: Record<Channel, boolean>,
): Consent[] {
  return channels.flatMap((channel) => {
    const own = stays.find((consent) => consent.channel === channel);
    const other = goes.find((consent) => consent.channel === channel);
    const no = [own, other].find((consent) => consent?.isGiven === false);
    return no ?? own ?? (isSame[channel] ? other : undefined) ?? [];
  });
}
