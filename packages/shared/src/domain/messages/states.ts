/** Waiting goes out when its time comes; dead rests after the last try until somebody at the desk decides. */
export const messageStates = ['waiting', 'sending', 'sent', 'dead', 'dropped'] as const;
export type MessageState = (typeof messageStates)[number];

export const messageStateNames: Record<MessageState, string> = {
  waiting: 'Waits',
  sending: 'Going out',
  sent: 'Sent',
  dead: 'Not delivered',
  dropped: 'Dropped',
};
