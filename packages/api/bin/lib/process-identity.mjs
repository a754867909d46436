import { readFileSync } from 'node:fs';

/**
 * Linux' start time of a process in clock ticks since boot. A pid alone says little, because pids
 * are used again; pid and start time together name one process.
 * @param {number} pid
 * @returns {string | undefined} undefined when no such process runs (a zombie does not run)
 */
export function startTime(pid) {
  try {
    return parseStat(readFileSync(`/proc/${pid}/stat`, 'utf8'));
  } catch {
    return undefined;
  }
}

/**
 * Reads field 22 of /proc/PID/stat. The second field, the program's name in brackets, may itself
 * hold spaces and brackets, so counting starts after its last one.
 * @param {string} stat
 * @returns {string | undefined}
 */
export function parseStat(stat) {
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  return fields[0] === 'Z' || fields[0] === 'X' ? undefined : fields[19];
}

/** This process as `pid-startTime`, fit for a file name. */
export function ownIdentity() {
  return `${process.pid}-${startTime(process.pid) ?? 0}`;
}

/**
 * @param {string} identity as made by `ownIdentity`
 * @returns {boolean} whether that very process still runs
 */
export function isRunning(identity) {
  const [pid, started] = identity.trim().split('-');
  return /^[1-9]\d*$/.test(pid ?? '') && started !== undefined && startTime(Number(pid)) === started;
}
