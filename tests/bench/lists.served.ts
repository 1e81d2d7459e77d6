import { cpus } from "node:os";
import pg from "pg";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { database } from "@/lib/server/data/database";
import { request } from "@/tests/api/support/server";
import { ENTRIES, JOBS, MAKERS, NAMES, PLACES, THINGS, TOWNS, largeCompany, type LargeCompany } from "./support/largeCompany";

/*
 * Searches of a long register and a long library, through the route handlers with session, rights and answer, each followed by
 * the bare statement that it was answered with, on a connection of its own. A figure alone says more of the machine than of the list.
 */
const SEARCHES = 200;
const TARGET_MS = 150;

/** The same numbers in every run: linear congruential generator (Numerical Recipes, from memory). */
let seed = 20260;
const random = (): number => { seed = (Math.imul(seed, 1664525) + 1013904223) >>> 0; return seed / 2 ** 32; };
const pick = <Value>(from: readonly Value[]): Value => from[Math.floor(random() * from.length)] as Value;
const quantile = (times: readonly number[], share: number): number => [...times].sort((a, b) => a - b)[Math.min(times.length - 1, Math.ceil(share * times.length) - 1)] as number;
const ms = (value: number): string => `${value.toFixed(1)} ms`;

const client = new pg.Client({ connectionString: process.env["DATABASE_URL"] });
const statements: string[] = [];
let company: LargeCompany;
beforeAll(async () => {
  await client.connect();
  company = await largeCompany(client);
  database().sequelize.addHook("afterQuery", (_options, query) => void statements.push((query as typeof query & { sql: string }).sql));
  console.log(`${JOBS.toLocaleString("en-US")} jobs with a drawing each, ${ENTRIES.toLocaleString("en-US")} library entries, ${cpus().length} cores; target ${TARGET_MS} ms at the 95th percentile`);
}, 300_000);
afterAll(() => client.end());

interface Search { as: { cookie: string }; address: () => string; isSearch: (statement: string) => boolean; count?: number }

/** One kind of search, many times; prints the figures. @returns the 95th percentile in ms */
async function measure(title: string, { as, address, isSearch, count = SEARCHES }: Search): Promise<number> {
  const [whole, bare]: [number[], number[]] = [[], []];
  let lines = 0;
  // The first ten fill caches and compile.
  for (let at = -10; at < count; at += 1) {
    const asked = address();
    statements.length = 0;
    const start = performance.now();
    const answer = await request("GET", asked, { as });
    const took = performance.now() - start;
    expect([asked, answer.status]).toEqual([asked, 200]);
    const sql = statements.find(isSearch);
    expect(sql, `no search among the statements of ${asked}`).toBeDefined();
    const startBare = performance.now();
    await client.query(sql ?? "");
    const tookBare = performance.now() - startBare;
    if (at < 0) continue;
    lines += (answer.body.jobs ?? answer.body.entries).length;
    whole.push(took);
    bare.push(tookBare);
  }
  const [median, p95, bareMedian] = [quantile(whole, 0.5), quantile(whole, 0.95), quantile(bare, 0.5)];
  console.log(`${title}: median ${ms(median)}, p95 ${ms(p95)}; bare SQL median ${ms(bareMedian)}, p95 ${ms(quantile(bare, 0.95))}; ratio of medians ${(median / bareMedian).toFixed(1)}; ${count} searches, ${(lines / count).toFixed(0)} lines each`);
  expect(lines).toBeGreaterThan(count);
  return p95;
}

const words = (pools: readonly (readonly string[])[]): string => Array.from({ length: 1 + Math.floor(random() * 2) }, () => pick(pick(pools))).join(" ");
const some = (below: number): string => String(Math.floor(random() * below));

describe("the library", () => {
  const isSearch = (sql: string): boolean => sql.includes("from library_entries e where") && sql.includes("limit");
  const address = (): string => `/api/companies/${company.companyId}/library?${new URLSearchParams({ q: words([MAKERS, THINGS, [some(ENTRIES), "nothing like it"]]), limit: "100" }).toString()}`;

  it("is searched by a designer", async () => {
    expect(await measure("library, designer", { as: company.designer, address, isSearch })).toBeLessThanOrEqual(TARGET_MS);
  });
});

describe("the register", () => {
  const isSearch = (sql: string): boolean => sql.includes("from matched where") && sql.includes("limit");
  const address = (): string => `/api/jobs?${new URLSearchParams({
    q: words([NAMES, PLACES, TOWNS, [`BP-${some(300)}`, `2${some(6)}-`, "county", "nobody here"]]), tab: pick(["all", "all", "mine", "draft", "review", "sealed"]),
    sort: pick(["changed", "number", "name", "due"]), due: pick(["any", "any", "any", "soon"]), limit: "60",
  }).toString()}`;

  it("is searched by an administrator", async () => {
    expect(await measure("register, administrator", { as: company.administrator, address, isSearch })).toBeLessThanOrEqual(TARGET_MS);
  });
  it("is searched by a designer who is on every job", async () => {
    expect(await measure("register, designer", { as: company.designer, address, isSearch })).toBeLessThanOrEqual(TARGET_MS);
  });
  it("is paged without words", async () => {
    expect(await measure("register, pages", { as: company.licensee, address: () => `/api/jobs?limit=60&offset=${60 * Math.floor(random() * 26)}`, isSearch })).toBeLessThanOrEqual(TARGET_MS);
  });
  it("is searched the day after a new rule set, when no kept count holds", async () => {
    await client.query("update drawings set checked_rule_set = 'earlier'");
    expect(await measure("register, counts worked out anew meanwhile", { as: company.licensee, address, isSearch, count: 100 })).toBeLessThanOrEqual(TARGET_MS);
  });
});
