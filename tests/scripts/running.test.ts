import { spawn } from "node:child_process";
import { mkdirSync, mkdtempSync, rmSync, statSync, writeFileSync } from "node:fs";
import { createServer } from "node:net";
import { tmpdir } from "node:os";
import path from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { isBuilt, sourceDigest } from "@/scripts/lib/digest.mjs";
import { keptSecret, parseEnv, readDotEnv } from "@/scripts/lib/environment.mjs";
import { packagesMatchLock } from "@/scripts/lib/packages.mjs";
import { firstFree, freePort, isFree } from "@/scripts/lib/ports.mjs";
import { identify, isAlive, run, stop } from "@/scripts/lib/processes.mjs";

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), "running-test-"));
});
afterEach(() => rmSync(folder, { recursive: true, force: true }));
const write = (name: string, text: string) => {
  mkdirSync(path.dirname(path.join(folder, name)), { recursive: true });
  writeFileSync(path.join(folder, name), text);
};

describe("ports", () => {
  it("moves on from a busy one", async () => {
    const port = await freePort();
    const server = createServer();
    await new Promise<void>((resolve) => server.listen(port, "127.0.0.1", resolve));
    expect(await isFree(port)).toBe(false);
    expect(await firstFree(port)).toBeGreaterThan(port);
    await expect(firstFree(port, "127.0.0.1", 1)).rejects.toThrow(/No free port/);
    await new Promise((resolve) => server.close(resolve));
    expect(await firstFree(port)).toBe(port);
  });
});

describe("processes", () => {
  it("knows a process by number and start time, and ends one that ignores the polite signal", async () => {
    const child = spawn(process.execPath, ["-e", "process.on('SIGTERM',()=>{});console.log('up');setInterval(()=>{},1000)"], { detached: true, stdio: ["ignore", "pipe", "ignore"] });
    await new Promise((resolve) => child.stdout.once("data", resolve));
    const identity = identify(child.pid ?? 0);
    expect(isAlive(identity)).toBe(true);
    expect(isAlive({ pid: child.pid ?? 0, startedAt: "another time" })).toBe(false);
    await stop({ pid: child.pid ?? 0, startedAt: "another time" });
    expect(isAlive(identity)).toBe(true);
    await stop(identity, 200);
    expect(isAlive(identity)).toBe(false);
  });

  it("gives a command's output and code, and ends it when its time is up", async () => {
    expect(await run(process.execPath, ["-e", "console.log('out');console.error('err');process.exit(3)"])).toMatchObject({ code: 3, output: expect.stringMatching(/out[\s\S]*err|err[\s\S]*out/) as string });
    expect(await run(process.execPath, ["-e", "setInterval(()=>{},1000)"], { timeoutMs: 300 })).toMatchObject({ timedOut: true, code: 1 });
  });
});

describe("settings", () => {
  it("reads .env lines with comments, quotes and equals signs; empty ones count as absent", () => {
    expect(parseEnv('# note\nA=1 # why\nexport B="x # y"\nC=\'a=b\'\n D = e=f \nnonsense\nE=')).toEqual({ A: "1", B: "x # y", C: "a=b", D: "e=f", E: "" });
    write(".env", "A=1\nE=\n");
    expect(readDotEnv(folder)).toEqual({ A: "1" });
    expect(readDotEnv(path.join(folder, "none"))).toEqual({});
  });

  it("makes a secret once, for its owner's eyes", () => {
    const first = keptSecret(folder, "session");
    expect(first.length).toBeGreaterThanOrEqual(32);
    expect(keptSecret(folder, "session")).toBe(first);
    expect(keptSecret(folder, "database")).not.toBe(first);
    expect(statSync(path.join(folder, "secret/session")).mode & 0o077).toBe(0);
  });
});

describe("what has to be done again", () => {
  it("builds when a source changed, and not when only its time did", () => {
    write("app/page.tsx", "one");
    write("package-lock.json", "{}");
    write(".next/BUILD_ID", "b1");
    const note = path.join(folder, "build.json");
    const dist = path.join(folder, ".next");
    expect(isBuilt(folder, dist, note)).toBe(false);
    writeFileSync(note, JSON.stringify({ digest: sourceDigest(folder), buildId: "b1" }));
    expect(isBuilt(folder, dist, note)).toBe(true);
    write("app/page.tsx", "one");
    expect(isBuilt(folder, dist, note)).toBe(true);
    write("app/page.tsx", "two");
    expect(isBuilt(folder, dist, note)).toBe(false);
    write("app/page.tsx", "one");
    write("app/new/page.tsx", "");
    expect(isBuilt(folder, dist, note)).toBe(false);
    rmSync(path.join(folder, "app/new"), { recursive: true });
    write(".next/BUILD_ID", "another build");
    expect(isBuilt(folder, dist, note)).toBe(false);
  });

  it("installs when a package is absent or of another version, and not for parts of other systems", () => {
    const lock = (packages: object) => write("package-lock.json", JSON.stringify({ packages: { "": {}, ...packages } }));
    lock({ "node_modules/a": { version: "1.0.0" }, "node_modules/other-system": { version: "1.0.0", optional: true } });
    expect(packagesMatchLock(folder)).toBe(false);
    write("node_modules/.package-lock.json", JSON.stringify({ packages: { "node_modules/a": { version: "1.0.0" } } }));
    expect(packagesMatchLock(folder)).toBe(true);
    lock({ "node_modules/a": { version: "1.0.1" } });
    expect(packagesMatchLock(folder)).toBe(false);
    lock({ "node_modules/a": { version: "1.0.0" }, "node_modules/b": { version: "1.0.0" } });
    expect(packagesMatchLock(folder)).toBe(false);
  });
});
