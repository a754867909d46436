import { existsSync } from 'node:fs';

import { installPackages, onPath } from './debian.mjs';
import { PlainError } from './words.mjs';

const names = ['chromium', 'chromium-browser', 'google-chrome-stable', 'google-chrome'];

/**
 * Finds the browser the tests and pictures are made with, installing Debian's package when there is
 * none. CHROMIUM names another one.
 * @returns {Promise<string>} its program
 * @throws {PlainError}
 */
export async function ensureChromium() {
  const given = process.env.CHROMIUM;
  if (given && !existsSync(given)) throw new PlainError(`CHROMIUM names ${given}, and there is no such program.`);
  const found = given ?? find();
  if (found) return found;
  await installPackages({
    packages: ['chromium'],
    what: 'Chromium',
    instead: 'set CHROMIUM to the program of a Chromium that is there',
  });
  const installed = find();
  if (!installed)
    throw new PlainError('The distribution brings no Chromium: install one and set CHROMIUM to its program.');
  return installed;
}

function find() {
  return names.map(onPath).find(Boolean);
}
