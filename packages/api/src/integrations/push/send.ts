import webPush from 'web-push';
import type { PushKeys } from './keys.ts';

export interface PushTarget {
  endpoint: string;
  p256dh: string;
  auth: string;
}

/** A browser's message waits so long at its push service, seconds: an old change is on the run sheet anyway. */
const TIME_TO_LIVE = 3600;

/**
 * Sends a message, encrypted for the browser alone (RFC 8291), to its push service.
 * @returns whether it was taken, or that the browser is gone for good
 */
export async function sendPush(
  keys: PushKeys,
  target: PushTarget,
  message: object,
): Promise<'sent' | 'gone' | 'failed'> {
  const subscription = { endpoint: target.endpoint, keys: { p256dh: target.p256dh, auth: target.auth } };
  const vapidDetails = { subject: keys.contact, publicKey: keys.publicKey, privateKey: keys.privateKey };
  const request = webPush.generateRequestDetails(subscription, JSON.stringify(message), {
    ...{ vapidDetails, TTL: TIME_TO_LIVE, urgency: 'normal', topic: 'run-sheet' },
  });
  try {
    const answer = await fetch(request.endpoint, {
      method: request.method,
      headers: request.headers as Record<string, string>,
      body: new Uint8Array(request.body ?? Buffer.alloc(0)),
      redirect: 'error',
      signal: AbortSignal.timeout(10_000),
    });
    if (answer.ok) return 'sent';
    return answer.status === 404 || answer.status === 410 ? 'gone' : 'failed';
  } catch {
    return 'failed';
  }
}
