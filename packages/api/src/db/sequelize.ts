import { AsyncLocalStorage } from 'node:async_hooks';
import pg from 'pg';
import { QueryTypes, Sequelize } from 'sequelize';
import type { Transaction } from 'sequelize';
import { initModels } from './models/index.ts';

// bigint columns hold cents: read as checked safe integers.
pg.types.setTypeParser(20, (text) => {
  const value = Number(text);
  if (!Number.isSafeInteger(value)) throw new RangeError(`${text} is past the safe integers`);
  return value;
});

let sequelize: Sequelize | null = null;
const open = new AsyncLocalStorage<Transaction>();

/** Opens the pool and hands it to the models. One per process. */
export function connect(url: string, poolSize = 10): Sequelize {
  sequelize = new Sequelize(url, {
    logging: false,
    pool: { max: poolSize },
    // Our statements are short and many: compiling them costs more than running them.
    dialectOptions: { options: '-c jit=off' },
  });
  guardTransactions(sequelize);
  initModels(sequelize);
  return sequelize;
}

export async function disconnect(): Promise<void> {
  await sequelize?.close();
  sequelize = null;
}

function connected(): Sequelize {
  if (!sequelize) throw new Error('connect() first');
  return sequelize;
}

/** Opens a transaction; only services do. A function that joins a caller's transaction takes `tx`. */
export function inTransaction<T>(work: (tx: Transaction) => Promise<T>): Promise<T> {
  if (open.getStore()) throw new Error('already in a transaction: pass the tx you have');
  return connected().transaction((tx) => open.run(tx, () => work(tx)));
}

/** Runs an effect once the outermost transaction has committed; a failing effect is logged, never thrown. */
export function afterCommit(tx: Transaction, effect: () => void | Promise<void>, log: (error: unknown) => void): void {
  let root = tx as Transaction & { parent?: Transaction };
  while (root.parent) root = root.parent;
  root.afterCommit(() => {
    void open.exit(() => Promise.resolve().then(effect)).catch(log);
  });
}

/** Rows of a SQL statement with named replacements (`:name`). */
export function select<T extends object>(
  sql: string,
  replacements: Record<string, unknown> = {},
  tx?: Transaction,
): Promise<T[]> {
  return connected().query<T>(sql, { replacements, type: QueryTypes.SELECT, transaction: tx ?? null });
}

/** Runs a statement that answers no rows, inside the caller's transaction. */
export async function run(sql: string, replacements: Record<string, unknown>, tx: Transaction): Promise<void> {
  await connected().query(sql, { replacements, transaction: tx });
}

/** A query that forgets its transaction would run beside it and survive a rollback: refuse it. */
function guardTransactions(instance: Sequelize): void {
  const query = instance.query.bind(instance) as (...args: unknown[]) => Promise<unknown>;
  instance.query = ((sql: unknown, options?: { transaction?: Transaction | null }) => {
    if (open.getStore() && !options?.transaction) {
      throw new Error(`a query inside a transaction forgot to pass it: ${JSON.stringify(sql).slice(0, 200)}`);
    }
    return query(sql, options);
  }) as typeof instance.query;
}
