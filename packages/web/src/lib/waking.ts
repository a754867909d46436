import {
  addPushSubscriptionAt,
  getPushKeyAt,
  removePushSubscriptionAt,
} from '@driprail/shared/contracts/phone-addresses';
import { call } from './call.ts';

/** Whether this browser can be told of changes while the app is closed. It needs the service worker, so https or this machine. */
export function canBeWoken(): boolean {
  return 'serviceWorker' in navigator && 'PushManager' in window && 'Notification' in window;
}

async function kept(): Promise<PushSubscription | null> {
  if (!canBeWoken()) return null;
  const worker = await navigator.serviceWorker.getRegistration();
  return (await worker?.pushManager.getSubscription()) ?? null;
}

export async function isWoken(): Promise<boolean> {
  return Notification.permission === 'granted' && (await kept()) !== null;
}

/** @throws Error with a sentence that says what to do, when the browser or the server will not */
export async function startWaking(): Promise<void> {
  const { publicKey } = await call(getPushKeyAt);
  if (publicKey === null) throw new Error('This server wakes no phones. Look at the run sheet now and then.');
  if ((await Notification.requestPermission()) !== 'granted') {
    throw new Error('This browser does not allow messages from here. Allow them in its settings for this site.');
  }
  const worker = await navigator.serviceWorker.ready;
  const made = await worker.pushManager.subscribe({ userVisibleOnly: true, applicationServerKey: publicKey });
  const { endpoint, keys } = made.toJSON();
  const { p256dh = '', auth = '' } = keys ?? {};
  await call(addPushSubscriptionAt, { body: { endpoint: endpoint ?? '', p256dh, auth } });
}

export async function stopWaking(): Promise<void> {
  const subscription = await kept();
  if (!subscription) return;
  await call(removePushSubscriptionAt, { query: { endpoint: subscription.endpoint } }).catch(() => undefined);
  await subscription.unsubscribe();
}
