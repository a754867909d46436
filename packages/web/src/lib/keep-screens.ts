/** Lets the browser keep the phone's screens for a dead zone. It needs https, or this machine itself. */
export function keepScreens(): void {
  if (!import.meta.env.PROD || !('serviceWorker' in navigator)) return;
  window.addEventListener('load', () => {
    // Without it everything works, but only with signal.
    navigator.serviceWorker.register('/sw.js').catch(() => undefined);
  });
}
