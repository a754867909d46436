import { dirname, isAbsolute, join } from 'node:path';
import { fileURLToPath } from 'node:url';

/** The checkout's top folder: the one that holds package.json and the lock. */
export const root = join(dirname(fileURLToPath(import.meta.url)), '..', '..', '..', '..');

/** Where everything kept between starts lies: DRIPRAIL_DATA, by default `.data` in the checkout. */
export function dataFolder() {
  const wanted = process.env.DRIPRAIL_DATA || '.data';
  return isAbsolute(wanted) ? wanted : join(root, wanted);
}
