import { beforeAll, describe, expect, it } from "vitest";
import { newEquipment } from "@/lib/diagram/commands";
import { STARTER_SET } from "@/lib/equipment/starter";
import { database } from "@/lib/server/data/database";
import { seedEntries } from "./support/library";
import { firstAdministrator, inCompany, newJob, onJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let designer: Person;
let installer: Person;
let outside: Person;
let jobId: string;

beforeAll(async () => {
  owner = await firstAdministrator();
  designer = await inCompany(owner, owner.companyId, ["designer"]);
  installer = await inCompany(owner, owner.companyId, ["installer"]);
  jobId = await newJob(owner);
  // On the job alone, not of the company.
  outside = await onJob(owner, jobId, ["licensee", "designer"]);
});

const base = () => `/api/companies/${owner.companyId}/library`;
const breaker = (ratingA: number, more: Record<string, unknown> = {}) => ({
  props: { make: "Oddfellow", model: "OF-60", current: "ac", ratingA, poles: 2 }, sources: { ratingA: { document: "OF sheet", page: "3" } }, ports: { line: { continuousA: ratingA } }, ...more,
});
const add = async (name: string, data: unknown = breaker(60), as: Person = owner) => request("POST", base(), { as, body: { kind: "breaker", name, data } });
const added = async (name: string, data?: unknown): Promise<string> => (await add(name, data)).body.id;
const read = async (id: string, as: Person = owner) => (await request("GET", `/api/library/${id}`, { as })).body;
const change = (id: string, body: Record<string, unknown>, as: Person = owner) => request("PATCH", `/api/library/${id}`, { as, body });

describe("the library of a new company", () => {
  it("holds the starter set, marked as such", async () => {
    const { body } = await request("GET", `${base()}?limit=200`, { as: installer });
    expect(body.entries.map((each: { kind: string; name: string; starter: boolean }) => `${each.kind} ${each.name} ${each.starter}`).sort())
      .toEqual(STARTER_SET.map((each) => `${each.kind} ${each.name} true`).sort());
    expect(body).toMatchObject({ total: STARTER_SET.length, may: { edit: false } });
  });

  it("stops calling an entry a starter once no invented value is left in it", async () => {
    const { body } = await request("GET", `${base()}?kind=generator`, { as: owner });
    const { id, version } = body.entries[0];
    const { data } = await read(id);
    const half = Object.fromEntries(Object.entries(data.sources).map(([name, source], index) => [name, index === 0 ? { document: "Own sheet", page: "1" } : source]));
    expect((await change(id, { baseVersion: version, data: { ...data, sources: half } })).body).toMatchObject({ version: 2, starter: true });
    const all = Object.fromEntries(Object.keys(data.sources).map((name) => [name, { document: "Own sheet", page: "1" }]));
    expect((await change(id, { baseVersion: 2, data: { ...data, sources: all } })).body).toMatchObject({ version: 3, starter: false });
  });
});

describe("an entry", () => {
  it("is taken in by designers and administrators, and by nobody else", async () => {
    expect((await add("Taken by a designer", breaker(60), designer)).status).toBe(201);
    expect(await add("Taken by an installer", breaker(60), installer)).toMatchObject({ status: 403, body: { code: "not-allowed" } });
    expect((await add("Taken by an outsider", breaker(60), outside)).status).toBe(404);
    const id = await added("Looked at");
    expect(await read(id, installer)).toMatchObject({ name: "Looked at", may: { edit: false } });
    expect((await change(id, { baseVersion: 1, name: "X" }, installer)).status).toBe(403);
    expect((await request("GET", `/api/library/${id}`, { as: outside })).status).toBe(404);
    expect((await request("GET", `/api/library/${id}/versions/1`, { as: outside })).status).toBe(404);
  });

  it("is whole: every property of its kind, what was not stated as null", async () => {
    const entry = await read(await added("Whole"));
    expect(entry).toMatchObject({ kind: "breaker", make: "Oddfellow", model: "OF-60", version: 1, archived: false, starter: false, rated: 2, sourced: 1, companyId: owner.companyId, usedBy: [] });
    expect(Object.keys(entry.data.props)).toEqual(Object.keys(newEquipment("breaker", "", { x: 0, y: 0 }).props));
    expect(entry.data.props).toMatchObject({ ratingA: 60, trip: null });
  });

  it.each([
    ["data.props.ratingA", breaker(6001)], ["data.props.amps", breaker(60, { props: { amps: 1 } })], ["data.ports.common", breaker(60, { ports: { common: {} } })],
    ["data.sources.amps", breaker(60, { sources: { amps: { document: "a", page: "" } } })], ["data.ports.line.continuousA", breaker(60, { ports: { line: { continuousA: -1 } } })],
    ["data.sources.ratingA.file", breaker(60, { sources: { ratingA: { document: "a", page: "", file: "7d444840-9dc0-41d1-b245-5ffdce74fad2" } } })],
  ])("is refused with %s named", async (field, data) => {
    expect(await add("Refused", data)).toMatchObject({ status: 422, body: { field } });
  });

  it("has a name of its own in its kind, whatever the letter case, also beside archived ones", async () => {
    const id = await added("Only one");
    expect(await add("ONLY ONE")).toMatchObject({ status: 409, body: { code: "name-taken" } });
    await change(id, { baseVersion: 1, archived: true });
    expect(await add("Only one")).toMatchObject({ status: 409, body: { code: "name-taken" } });
    const other = await added("Other one");
    expect(await change(other, { baseVersion: 1, name: "only one" })).toMatchObject({ status: 409, body: { code: "name-taken" } });
    expect((await request("POST", base(), { as: owner, body: { kind: "toaster", name: "T", data: { props: {}, sources: {}, ports: {} } } })).body).toMatchObject({ status: 422, field: "kind" });
  });
});

describe("versions", () => {
  it("follow one another, and earlier ones stay readable", async () => {
    const id = await added("Versioned");
    const answer = await change(id, { baseVersion: 1, data: breaker(70), note: "New sheet" }, designer);
    expect(answer.body).toMatchObject({ version: 2, data: { props: { ratingA: 70 } } });
    expect(answer.body.versions.map((each: { version: number; note: string; by: string }) => [each.version, each.note, each.by])).toEqual([[2, "New sheet", designer.name], [1, "", owner.name]]);
    expect((await request("GET", `/api/library/${id}/versions/1`, { as: installer })).body).toEqual({
      version: 1, by: owner.name, at: expect.any(String), note: "", data: expect.objectContaining({ props: expect.objectContaining({ ratingA: 60 }) }),
    });
    expect((await request("GET", `/api/library/${id}/versions/3`, { as: owner })).status).toBe(404);
  });

  it("are not made by a new name, the archive or the same values", async () => {
    const id = await added("Renamed");
    expect((await change(id, { baseVersion: 1, name: "Renamed since", data: breaker(60), archived: true })).body).toMatchObject({ version: 1, name: "Renamed since", archived: true });
    expect((await change(id, { baseVersion: 1, archived: false })).body).toMatchObject({ version: 1, archived: false });
  });

  it("are not lost to somebody who edited an older one: the answer holds what is there", async () => {
    const id = await added("Twice edited");
    await change(id, { baseVersion: 1, data: breaker(70) });
    const late = await change(id, { baseVersion: 1, data: breaker(80), name: "Late", archived: true }, designer);
    expect(late).toMatchObject({ status: 409, body: { code: "entry-changed", version: 2, name: "Twice edited", data: { props: { ratingA: 70 } } } });
    expect(await read(id)).toMatchObject({ version: 2, name: "Twice edited", archived: false });
    const both = await Promise.all([90, 100].map((ratingA) => change(id, { baseVersion: 2, data: breaker(ratingA) })));
    expect(both.map((each) => each.status).sort()).toEqual([200, 409]);
    expect((await read(id)).version).toBe(3);
  });

  it("cannot be changed or taken out by any statement", async () => {
    const id = await added("Kept");
    for (const statement of ["update library_versions set data = '{}'", "update library_versions set note = 'x'", "delete from library_versions"]) {
      await expect(database().sequelize.query(`${statement} where entry_id = :id`, { replacements: { id } })).rejects.toThrow("never changed");
    }
    expect((await read(id)).data.props.ratingA).toBe(60);
  });

  it("are in the audit log with who made them", async () => {
    const id = await added("Audited");
    await change(id, { baseVersion: 1, data: breaker(70) }, designer);
    await change(id, { baseVersion: 2, archived: true });
    await change(id, { baseVersion: 1, data: breaker(99) });
    const rows = await database().AuditEntry.findAll({ where: { subject: `library_entries/${id}` }, order: [["id", "ASC"]] });
    expect(rows.map((each) => [each.action, each.actorId, each.companyId, each.detail["version"] ?? each.detail["archived"] ?? null])).toEqual([
      ["library.create", owner.id, owner.companyId, null], ["library.change", designer.id, owner.companyId, 2], ["library.archive", owner.id, owner.companyId, true],
    ]);
  });
});

describe("the list", () => {
  it("finds every word in name, maker, model or kind, takes signs as they are, and sorts by name", async () => {
    await seedEntries(owner.companyId, 60);
    const find = async (query: string) => (await request("GET", `${base()}?${query}`, { as: installer })).body;
    expect((await find("q=seeded&limit=200")).total).toBe(60);
    expect((await find("q=SEEDED m-17")).entries.map((each: { name: string }) => each.name)).toEqual(["Seeded breaker 00017"]);
    expect((await find("q=circuit 00017")).total).toBe(1);
    expect((await find("q=transfer seeded")).total).toBe(0);
    for (const sign of ["%25", "_", "%5C"]) expect((await find(`q=Seeded${sign}breaker`)).total).toBe(0);
    const page = await find("q=seeded&limit=10&offset=50");
    expect(page.entries.map((each: { name: string }) => each.name)).toEqual(Array.from({ length: 10 }, (_, index) => `Seeded breaker 000${51 + index}`));
    expect(page.entries[9]).toMatchObject({ version: 2, rated: 7, sourced: 1, make: "Maker 00" });
    expect(await find("q=seeded&limit=10&offset=500")).toMatchObject({ entries: [], total: 60 });
    expect((await find("kind=generator")).entries.every((each: { kind: string }) => each.kind === "generator")).toBe(true);
    expect((await find("archived=yes&limit=200")).entries.every((each: { archived: boolean }) => each.archived)).toBe(true);
  });
});
