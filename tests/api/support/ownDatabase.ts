import { randomUUID } from "node:crypto";
import pg from "pg";

/*
 * A database for this test file alone, copied from the migrated one, so that files may run side by
 * side and in any order. Set before the file imports anything that reads DATABASE_URL.
 */
const template = new URL(process.env["FERRULE_TEST_TEMPLATE"] ?? "");
const name = `test_${randomUUID().replaceAll("-", "")}`;
const maintenance = new URL(template);
maintenance.pathname = "/postgres";
const client = new pg.Client({ connectionString: maintenance.href });
await client.connect();
await client.query(`create database ${name} template ${template.pathname.slice(1)}`);
await client.end();
const own = new URL(template);
own.pathname = `/${name}`;
process.env["DATABASE_URL"] = own.href;
