import { parseArgs } from 'node:util';

import { PlainError } from './words.mjs';

/**
 * Reads switches such as `--empty`.
 * @param {string[]} args
 * @param {string[]} names the switches the command knows, without dashes
 * @returns {Record<string, boolean | undefined>}
 * @throws {PlainError} for any other word
 */
export function switches(args, names) {
  try {
    const options = Object.fromEntries(names.map((name) => [name, { type: 'boolean' }]));
    return parseArgs({ args, options }).values;
  } catch (error) {
    const known = names.map((name) => `--${name}`).join(' and ');
    throw new PlainError(`${error.message.split('. ')[0]}; this command knows ${known}.`);
  }
}
