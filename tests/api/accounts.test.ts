import { beforeAll, describe, expect, it } from "vitest";
import { firstAdministrator, inCompany, signIn, type Person } from "./support/people";
import { png } from "./support/png";
import { request } from "./support/server";

let owner: Person & { companyId: string };
beforeAll(async () => {
  owner = await firstAdministrator();
});

describe("first use", () => {
  it("is over once there is an account", async () => {
    expect((await request("GET", "/api/setup")).body).toEqual({ needed: false });
    const again = { companyName: "Second", name: "Second", email: "second@example.test", password: "long enough, really" };
    expect((await request("POST", "/api/setup", { body: again })).status).toBe(404);
  });
});

describe("signing in", () => {
  it("takes the right password alone, whatever the letters of the address", async () => {
    expect(await signIn(owner.email.toUpperCase())).not.toBeNull();
    expect(await signIn(owner.email, "another password")).toBeNull();
    expect(await signIn("nobody@example.test")).toBeNull();
  });

  it("pauses after eight wrong passwords, also for the right one, and not for others", async () => {
    const person = await inCompany(owner, owner.companyId, ["installer"]);
    for (let attempt = 0; attempt < 8; attempt += 1) expect(await signIn(person.email, "wrong password")).toBeNull();
    await expect(signIn(person.email)).rejects.toThrow("too-many");
    expect(await signIn(owner.email)).not.toBeNull();
  });

  it("takes no token of another secret, no broken one and none without a version", async () => {
    const { encode } = await import("next-auth/jwt");
    const forged = await encode({ token: { sub: owner.id, sessionVersion: 1 }, secret: "another secret, which is long enough too" });
    const unversioned = await encode({ token: { sub: owner.id }, secret: process.env["NEXTAUTH_SECRET"] ?? "" });
    for (const value of [forged, unversioned, "x.y.z", ""]) {
      expect((await request("GET", "/api/me", { as: { cookie: `next-auth.session-token=${value}` } })).status).toBe(401);
    }
  });
});

describe("a password", () => {
  it("is changed with the current one, and ends every session", async () => {
    const person = await inCompany(owner, owner.companyId, ["installer"]);
    const change = (current: string, next: string) => request("POST", "/api/me/password", { as: person, body: { current, next } });
    expect(await change("wrong", "a new long password")).toMatchObject({ status: 422, body: { field: "current" } });
    expect(await change(person.password, "short")).toMatchObject({ status: 422, body: { field: "next" } });
    expect((await change(person.password, "a new long password")).status).toBe(204);
    expect((await request("GET", "/api/me", { as: person })).status).toBe(401);
    expect(await signIn(person.email)).toBeNull();
    expect(await signIn(person.email, "a new long password")).not.toBeNull();
  });
});

describe("a license", () => {
  const entry = { state: "Test State", number: "L-1", title: "PE", expiresOn: "2030-12-31" };
  const upload = (as: Person, raw: BodyInit) => request("PUT", "/api/me/license/seal-graphic", { as, raw, headers: { "content-type": "image/png" } });

  it("is entered, changed and shown to its person alone", async () => {
    expect((await request("GET", "/api/me/license", { as: owner })).body).toEqual({ license: null });
    await request("PUT", "/api/me/license", { as: owner, body: entry });
    const changed = await request("PUT", "/api/me/license", { as: owner, body: { ...entry, number: "L-2" } });
    expect(changed.body.license).toMatchObject({ ...entry, number: "L-2", sealGraphic: null, expired: false, expiry: { nearness: "in force", words: null } });
    const other = await inCompany(owner, owner.companyId, ["licensee"]);
    expect((await request("GET", "/api/me/license", { as: other })).body).toEqual({ license: null });
  });

  it.each([["2030-02-30"], ["31.12.2030"], [""]])("takes no expiry %j", async (expiresOn) => {
    expect(await request("PUT", "/api/me/license", { as: owner, body: { ...entry, expiresOn } })).toMatchObject({ status: 422, body: { field: "expiresOn" } });
  });

  it("takes a seal graphic that is a whole PNG, judged by its bytes", async () => {
    await request("PUT", "/api/me/license", { as: owner, body: entry });
    const good = png(300, 200);
    expect((await upload(owner, new Uint8Array(good))).body.license.sealGraphic).toEqual({ widthPx: 300, heightPx: 200 });
    const shown = await request("GET", "/api/me/license/seal-graphic", { as: owner });
    expect(shown.bytes.equals(good)).toBe(true);
    expect(shown.headers.get("content-type")).toBe("image/png");

    const damaged = Buffer.from(good);
    damaged[60] = (damaged[60] ?? 0) ^ 1;
    const refusals: [string, Buffer][] = [
      ["SVG", Buffer.from("<svg xmlns='http://www.w3.org/2000/svg'/>")], ["JPEG", Buffer.from("ffd8ffe000104a464946", "hex")], ["cut off", good.subarray(0, 80)],
      ["damaged", damaged], ["too small", png(10, 10)], ["too large a side", png(2500, 64)], ["empty", Buffer.alloc(0)],
    ];
    for (const [name, bytes] of refusals) expect([name, (await upload(owner, new Uint8Array(bytes))).body.code]).toEqual([name, "seal-graphic"]);
    expect((await upload(owner, new Uint8Array(600 * 1024))).status).toBe(413);
    expect((await request("GET", "/api/me/license", { as: owner })).body.license.sealGraphic).toEqual({ widthPx: 300, heightPx: 200 });
  });

  it("comes before its seal graphic", async () => {
    const person = await inCompany(owner, owner.companyId, ["licensee"]);
    expect(await upload(person, new Uint8Array(png(100, 100)))).toMatchObject({ status: 422, body: { field: "sealGraphic" } });
  });
});
