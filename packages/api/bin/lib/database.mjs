import { givenDatabase, requireAnswer } from './given-database.mjs';
import { ensureInstalled } from './install.mjs';
import { openPrivateCluster } from './postgres.mjs';
import { endRunning } from './run.mjs';

/**
 * Installs the packages and opens the company's database: the server DATABASE_URL names, else the
 * private cluster in the data folder (started, or shared with a running Driprail).
 * @returns {Promise<{ urls: { app: string, owner: string }, isPrivate: boolean, close: () => Promise<void> }>}
 */
export async function openDatabase() {
  const urls = givenDatabase();
  if (urls) {
    await ensureInstalled();
    await requireAnswer(urls);
    return { urls, isPrivate: false, close: () => Promise.resolve() };
  }
  // Both take a while the first time, on different things: packages wait for the network, PostgreSQL for the disk.
  const opening = openPrivateCluster().catch((error) => {
    endRunning(); // Without a database the packages are of no use: the sentence need not wait for them.
    throw error;
  });
  const [cluster, installed] = await Promise.allSettled([opening, ensureInstalled()]);
  if (cluster.status === 'rejected') throw cluster.reason;
  if (installed.status === 'fulfilled') return { ...cluster.value, isPrivate: true };
  await cluster.value.close();
  throw installed.reason;
}
