import "server-only";
import pg from "pg";
import { Sequelize, Transaction } from "sequelize";
import * as models from "@/models";
import { databaseEnv } from "@/lib/server/env";

/** No statement of a request may hold a lock longer than this. */
const STATEMENT_MS = 15_000;

const holder = globalThis as typeof globalThis & { ferruleSequelize?: Sequelize };

function connect(): Sequelize {
  const { DATABASE_URL, DATABASE_POOL } = databaseEnv();
  return new Sequelize(DATABASE_URL, {
    dialect: "postgres",
    dialectModule: pg,
    logging: false,
    pool: { max: DATABASE_POOL, min: 0, idle: 10_000, acquire: 20_000 },
    dialectOptions: {
      statement_timeout: STATEMENT_MS,
      lock_timeout: STATEMENT_MS,
      idle_in_transaction_session_timeout: 2 * STATEMENT_MS,
      application_name: "ferrule",
    },
  });
}

let bound: { sequelize: Sequelize } & typeof models | null = null;

/**
 * The pool with its models. Made on first use, since a build has no settings; one pool outlives
 * reloading during development, and the reloaded models are bound to it again.
 */
export function database(): { sequelize: Sequelize } & typeof models {
  if (bound) return bound;
  const sequelize = (holder.ferruleSequelize ??= connect());
  models.initModels(sequelize);
  bound = { ...models, sequelize };
  return bound;
}

/** Runs `work` in one transaction: all of it is written, or nothing. */
export function inTransaction<Result>(work: (transaction: Transaction) => Promise<Result>): Promise<Result> {
  return database().sequelize.transaction({ isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED }, work);
}

/** Closes the pool; for scripts and tests. */
export async function closeDatabase(): Promise<void> {
  await holder.ferruleSequelize?.close();
  delete holder.ferruleSequelize;
  bound = null;
}
