import type { Transaction } from 'sequelize';
import { afterCommit } from '../../db/sequelize.ts';

/** On a private machine without a mail server, invitation and reset links are also printed in the terminal. */
let print: ((line: string) => void) | null = null;

export function printLinks(write: ((line: string) => void) | null): void {
  print = write;
}

export function announceLink(tx: Transaction, kind: 'invitation' | 'reset', email: string, url: string): void {
  afterCommit(
    tx,
    () => print?.(`${kind === 'invitation' ? 'Invitation' : 'Password reset'} for ${email}: ${url}`),
    () => undefined,
  );
}
