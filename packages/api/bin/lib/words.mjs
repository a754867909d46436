/**
 * A failure a person can act on. Its message is one sentence that says what happened and what to do;
 * it is printed alone, without a stack trace.
 */
export class PlainError extends Error {}

/** The person asked for the end (Ctrl-C, SIGTERM) while a step was still running. */
export class Stopped extends Error {
  /** @param {NodeJS.Signals} signal */
  constructor(signal) {
    super(`Stopped by ${signal}.`);
    this.exitCode = signal === 'SIGINT' ? 130 : 143;
  }
}

/** Tells on stderr what is being done; stdout is kept for the ready line and for results. */
export function say(sentence) {
  process.stderr.write(`${sentence}\n`);
}

const byCode = {
  ENOSPC: 'The disk is full. Free some space and start again; nothing that was saved is lost.',
  EDQUOT: 'This user’s disk quota is used up. Free some space and start again.',
  EROFS: 'The folder is on a read-only disk. Set DRIPRAIL_DATA to a folder that can be written.',
  EADDRINUSE:
    'The port has just been taken by another program: stop it, or choose another one with PORT=4601 npm start.',
  EMFILE: 'Too many files are open. Raise the limit (ulimit -n) and start again.',
};

/**
 * Turns any thrown value into one sentence.
 * @param {unknown} error
 * @returns {string}
 */
export function sentenceFor(error) {
  if (error instanceof PlainError || error instanceof Stopped) return error.message;
  const { code, path, message, log } = /** @type {NodeJS.ErrnoException & { log?: string }} */ (error ?? {});
  if (code && byCode[code]) return byCode[code];
  if (code === 'EACCES' || code === 'EPERM') {
    return `This user may not use ${path ?? 'a file Driprail needs'}. Start Driprail as the user who owns it, or set DRIPRAIL_DATA to another folder.`;
  }
  const first = String(message ?? error).split('\n')[0];
  return `Something unexpected went wrong: ${first} (${log ? `details are in ${log}` : 'DRIPRAIL_DEBUG=1 shows where'}).`;
}

/** True when a program's own words mean that the disk is full. */
export function meansFullDisk(output) {
  return /ENOSPC|No space left on device|disk quota exceeded|wrote only \d+ of \d+ bytes/i.test(output);
}

/**
 * Runs a command's body. Every failure ends in one sentence on stderr and exit code 1.
 * @param {() => Promise<number | void>} body gives the exit code, 0 when it gives none
 */
export async function command(body) {
  try {
    process.exitCode = (await body()) ?? 0;
  } catch (error) {
    if (process.env.DRIPRAIL_DEBUG) process.stderr.write(`${error?.stack}\n`);
    say(sentenceFor(error));
    process.exitCode = error instanceof Stopped ? error.exitCode : 1;
  }
  // Something may still hold the event loop (an ended child's pipe): what had to be ended has been.
  process.exit();
}
