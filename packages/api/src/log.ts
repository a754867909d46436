import { pino } from 'pino';

export type Logger = ReturnType<typeof createLogger>;

/** Logs to standard error, so that standard output holds only the ready line. */
export function createLogger(level: string) {
  return pino({ level, base: null }, pino.destination(2));
}
