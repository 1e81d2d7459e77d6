import { parse } from "csv-parse/sync";
import { beforeAll, describe, expect, it } from "vitest";
import type { RecordLine } from "@/lib/api";
import { database } from "@/lib/server/data/database";
import { drawingOf, place, save } from "./support/drawings";
import { firstAdministrator, inCompany, newJob, ofAnotherCompany, onJob, signIn, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
let colleague: Person;
let twin: Person & { companyId: string };
let jobId: string;
const CLIENT = { "user-agent": "Browser of the tests/1.0" };
const records = async (query: string, as: Person = owner, companyId = owner.companyId) => request("GET", `/api/companies/${companyId}/audit${query}`, { as });
const lines = async (query: string): Promise<RecordLine[]> => (await records(query)).body.records;
const people = async (): Promise<{ id: string; userId: string; active: boolean; license?: unknown }[]> => (await request("GET", `/api/companies/${owner.companyId}/people`, { as: owner })).body.people;
const membershipOf = async (person: Person) => (await people()).find((each) => each.userId === person.id)?.id ?? "";
const change = async (person: Person, body: unknown, as: Person = owner) =>
  request("PATCH", `/api/companies/${owner.companyId}/people/${await membershipOf(person)}`, { as, body, headers: CLIENT });
const table = async (query: string, as: Person = owner) => {
  const answer = await request("GET", `/api/companies/${owner.companyId}/audit.csv${query}`, { as });
  return { ...answer, rows: answer.status === 200 ? (parse(answer.bytes, { bom: true, relax_column_count: true }) as string[][]) : [] };
};

beforeAll(async () => {
  owner = await firstAdministrator();
  jobId = await newJob(owner, { name: "Recorded barn", number: "R-1" });
  twin = await ofAnotherCompany();
  colleague = await inCompany(owner, owner.companyId, ["designer"]);
});

describe("the records", () => {
  it("say who did what, when, from where and by which request, with before and after", async () => {
    const started = Date.now();
    const answer = await change(colleague, { roles: ["designer", "installer"] });
    const [line] = await lines("?action=person.roles");
    expect(line).toMatchObject({
      action: "person.roles", words: "Changed somebody's roles in the company", note: "Of the company: designer, installer", subject: `users/${colleague.id}`, job: null,
      person: { id: owner.id, name: owner.name, email: owner.email }, requestId: answer.headers.get("x-request-id"), userAgent: "Browser of the tests/1.0",
      changes: [{ field: "roles", before: "designer", after: "designer, installer" }],
    });
    const at = Date.parse(line?.at ?? "");
    expect(at).toBeGreaterThanOrEqual(started - 1000);
    expect(at).toBeLessThanOrEqual(Date.now() + 1000);
  });

  it("hold what happens on a job, in the drawing and by the worker under the job's company", async () => {
    const { id: drawingId } = await drawingOf(owner, jobId);
    await save(owner, drawingId, 0, place("ds-1", "DS-1"));
    const [line] = await lines("?action=drawing");
    expect(line).toMatchObject({ action: "drawing.save", job: { id: jobId, number: "R-1", name: "Recorded barn" } });
    const { audit } = await import("@/lib/server/data/audit");
    await database().sequelize.transaction((transaction) => audit(transaction, null, { action: "revision.sealed", subject: "revisions/x", jobId, detail: { letter: "Q" } }));
    expect((await lines("?person=itself"))[0]).toMatchObject({ action: "revision.sealed", person: null, address: null, note: "Rev Q" });
  });

  it("hold the fields of a job that changed, as they were and as they are, and no others", async () => {
    const id = await newJob(owner, { name: "Before" });
    await request("PATCH", `/api/jobs/${id}`, { as: owner, body: { name: "After", parcel: "", dueOn: "2027-01-15", permitFeeCents: 12500, site: { elevationM: 310, designHighC: 35 } } });
    const [line] = await lines("?action=job.edit");
    expect([...(line?.changes ?? [])].sort((a, b) => a.field.localeCompare(b.field))).toEqual([
      { field: "design high, °C", before: "33", after: "35" }, { field: "due on", before: "", after: "2027-01-15" }, { field: "name", before: "Before", after: "After" },
      { field: "permit fee, cents", before: "", after: "12500" },
    ]);
  });

  it("hold what a person does with their own account for each of their companies, and for no other", async () => {
    const body = { state: "Test State", number: "L-77", title: "PE", expiresOn: "2030-12-31" };
    await request("PUT", "/api/me/license", { as: colleague, body });
    await request("PUT", "/api/me/license", { as: colleague, body: { ...body, number: "L-78" } });
    const [second, first] = await lines("?action=license.put");
    expect(second?.changes).toEqual([{ field: "number", before: "L-77", after: "L-78" }]);
    expect(first?.changes).toContainEqual({ field: "expires on", before: "", after: "2030-12-31" });
    expect((await records("?action=license.put", twin, twin.companyId)).body.records).toEqual([]);
  });

  it("are found by words in names, jobs and details, all of which have to stand in an entry", async () => {
    expect((await lines("?q=recorded+ds-1")).length).toBe(0);
    expect((await lines("?q=RECORDED+barn&action=drawing")).map((each) => each.action)).toEqual(["drawing.save"]);
    expect((await lines("?q=l-78")).map((each) => each.action)).toEqual(["license.put"]);
    expect((await lines("?q=%25")).length).toBe(0);
    expect((await lines("?q=_")).length).toBe(0);
    expect(await lines(`?q=${encodeURIComponent("'; drop table audit_log; --")}`)).toEqual([]);
  });

  it("are narrowed by kind, person and days, both ends included", async () => {
    const day = new Date().toISOString().slice(0, 10);
    const shifted = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10);
    const all = (await lines("?limit=100")).length;
    expect((await lines(`?limit=100&from=${shifted(-1)}&to=${day}`)).length).toBe(all);
    expect(await lines(`?to=${shifted(-1)}`)).toEqual([]);
    expect(await lines(`?from=${shifted(1)}`)).toEqual([]);
    expect(await lines(`?to=${encodeURIComponent(new Date(0).toISOString())}`)).toEqual([]);
    expect(new Set((await lines(`?limit=100&person=${colleague.id}`)).map((each) => each.person?.id))).toEqual(new Set([colleague.id]));
    expect((await lines("?limit=100&action=but-drawing")).map((each) => each.action)).not.toContain("drawing.save");
    expect(new Set((await lines("?limit=100&action=people")).map((each) => each.action.split(".")[0]))).toEqual(new Set(["person"]));
  });

  it("come page by page, each entry once, newest first, whatever is added meanwhile", async () => {
    const whole = (await lines("?limit=100")).map((each) => each.id);
    const read: string[] = [];
    let cursor = "";
    do {
      const answer = (await records(`?limit=3${cursor && `&cursor=${cursor}`}`)).body;
      read.push(...answer.records.map((each: RecordLine) => each.id));
      expect(answer.people === undefined).toBe(cursor !== "");
      cursor = answer.next ?? "";
      await request("PATCH", `/api/jobs/${jobId}`, { as: owner, body: { parcel: `P-${read.length}` } });
    } while (cursor);
    expect(read).toEqual(whole);
    expect([...whole].sort((a, b) => Number(b) - Number(a))).toEqual(whole);
  });

  it.each(["?limit=101", "?limit=0", "?cursor=x", "?from=yesterday", "?person=somebody", "?action=%25", "?other=1", "?cursor=99999999999"])("refuse %s, naming the field", async (query) => {
    expect(await records(query)).toMatchObject({ status: 422, body: { field: query.slice(1).split("=")[0] } });
  });

  it("take no entry of another company as a cursor", async () => {
    await request("PATCH", `/api/companies/${twin.companyId}`, { as: twin, body: { name: "Southlight Works Two" } });
    const foreign = (await records("", twin, twin.companyId)).body.records[0].id;
    expect(await records(`?cursor=${foreign}`)).toMatchObject({ status: 422, body: { field: "cursor" } });
  });

  it("are for administrators alone", async () => {
    expect((await records("", colleague)).status).toBe(403);
    expect((await table("", colleague)).status).toBe(403);
    const outside = await onJob(owner, jobId, ["administrator"], "Administrator of one job");
    expect((await records("", outside)).status).toBe(404);
  });

  it("stay: no column is changed, no row and no table removed", async () => {
    const run = (sql: string) => database().sequelize.query(sql);
    for (const set of ["company_id = null", "from_address = '10.0.0.1'", "user_agent = 'other'", "request_id = 'other'", "search = ''", "actor_id = null", "at = now()"]) {
      await expect(run(`update audit_log set ${set}`)).rejects.toThrow("only added to");
    }
    await expect(run("delete from audit_log")).rejects.toThrow("only added to");
    await expect(run("truncate audit_log")).rejects.toThrow("only added to");
  });
});

describe("the table of the records", () => {
  it("has headings, instants in UTC and the filtered entries, newest first, and taking it is recorded", async () => {
    const { rows, headers } = await table("?action=people");
    expect(rows[0]?.slice(0, 5)).toEqual(["Time (UTC)", "Person", "Mail address", "Action", "What happened"]);
    expect(rows.slice(1).every((row) => /^\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z$/.test(row[0] ?? "") && row.length === rows[0]?.length)).toBe(true);
    expect(rows.slice(1).map((row) => row[3])).toEqual((await lines("?action=people&limit=100")).map((each) => each.action));
    expect(headers.get("content-disposition")).toMatch(/^attachment; filename="records-\d{4}-\d\d-\d\d\.csv"$/);
    expect((await lines("?action=records.export"))[0]).toMatchObject({ facts: [{ field: "action", value: "people" }] });
  });

  // What spreadsheets run: cells that begin with = + - @, tab or carriage return (OWASP, CSV Injection).
  it.each(["=1+1", "+1 555", "-cmd", "@SUM(A1)", "=HYPERLINK(\"https://elsewhere.example\")"])("makes %s harmless and keeps quotes and line breaks", async (number) => {
    await request("PUT", "/api/me/license", { as: owner, body: { state: "Test \"State\"", number, title: "PE", expiresOn: "2030-12-31" } });
    await request("PATCH", `/api/companies/${owner.companyId}`, { as: owner, body: { name: number } });
    await newJob(owner, { name: number });
    const { rows } = await table(`?person=${owner.id}`);
    expect(rows.flat().filter((cell) => /^[=+\-@\t\r]/.test(cell))).toEqual([]);
    expect(rows.flat()).toContain(`'${number}`);
  });

  it("is written in pieces: more rows than one piece, each once, and says where it was cut off", async () => {
    await database().sequelize.query(
      "insert into audit_log (company_id, action, subject, at) select :companyId, 'job.edit', 'jobs/' || n, timestamptz '2020-01-01' + (n / 3) * interval '1 second' from generate_series(1, 2500) n",
      { replacements: { companyId: owner.companyId } },
    );
    const { rows } = await table("?to=2020-12-31");
    expect(rows.slice(1).map((row) => row[7])).toEqual(Array.from({ length: 2500 }, (_, index) => `jobs/${2500 - index}`));
    const { exportRecords } = await import("@/lib/server/data/recordsExport");
    const actor = { ...owner, requestId: null, from: null };
    const cut = async (most: number) => parse(await new Response(await exportRecords(actor, owner.companyId, { q: "", to: "2020-12-31" }, most)).text(), { bom: true, relax_column_count: true }) as string[][];
    expect((await cut(1200)).length).toBe(1 + 1200 + 1);
    expect((await cut(1200)).at(-1)?.[0]).toContain("More than 1200 entries");
    expect((await cut(2500)).length).toBe(1 + 2500);
    expect((await cut(2499)).at(-1)?.[0]).toContain("More than 2499 entries");
  });
});

describe("an account of the company", () => {
  it("is closed: its sessions end, nobody signs in with it, and it can be opened again", async () => {
    const person = await inCompany(owner, owner.companyId, ["designer"]);
    expect((await change(person, { active: false })).body).toMatchObject({ active: false, roles: ["designer"] });
    expect((await request("GET", "/api/me", { as: person })).status).toBe(401);
    expect(await signIn(person.email)).toBeNull();
    expect((await change(person, { active: true })).body.active).toBe(true);
    // The old session does not come back with the account.
    expect((await request("GET", "/api/me", { as: person })).status).toBe(401);
    expect(await signIn(person.email)).not.toBeNull();
    expect((await lines("?action=person.active")).map((each) => each.changes)).toEqual([[{ field: "active", before: "no", after: "yes" }], [{ field: "active", before: "yes", after: "no" }]]);
  });

  it("is not closed by its own person, by somebody who is no administrator, or where it is used elsewhere too", async () => {
    expect((await change(owner, { active: false })).body.code).toBe("own-account");
    expect((await change(owner, { active: false }, colleague)).status).toBe(403);
    const shared = await inCompany(owner, owner.companyId, ["designer"]);
    await request("POST", `/api/companies/${twin.companyId}/people`, { as: twin, body: { email: shared.email, roles: ["designer"] } });
    expect((await change(shared, { active: false })).body.code).toBe("account-elsewhere");
    expect((await request("GET", "/api/me", { as: shared })).status).toBe(200);
    expect(await change(shared, {})).toMatchObject({ status: 422, body: { field: "roles" } });
  });

  it("of the last administrator stays, with the role, also where the other one's account is closed", async () => {
    const second = await inCompany(owner, owner.companyId, ["administrator"]);
    await change(second, { active: false });
    expect((await change(owner, { roles: ["designer"] })).body.code).toBe("last-administrator");
    expect(await request("DELETE", `/api/companies/${owner.companyId}/people/${await membershipOf(owner)}`, { as: owner })).toMatchObject({ status: 409, body: { code: "last-administrator" } });
    await change(second, { active: true });
    const again = await signIn(second.email);
    expect((await change(owner, { roles: ["designer"] }, { ...second, cookie: again?.cookie ?? "" })).status).toBe(200);
    expect((await change(second, { roles: ["designer"] }, { ...second, cookie: again?.cookie ?? "" })).body.code).toBe("last-administrator");
    await database().Membership.update({ roles: ["administrator", "designer"] }, { where: { userId: owner.id } });
  });
});
