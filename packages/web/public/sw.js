/* Keeps the phone's screens for a dead zone: the shell and the run sheet's files. Data are kept by the app itself. */
const CACHE = 'driprail-shell-1';
const NEEDED = [
  'index.html',
  'src/features/run-sheet/pages/run-sheet.page.tsx',
  'src/features/run-sheet/pages/clock.page.tsx',
  'src/features/run-sheet/components/trouble-sheet.tsx',
  'src/features/run-sheet/components/part-done-sheet.tsx',
  'src/features/run-sheet/components/tip-sheet.tsx',
  'src/features/billing/index.ts',
  'src/features/billing/pages/collect.page.tsx',
  'src/features/first-aid/pages/first-aid.page.tsx',
  'src/features/job-work/index.ts',
  'src/features/job-work/pages/work.page.tsx',
  'src/features/walk-round/index.ts',
  'src/features/walk-round/pages/walk-round.page.tsx',
  'src/lib/outbox/send-walk.ts',
];

self.addEventListener('install', (event) => {
  event.waitUntil(keepShell().then(() => self.skipWaiting()));
});

self.addEventListener('activate', (event) => {
  const old = caches
    .keys()
    .then((names) => Promise.all(names.filter((name) => name !== CACHE).map((name) => caches.delete(name))));
  event.waitUntil(old.then(() => self.clients.claim()));
});

self.addEventListener('fetch', (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== 'GET' || url.origin !== self.location.origin) return;
  if (url.pathname.startsWith('/api/') || url.pathname.startsWith('/socket.io/')) return;
  if (request.mode === 'navigate') event.respondWith(page(request));
  else if (url.pathname.startsWith('/assets/')) event.respondWith(file(request));
});

/** A page comes from the server while it answers; else the kept shell draws it. */
async function page(request) {
  try {
    const fresh = await fetch(request);
    if (fresh.ok) await refreshShell(fresh.clone());
    return fresh;
  } catch (error) {
    const kept = await caches.match('/');
    if (kept) return kept;
    throw error;
  }
}

/** Files are named after their content: a kept one is right for ever. */
async function file(request) {
  const kept = await caches.match(request);
  if (kept) return kept;
  const fresh = await fetch(request);
  if (fresh.ok) {
    const cache = await caches.open(CACHE);
    await cache.put(request, fresh.clone());
  }
  return fresh;
}

/** After an update the new shell is kept with all it needs, so that an offline start never mixes two versions. */
async function refreshShell(fresh) {
  const kept = await caches.match('/');
  const [now, before] = await Promise.all([fresh.text(), kept ? kept.text() : '']);
  if (now !== before) await keepShell();
}

async function keepShell() {
  const cache = await caches.open(CACHE);
  const manifest = await (await fetch('/manifest.json', { cache: 'no-cache' })).json();
  const files = new Set();
  const add = (name) => {
    const chunk = manifest[name];
    if (!chunk || files.has(`/${chunk.file}`)) return;
    for (const path of [chunk.file, ...(chunk.css ?? []), ...(chunk.assets ?? [])]) files.add(`/${path}`);
    for (const next of chunk.imports ?? []) add(next);
  };
  NEEDED.forEach(add);
  // What the shell loads after the first paint: the live line.
  for (const next of manifest['index.html']?.dynamicImports ?? []) if (next.includes('socket.io')) add(next);
  await cache.addAll([...files]);
  await cache.put('/', await fetch('/', { cache: 'no-cache' }));
}

/* The run sheet changed while the app was closed. A locked screen shows it to anybody, so it says no more than that. */
self.addEventListener('push', (event) => {
  const shown = self.registration.showNotification('Your run sheet changed', {
    body: 'Open it to see what is new.',
    icon: '/mark.svg',
    tag: 'run-sheet',
    renotify: true,
  });
  event.waitUntil(shown);
});

self.addEventListener('notificationclick', (event) => {
  event.notification.close();
  event.waitUntil(openRunSheet());
});

async function openRunSheet() {
  const open = await self.clients.matchAll({ type: 'window', includeUncontrolled: true });
  const own = open.find((client) => new URL(client.url).pathname.startsWith('/run-sheet')) ?? open[0];
  if (!own) return self.clients.openWindow('/run-sheet');
  await own.focus();
  return new URL(own.url).pathname.startsWith('/run-sheet') ? own : own.navigate('/run-sheet');
}
