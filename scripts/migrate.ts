/**
 * tsx --conditions=react-server scripts/migrate.ts up | down [--to NAME] | seed [--once] | status
 *
 * up      runs what has not run: migrations/*.ts, then the job queue's own tables
 * down    takes back the last migration, or all down to and with NAME (0 for all)
 * seed    runs seeders/*.ts; each can be run again. With --once nothing happens when it was done before
 */
import { existsSync, readdirSync } from "node:fs";
import path from "node:path";
import { pathToFileURL } from "node:url";
import { runMigrations } from "graphile-worker";
import pg from "pg";
import { QueryTypes, Sequelize, type QueryInterface } from "sequelize";
import { SequelizeStorage, Umzug } from "umzug";

const root = path.resolve(import.meta.dirname, "..");
/** Remembers that the demo was put in, so that what a person deleted does not come back. */
const SEED_TABLE = "seed_runs";

/** A seeder file: `up` puts its rows in and may run again without doubling them. */
interface Seeder {
  up: (argument: { name: string; context: QueryInterface }) => Promise<unknown>;
}

function connect(): { sequelize: Sequelize; url: string } {
  const url = process.env["DATABASE_URL"];
  if (!url) throw new Error("DATABASE_URL is not set. `npm start` sets it for the local database.");
  return { url, sequelize: new Sequelize(url, { dialect: "postgres", dialectModule: pg, logging: false }) };
}

function migrator(sequelize: Sequelize) {
  return new Umzug({
    migrations: { glob: ["migrations/*.ts", { cwd: root }] },
    context: sequelize.getQueryInterface(),
    storage: new SequelizeStorage({ sequelize, modelName: "schema_migrations" }),
    logger: undefined,
  });
}

async function up(sequelize: Sequelize, url: string): Promise<void> {
  const done = await migrator(sequelize).up();
  for (const each of done) console.log(`migrated ${each.name}`);
  // Its first run needs CREATE on the database, which the owner has and a web process should not.
  await runMigrations({ connectionString: url });
}

async function down(sequelize: Sequelize, to: string | undefined): Promise<void> {
  const done = await migrator(sequelize).down(to === undefined ? {} : to === "0" ? { to: 0 } : { to });
  for (const each of done) console.log(`took back ${each.name}`);
  await sequelize.query(`drop table if exists ${SEED_TABLE}`);
}

async function seed(sequelize: Sequelize, once: boolean): Promise<void> {
  await sequelize.query(`create table if not exists ${SEED_TABLE} (finished_at timestamptz not null)`);
  const before = await sequelize.query(`select 1 from ${SEED_TABLE} limit 1`, { type: QueryTypes.SELECT });
  if (once && before.length > 0) {
    console.log("demo already there");
    return;
  }
  const folder = path.join(root, "seeders");
  // Seeders begin with a number, so that they run in their order; other files there are their data.
  const names = existsSync(folder) ? readdirSync(folder).filter((name) => /^\d.*\.ts$/.test(name)).sort() : [];
  for (const name of names) {
    const seeder = (await import(pathToFileURL(path.join(folder, name)).href)) as Seeder;
    await seeder.up({ name, context: sequelize.getQueryInterface() });
    console.log(`seeded ${name}`);
  }
  if (names.length > 0) await sequelize.query(`insert into ${SEED_TABLE} values (now())`);
}

async function status(sequelize: Sequelize): Promise<void> {
  const pending = await migrator(sequelize).pending();
  console.log(pending.length === 0 ? "nothing to migrate" : pending.map((each) => `pending ${each.name}`).join("\n"));
}

const [command, ...rest] = process.argv.slice(2);
const { sequelize, url } = connect();
try {
  if (command === "up") await up(sequelize, url);
  else if (command === "down") await down(sequelize, rest[0] === "--to" ? rest[1] : undefined);
  else if (command === "seed") await seed(sequelize, rest.includes("--once"));
  else if (command === "status") await status(sequelize);
  else throw new Error("Say what to do: up, down [--to NAME], seed [--once] or status.");
} catch (error) {
  console.error(error);
  process.exitCode = 1;
} finally {
  await sequelize.close();
}
// Data layers of seeders hold connections of their own.
process.exit();
