import { randomUUID } from "node:crypto";
import { QueryTypes } from "sequelize";
import { beforeAll, describe, expect, it, vi } from "vitest";
import { RULE_SET_VERSION } from "@/lib/rules";
import { ACTION_WORDS } from "@/lib/server/data/historyWords";
import { database } from "@/lib/server/data/database";
import { waitsFor } from "@/lib/server/data/waitsFor";
import { drawingOf, place, save } from "./support/drawings";
import { firstAdministrator, inCompany, jobBody, newJob, ofAnotherCompany, onJob, type Person } from "./support/people";
import { request } from "./support/server";

let owner: Person & { companyId: string };
const list = async (as: Person, query = "") => (await request("GET", `/api/jobs${query}`, { as })).body;
const numbers = async (as: Person, query = "") => (await list(as, query)).jobs.map((job: { number: string }) => job.number);
const make = (number: string, name: string, change: Record<string, unknown> = {}) => newJob(owner, { number, name, ...change });

beforeAll(async () => { owner = await firstAdministrator(); });

describe("the register", () => {
  let ids: Record<"barn" | "mill" | "kiln", string>;
  beforeAll(async () => {
    ids = {
      barn: await make("26-001", "Long barn", { addressLines: "5 Hazel Road\nNettlecombe", parcel: "07-9" }),
      mill: await make("26-002", "Mill house", { addressLines: "9 Weir Lane\nAlderby", owner: "Orla Finch" }),
      kiln: await make("26-003", "Kiln 100%_yard", { addressLines: "2 Clay Pit\nAlderby" }),
    };
  });

  it.each([
    ["hazel", ["26-001"]], ["ALDERBY mill", ["26-002"]], ["finch", ["26-002"]], ["07-9", ["26-001"]], ["26-003", ["26-003"]], ["nobody", []],
    // Signs of the database's own patterns stand for themselves.
    ["100%_", ["26-003"]], ["%", ["26-003"]], ["_", ["26-003"]], ["\\", []], ["' or 1=1 --", []],
  ])("finds %s", async (words, found) => {
    expect((await numbers(owner, `?q=${encodeURIComponent(words)}`)).sort()).toEqual(found);
  });
  it("counts what it pages, and sorts", async () => {
    const first = await list(owner, "?sort=number&limit=2");
    expect(first).toMatchObject({ total: 3, tabs: { all: 3, mine: 3, draft: 3, review: 0, sealed: 0 } });
    expect(first.jobs.map((job: { number: string }) => job.number)).toEqual(["26-003", "26-002"]);
    expect(await numbers(owner, "?sort=number&limit=2&offset=2")).toEqual(["26-001"]);
    expect(await numbers(owner, "?sort=name")).toEqual(["26-003", "26-001", "26-002"]);
  });
  it("knows what is due, and what is late", async () => {
    const day = (offset: number) => new Date(Date.now() + offset * 86_400_000).toISOString().slice(0, 10);
    await request("PATCH", `/api/jobs/${ids.barn}`, { as: owner, body: { dueOn: day(-1) } });
    await request("PATCH", `/api/jobs/${ids.mill}`, { as: owner, body: { dueOn: day(7) } });
    await request("PATCH", `/api/jobs/${ids.kiln}`, { as: owner, body: { dueOn: day(40) } });
    expect(await numbers(owner, "?due=late")).toEqual(["26-001"]);
    expect(await numbers(owner, "?due=soon&sort=due")).toEqual(["26-001", "26-002"]);
    // The evening before in the west is another day than here.
    expect(await numbers(owner, `?due=late&today=${day(-1)}`)).toEqual([]);
    expect(await numbers(owner, `?due=soon&sort=due&today=${day(26)}`)).toEqual(["26-001", "26-002", "26-003"]);
    expect(await numbers(owner, `?due=soon&sort=due&today=${day(25)}`)).toEqual(["26-001", "26-002"]);
    await request("PATCH", `/api/jobs/${ids.barn}`, { as: owner, body: { officeStatus: "closed" } });
    expect(await numbers(owner, "?due=late")).toEqual([]);
    expect(await numbers(owner, "?status=closed")).toEqual(["26-001"]);
  });
  it("says in the database what it says in words: who a job waits for", async () => {
    const { id: drawingId } = await drawingOf(owner, ids.mill);
    await save(owner, drawingId, 0, place("ds-1", "DS-1"));
    await request("POST", `/api/jobs/${ids.mill}/revisions`, { as: owner, body: { purpose: "issued for permit" } });
    const licensee = await onJob(owner, ids.mill, ["licensee"]);
    for (const person of [owner, licensee]) {
      const { jobs } = await list(person);
      const mine = new Set(await numbers(person, "?tab=mine"));
      for (const job of jobs) expect([job.number, mine.has(job.number)]).toEqual([job.number, job.waitsFor?.mine ?? false]);
    }
    expect(await numbers(licensee, "?tab=mine")).toEqual(["26-002"]);
    expect(await numbers(owner, "?tab=review")).toEqual(["26-002"]);
    expect(waitsFor({ roles: ["designer"], revision: null, counts: null, licensees: [], userId: owner.id })).toEqual({ mine: true, text: "You: checking" });
  });
  it("shows kept counts, and works the rest out without being asked twice", async () => {
    await database().sequelize.query("update drawings set check_counts = null, checked_sequence = null", { type: QueryTypes.UPDATE });
    await list(owner);
    const rows = await database().Drawing.findAll({ attributes: ["checkedRuleSet"] });
    expect(rows.filter((row) => row.checkedRuleSet === RULE_SET_VERSION).length).toBeGreaterThan(0);
    const { jobs } = await list(owner);
    expect(jobs.every((job: { counts: unknown }) => job.counts !== null)).toBe(true);
  });
  it("names a job whose drawing cannot be checked, without counts, beside the others", async () => {
    const { sequelize } = database();
    const [kept] = await sequelize.query<{ document: unknown }>("select document from drawings where job_id = :job", { type: QueryTypes.SELECT, replacements: { job: ids.kiln } });
    await sequelize.query("update drawings set document = document - 'equipment', check_counts = null, checked_sequence = null where job_id = :job", { replacements: { job: ids.kiln } });
    const errors = vi.spyOn(console, "error").mockImplementation(() => undefined);
    const { jobs } = await list(owner, "?sort=number");
    expect(jobs.map((job: { number: string; counts: unknown }) => [job.number, job.counts === null])).toEqual([["26-003", true], ["26-002", false], ["26-001", false]]);
    expect(errors).toHaveBeenCalled();
    errors.mockRestore();
    await sequelize.query("update drawings set document = :document where job_id = :job", { replacements: { job: ids.kiln, document: JSON.stringify(kept?.document) } });
  });
  it("shows a person of another company none of it, whatever they search", async () => {
    const twin = await ofAnotherCompany();
    expect(await numbers(twin, "?q=mill")).toEqual([]);
    expect((await list(twin, "?q=barn")).jobs.map((job: { name: string }) => job.name)).toEqual(["Twin barn"]);
    expect((await list(twin)).jurisdictions).toHaveLength(1);
  });
  it.each(["?limit=0", "?limit=201", "?tab=secret", "?sort=password", "?offset=-1", `?q=${"x".repeat(121)}`, "?unknown=1", "?jurisdiction=1"])("refuses %s by name", async (query) => {
    expect(await request("GET", `/api/jobs${query}`, { as: owner })).toMatchObject({ status: 422, body: { code: "field" } });
  });
});

describe("a job's office data", () => {
  it("keeps the fee as amount, day and receipt number, and names a wrong one", async () => {
    const id = await make("F-1", "Fee");
    const answer = await request("PATCH", `/api/jobs/${id}`, { as: owner, body: { permitFeeCents: 41250, permitFeePaidOn: "2026-11-30", permitReceipt: "R-7741" } });
    expect(answer.body).toMatchObject({ permitFeeCents: 41250, permitFeePaidOn: "2026-11-30", permitReceipt: "R-7741" });
    for (const [field, value] of [["permitFeeCents", -1], ["permitFeeCents", 12.5], ["permitFeePaidOn", "30.11.2026"], ["dueOn", "soon"], ["officeStatus", "lost"], ["permitReceipt", "x".repeat(61)]] as const) {
      expect(await request("PATCH", `/api/jobs/${id}`, { as: owner, body: { [field]: value } })).toMatchObject({ status: 422, body: { field } });
    }
  });
  it("does not touch the drawing: the seal would be void for a due date", async () => {
    const id = await make("F-2", "Due");
    const before = await drawingOf(owner, id);
    await request("PATCH", `/api/jobs/${id}`, { as: owner, body: { dueOn: "2027-01-15" } });
    expect((await drawingOf(owner, id)).sequence).toBe(before.sequence);
  });
  it("proposes the next number by the company's scheme", async () => {
    const year = String(new Date().getUTCFullYear()).slice(2);
    await make(`${year}-417`, "Numbered");
    expect((await request("GET", `/api/companies/${owner.companyId}/next-job-number`, { as: owner })).body).toEqual({ number: `${year}-418`, scheme: "{yy}-{nnn}" });
    const installer = await inCompany(owner, owner.companyId, ["installer"]);
    expect((await request("GET", `/api/companies/${owner.companyId}/next-job-number`, { as: installer })).status).toBe(403);
  });
  it("takes numbers one after the other, without a gap, for people who make jobs at once", async () => {
    const next = async () => Number((await request("GET", `/api/companies/${owner.companyId}/next-job-number`, { as: owner })).body.number.split("-")[1]);
    const first = await next();
    const body = (change: Record<string, unknown> = {}) => jobBody(owner.companyId, { number: undefined, name: "At once", ...change });
    const answers = await Promise.all([
      ...Array.from({ length: 5 }, () => request("POST", "/api/jobs", { as: owner, body: body() })),
      // Refused after its number was taken: it may leave no gap.
      request("POST", "/api/jobs", { as: owner, body: body({ jurisdiction: { id: randomUUID() } }) }),
    ]);
    expect(answers.map((answer) => answer.status)).toEqual([201, 201, 201, 201, 201, 422]);
    const taken = await Promise.all(answers.slice(0, 5).map(async ({ body: { id } }) => (await request("GET", `/api/jobs/${id}`, { as: owner })).body.number));
    expect(taken.map((number: string) => Number(number.split("-")[1])).sort((a, b) => a - b)).toEqual([0, 1, 2, 3, 4].map((offset) => first + offset));
    expect(await next()).toBe(first + 5);
    const [{ body: { id } }] = answers as [(typeof answers)[number]];
    const drawing = (await drawingOf(owner, id)).drawing;
    expect(drawing.sheet.titleBlock.jobNumber).toBe(taken[0]);
    const copy = await request("POST", `/api/jobs/${id}/duplicate`, { as: owner, body: { name: "Copy at once" } });
    expect((await request("GET", `/api/jobs/${copy.body.id}`, { as: owner })).body.number).toMatch(new RegExp(`-${first + 5}$`));
  });
});

describe("a copy of a job", () => {
  it("has the drawing and the site, and nothing that was granted for the first one", async () => {
    const id = await make("D-1", "First", { permitNumber: "BP-9", owner: "Orla Finch" });
    const { id: drawingId } = await drawingOf(owner, id);
    await save(owner, drawingId, 0, place("ds-1", "DS-1"));
    const licensee = await onJob(owner, id, ["licensee"]);
    const made = await request("POST", `/api/jobs/${id}/duplicate`, { as: owner, body: { number: "D-2", name: "Second" } });
    expect(made.status).toBe(201);
    const copy = (await drawingOf(owner, made.body.id)).drawing;
    expect(copy.sheet.titleBlock).toMatchObject({ jobName: "Second", jobNumber: "D-2", permitNumber: "", owner: "Orla Finch" });
    expect(Object.keys(copy.equipment)).toEqual(["ds-1"]);
    expect((await request("GET", `/api/jobs/${made.body.id}/revisions`, { as: owner })).body.revisions).toEqual([]);
    expect((await request("GET", `/api/jobs/${made.body.id}`, { as: licensee })).status).toBe(404);
  });
  it("can begin empty, with the people", async () => {
    const id = await make("D-3", "Third");
    const licensee = await onJob(owner, id, ["licensee"]);
    const made = await request("POST", `/api/jobs/${id}/duplicate`, { as: owner, body: { number: "D-4", name: "Fourth", drawing: false, people: true } });
    expect((await drawingOf(owner, made.body.id)).drawing.equipment).toEqual({});
    expect((await request("GET", `/api/jobs/${made.body.id}`, { as: licensee })).status).toBe(200);
  });
  it("needs a number of its own and the right to make jobs", async () => {
    const id = await make("D-5", "Fifth");
    expect(await request("POST", `/api/jobs/${id}/duplicate`, { as: owner, body: { number: "D-5", name: "x" } })).toMatchObject({ status: 409, body: { code: "number-taken", field: "number" } });
    const outside = await onJob(owner, id, ["designer"]);
    expect((await request("POST", `/api/jobs/${id}/duplicate`, { as: outside, body: { number: "D-6", name: "x" } })).status).toBe(404);
  });
});

describe("the archive", () => {
  it("keeps a job as it is, out of the register, until it is taken out again", async () => {
    const id = await make("A-1", "Old");
    const drawing = await drawingOf(owner, id);
    expect((await request("POST", `/api/jobs/${id}/archive`, { as: owner, body: { archived: true } })).body).toMatchObject({ may: { edit: false, editDrawing: false } });
    expect(await numbers(owner, "?q=A-1")).toEqual([]);
    expect(await numbers(owner, "?q=A-1&archived=yes")).toEqual(["A-1"]);
    for (const answer of [
      await save(owner, drawing.id, 0, place("ds-1", "DS-1")), await request("PATCH", `/api/jobs/${id}`, { as: owner, body: { parcel: "1" } }),
      await request("POST", `/api/jobs/${id}/revisions`, { as: owner, body: { purpose: "issued for permit" } }),
    ]) expect(answer).toMatchObject({ status: 409, body: { code: "job-archived" } });
    await request("POST", `/api/jobs/${id}/archive`, { as: owner, body: { archived: false } });
    expect((await save(owner, drawing.id, 0, place("ds-1", "DS-1"))).status).toBe(200);
  });
  it("closes a review with it", async () => {
    const id = await make("A-3", "In review");
    await save(owner, (await drawingOf(owner, id)).id, 0, place("ds-1", "DS-1"));
    const issued = await request("POST", `/api/jobs/${id}/revisions`, { as: owner, body: { purpose: "issued for permit" } });
    const licensee = await onJob(owner, id, ["licensee"]);
    const back = () => request("POST", `/api/revisions/${issued.body.id}/return`, { as: licensee, body: { comment: "Once more" } });
    await request("POST", `/api/jobs/${id}/archive`, { as: owner, body: { archived: true } });
    expect(await back()).toMatchObject({ status: 409, body: { code: "job-archived" } });
    await request("POST", `/api/jobs/${id}/archive`, { as: owner, body: { archived: false } });
    expect((await back()).status).toBe(200);
  });
  it("is for administrators", async () => {
    const id = await make("A-2", "Other");
    const designer = await onJob(owner, id, ["designer"]);
    expect((await request("POST", `/api/jobs/${id}/archive`, { as: designer, body: { archived: true } })).status).toBe(403);
  });
});

describe("the history of a job", () => {
  it("tells who did what, saves in a row as one line, and pages back", async () => {
    const id = await make("H-1", "Told");
    const { id: drawingId } = await drawingOf(owner, id);
    for (const n of [0, 1, 2]) await save(owner, drawingId, n, place(`ds-${n}`, `DS-${n}`));
    await request("PATCH", `/api/jobs/${id}`, { as: owner, body: { dueOn: "2027-01-15" } });
    const { entries, more } = (await request("GET", `/api/jobs/${id}/history`, { as: owner })).body;
    expect(entries.map((each: { what: string }) => each.what)).toEqual(["Changed the job's data", "Changed the drawing, 3 saves", "Made the job"]);
    expect(entries[0]).toMatchObject({ by: owner.name, detail: "due on" });
    expect(more).toBe(false);
    const first = (await request("GET", `/api/jobs/${id}/history?limit=1`, { as: owner })).body;
    expect(first).toMatchObject({ more: true, entries: [{ what: "Changed the job's data" }] });
    const next = (await request("GET", `/api/jobs/${id}/history?limit=5&before=${first.entries[0].id}`, { as: owner })).body;
    expect(next.entries.map((each: { what: string }) => each.what)).toEqual(["Changed the drawing, 3 saves", "Made the job"]);
  });
  it("says into the archive or out of it, and which of two came first", async () => {
    const id = await make("H-2", "Moved");
    for (const archived of [true, false]) await request("POST", `/api/jobs/${id}/archive`, { as: owner, body: { archived } });
    const { entries } = (await request("GET", `/api/jobs/${id}/history`, { as: owner })).body;
    expect(entries.map((each: { what: string }) => each.what)).toEqual(["Took the job out of the archive", "Put the job into the archive", "Made the job"]);
  });
  it("has words for every action that the code writes", async () => {
    const { readdirSync, readFileSync } = await import("node:fs");
    const { join } = await import("node:path");
    const folder = join(import.meta.dirname, "../../lib/server");
    const files = readdirSync(folder, { recursive: true, encoding: "utf8" }).filter((file) => file.endsWith(".ts"));
    const written = new Set(files.flatMap((file) => [...readFileSync(join(folder, file), "utf8").matchAll(/action: "([a-z.-]+)"/g)].map((match) => match[1] as string)));
    expect(written.size).toBeGreaterThan(25);
    expect([...written].filter((action) => !Object.hasOwn(ACTION_WORDS, action))).toEqual([]);
  });
});

describe("a statement", () => {
  it("carries the name of who saves it", async () => {
    const id = await make("S-1", "Stated");
    const drawing = await drawingOf(owner, id);
    const statement = (by: string) => [{ op: "add", path: "/statements", value: { one: { rule: "dedicated-space", anchor: "site", value: "yes", by, on: "2026-12-01", note: "" } } }];
    expect(await save(owner, drawing.id, 0, statement("Somebody Else"))).toMatchObject({ status: 422, body: { code: "protected", field: "statements.one.by" } });
    expect((await save(owner, drawing.id, 0, statement(owner.name))).status).toBe(200);
  });
});
