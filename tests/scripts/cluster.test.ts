import { existsSync, mkdtempSync, readFileSync, rmSync, chmodSync, mkdirSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import pg from "pg";
import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { clusterMajor, ensurePostgres, findPostgres, startCluster } from "@/scripts/lib/cluster.mjs";
import { isFree } from "@/scripts/lib/ports.mjs";

let parent: string;
beforeEach(() => {
  parent = mkdtempSync(path.join(tmpdir(), "cluster-test-"));
  chmodSync(parent, 0o755);
});
afterEach(() => {
  vi.unstubAllEnvs();
  rmSync(parent, { recursive: true, force: true });
});

async function ask(connectionString: string, sql: string): Promise<unknown> {
  const client = new pg.Client({ connectionString });
  await client.connect();
  try {
    const { rows } = await client.query<Record<string, unknown>>(sql);
    return Object.values(rows[0] ?? {})[0];
  } finally {
    await client.end();
  }
}

describe("a local cluster", () => {
  it("keeps data over a stop, answers on loopback to its password alone, and frees its port", async () => {
    const folder = path.join(parent, "postgres");
    const password = "a pass/word?";
    const first = await startCluster({ folder, password });
    const url = await first.ensureDatabase("ferrule");
    await ask(url, "create table kept as select 7 as value");
    expect(await ask(url, "show listen_addresses")).toBe("127.0.0.1");
    expect(await ask(url, "show fsync")).toBe("on");
    expect(await ask(url, "select rolsuper from pg_roles where rolname = current_user")).toBe(false);
    await expect(ask(url.replace(encodeURIComponent(password), "wrong"), "select 1")).rejects.toThrow(/password authentication failed/);
    await first.stop();
    expect(await isFree(first.port)).toBe(true);
    expect(existsSync(first.socketFolder)).toBe(false);

    const second = await startCluster({ folder, password });
    expect(await ask(await second.ensureDatabase("ferrule"), "select value from kept")).toBe(7);
    await second.stop();
  });

  it("moves to another port when its last one is taken, and takes over from a run that was killed", async () => {
    const folder = path.join(parent, "postgres");
    const first = await startCluster({ folder, password: "p" });
    // As after a kill: the server runs on, nobody stopped it.
    const second = await startCluster({ folder, password: "p" });
    expect(await ask(second.url("postgres"), "select 1")).toBe(1);
    expect(existsSync(first.socketFolder)).toBe(false);
    await second.stop();
    const blocker = createServer();
    await new Promise<void>((resolve) => blocker.listen(second.port, "127.0.0.1", resolve));
    const third = await startCluster({ folder, password: "p" });
    expect(third.port).not.toBe(second.port);
    await third.stop();
    await new Promise((resolve) => blocker.close(resolve));
  });

  it("leaves nothing of a temporary one", async () => {
    const cluster = await startCluster({ folder: path.join(parent, "postgres"), password: "p", temporary: true });
    expect(existsSync(cluster.dataFolder)).toBe(true);
    await cluster.stop();
    expect(existsSync(cluster.dataFolder)).toBe(false);
    expect(existsSync(cluster.socketFolder)).toBe(false);
  });
});

describe("finding PostgreSQL", () => {
  it("says the one command when there is none and nothing may be installed", async () => {
    vi.stubEnv("FERRULE_PG_SEARCH", path.join(parent, "nowhere"));
    vi.stubEnv("FERRULE_NO_INSTALL", "yes");
    expect(findPostgres()).toEqual([]);
    await expect(ensurePostgres(null)).rejects.toMatchObject({ code: 2, message: expect.stringContaining("apt-get install -y postgresql") as string });
  });

  it("refuses data of another major version instead of touching it", async () => {
    const folder = path.join(parent, "postgres");
    mkdirSync(folder);
    writeFileSync(path.join(folder, "PG_VERSION"), "8\n");
    expect(clusterMajor(folder)).toBe(8);
    await expect(startCluster({ folder, password: "p" })).rejects.toMatchObject({ code: 2, message: expect.stringContaining("PostgreSQL 8") as string });
    expect(readFileSync(path.join(folder, "PG_VERSION"), "utf8")).toBe("8\n");
  });
});
