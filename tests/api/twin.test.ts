import { randomUUID } from "node:crypto";
import { beforeAll, describe, expect, it } from "vitest";
import { emptyVisit } from "@/lib/diagram/siteVisit";
import { drawingOf, equipment, save } from "./support/drawings";
import { uploaded } from "./support/files";
import { firstAdministrator, inCompany, jobBody, newJob, ofAnotherCompany, onJob, type Person } from "./support/people";
import { png } from "./support/png";
import { request, type Answer, type Loose } from "./support/server";
import { things, type Things } from "./support/things";

/*
 * Two companies with one of everything each. Addresses are tried in access.test.ts; here ids of the one stand in what the other sends,
 * and every address of a file is tried.
 */
let owner: Person & { companyId: string };
let twin: Person & { companyId: string; jobId: string };
let own: Things;
let foreign: Things;
let files: { own: string[]; foreign: string[] };

beforeAll(async () => {
  owner = await firstAdministrator();
  const jobId = await newJob(owner);
  own = await things(owner, jobId, await onJob(owner, jobId, ["installer"]), await inCompany(owner, owner.companyId, ["designer"]));
  twin = await ofAnotherCompany();
  foreign = await things(twin, twin.jobId, await onJob(twin, twin.jobId, ["installer"]), await inCompany(twin, twin.companyId, ["designer"]));
  const filesOf = async (as: Person, { jobId: job, entryId, fileId }: Things, side: number) => [
    fileId, (await uploaded(as, `/api/jobs/${job}`, png(side, side), "site.png", "site photo")).id, (await uploaded(as, `/api/library/${entryId}`, png(side, side), "breaker.png", "picture")).id,
  ];
  // The same bytes on both sides: an object of the store that two companies share is still each one's own file.
  files = { own: await filesOf(owner, own, 64), foreign: await filesOf(twin, foreign, 64) };
});

const refused = (answer: Answer<Loose>) => {
  expect([404, 422]).toContain(answer.status);
  const text = JSON.stringify(answer.body);
  for (const word of ["Twin", "Southlight", twin.email]) expect(text).not.toContain(word);
};
/** The same thing with ids of one's own is taken: what was refused above was refused for the id alone. */
const taken = (answer: Answer<Loose>) => expect([200, 201]).toContain(answer.status);
const cited = (entry: Loose, source: unknown) => ({ ...entry.data, sources: { [Object.keys(entry.data.props)[0] ?? ""]: source } });
const send = (method: string, path: string, body: unknown) => request(method, path, { as: owner, body });

describe("every address of a file", () => {
  it.each(["", "?inline", "?width=320", "?width=1280"])("with %j is there for its own company and for no other, equal bytes or not", async (query) => {
    for (const [mine, theirs, as] of [[files.own, files.foreign, owner], [files.foreign, files.own, twin]] as const) {
      for (const id of mine) expect((await request("GET", `/api/files/${id}${query}`, { as })).status).toBe(200);
      for (const id of theirs) expect((await request("GET", `/api/files/${id}${query}`, { as })).status).toBe(404);
      for (const id of theirs) expect((await request("GET", `/api/files/${id}${query}`, { as, headers: { range: "bytes=0-9" } })).status).toBe(404);
    }
  });

  it("keeps a file when the other company asks for its removal", async () => {
    for (const id of files.foreign) {
      expect((await request("DELETE", `/api/files/${id}`, { as: owner })).status).toBe(404);
      expect((await request("GET", `/api/files/${id}`, { as: twin })).status).toBe(200);
    }
  });
});

describe("an id of the other company within what is sent", () => {
  it("makes no job in it and none under its authority", async () => {
    refused(await send("POST", "/api/jobs", jobBody(foreign.companyId)));
    refused(await send("POST", "/api/jobs", jobBody(own.companyId, { jurisdiction: { id: foreign.jurisdictionId } })));
    refused(await send("PATCH", `/api/jobs/${own.jobId}`, { jurisdictionId: foreign.jurisdictionId }));
    taken(await send("POST", "/api/jobs", jobBody(own.companyId, { jurisdiction: { id: own.jurisdictionId } })));
    taken(await send("PATCH", `/api/jobs/${own.jobId}`, { jurisdictionId: own.jurisdictionId }));
    expect((await request("GET", `/api/jobs/${own.jobId}`, { as: owner })).body.jurisdiction.id).not.toBe(foreign.jurisdictionId);
    expect((await request("GET", `/api/jobs?jurisdiction=${foreign.jurisdictionId}`, { as: owner })).body.jobs).toEqual([]);
  });

  it("makes and copies no authority", async () => {
    refused(await send("POST", "/api/jurisdictions", { companyId: foreign.companyId, name: "Intruder", editions: [{ edition: "2023", effectiveFrom: null, effectiveTo: null }] }));
    refused(await send("POST", "/api/jurisdictions", { companyId: own.companyId, copyOf: foreign.jurisdictionId, name: "Copied" }));
    taken(await send("POST", "/api/jurisdictions", { companyId: own.companyId, copyOf: own.jurisdictionId, name: "Own copy" }));
    expect(JSON.stringify((await request("GET", "/api/jurisdictions", { as: owner })).body)).not.toContain("Copied");
    expect(JSON.stringify((await request("GET", "/api/jurisdictions", { as: twin })).body)).not.toContain("Intruder");
  });

  it("changes nobody's roles through one's own company or job", async () => {
    for (const method of ["PATCH", "DELETE"]) {
      const body = method === "PATCH" ? { roles: ["administrator"] } : undefined;
      refused(await send(method, `/api/companies/${own.companyId}/people/${foreign.membershipId}`, body));
      refused(await send(method, `/api/jobs/${own.jobId}/members/${foreign.memberId}`, body));
      // The twin's own ids of the other sort fit no better.
      refused(await send(method, `/api/companies/${own.companyId}/people/${foreign.memberId}`, body));
    }
    refused(await send("PATCH", `/api/companies/${own.companyId}/people/${foreign.membershipId}`, { active: false }));
  });

  it("cites no datasheet in a library entry", async () => {
    const before = (await request("GET", `/api/library/${own.entryId}`, { as: owner })).body;
    const cite = (file: string) => send("PATCH", `/api/library/${own.entryId}`, { baseVersion: before.version, data: cited(before, { document: "Sheet", page: "1", file }) });
    for (const file of files.foreign) refused(await cite(file));
    expect((await request("GET", `/api/library/${own.entryId}`, { as: owner })).body.version).toBe(before.version);
    taken(await cite(files.own[2] ?? ""));
  });

  it("shows no photo in a site visit", async () => {
    const data = (file: string) => ({ ...emptyVisit(), photos: [{ id: "p1", file, what: "Meter", caption: "" }] });
    const visit = (file: string) => send("POST", `/api/jobs/${own.jobId}/visits`, { id: randomUUID(), visitedOn: "2026-11-30", byName: "", data: data(file) });
    const change = (file: string) => send("PATCH", `/api/visits/${own.visitId}`, { version: 1, data: data(file) });
    for (const answer of [await visit(foreign.fileId), await change(foreign.fileId)]) refused(answer);
    for (const answer of [await visit(own.fileId), await change(own.fileId)]) taken(answer);
    // An id that the other company's visit has is taken; nothing is told of it, and it stays as it was.
    const before = (await request("GET", `/api/visits/${foreign.visitId}`, { as: twin })).body;
    const answer = await send("POST", `/api/jobs/${own.jobId}/visits`, { id: foreign.visitId, visitedOn: "2026-11-29", byName: "Intruder", data: emptyVisit() });
    expect(answer.status).toBeGreaterThanOrEqual(400);
    expect(JSON.stringify(answer.body)).not.toContain("Test barn");
    expect((await request("GET", `/api/visits/${foreign.visitId}`, { as: twin })).body).toEqual(before);
  });

  it("tells nothing through a drawing that names its entry, its file or its save", async () => {
    for (const [as, id] of [[owner, own.entryId], [twin, foreign.entryId]] as const) {
      const entry = (await request("GET", `/api/library/${id}`, { as })).body;
      taken(await request("PATCH", `/api/library/${id}`, { as, body: { baseVersion: entry.version, data: cited(entry, { document: "A later sheet", page: "9" }) } }));
    }
    const entry = (await request("GET", `/api/library/${own.entryId}`, { as: owner })).body;
    const drawing = await drawingOf(owner, own.jobId);
    const placed = (id: string, from: string, file: string) => ({ op: "add" as const, path: `/equipment/${id}`, value: {
      ...equipment(entry.kind, id.toUpperCase()), library: { entry: from, version: 1 }, sources: { [Object.keys(entry.data.props)[0] ?? ""]: { document: "Sheet", page: "1", file } },
    } });
    taken(await save(owner, own.drawingId, drawing.sequence, [placed("lib-own", own.entryId, own.fileId), placed("lib-foreign", foreign.entryId, foreign.fileId)]));
    const { updates } = (await request("GET", `/api/jobs/${own.jobId}/library-updates`, { as: owner })).body;
    expect(updates.map((each: { equipment: string }) => each.equipment)).toEqual(["lib-own"]);
    expect((await request("GET", `/api/library/${foreign.entryId}/versions/1`, { as: owner })).status).toBe(404);
    expect((await request("GET", `/api/files/${foreign.fileId}`, { as: owner })).status).toBe(404);
    // A save is known by its id within its drawing alone.
    const saveId = randomUUID();
    const theirs = await drawingOf(twin, foreign.jobId);
    await save(twin, foreign.drawingId, theirs.sequence, [{ op: "add", path: "/equipment/ds-t", value: equipment("disconnect", "DS-T") }], { saveId });
    const now = await drawingOf(owner, own.jobId);
    const mine = await save(owner, own.drawingId, now.sequence, [{ op: "add", path: "/equipment/ds-o", value: equipment("disconnect", "DS-O") }], { saveId });
    expect(JSON.stringify(mine.body)).not.toContain("DS-T");
    expect(mine.body.sequence === undefined || mine.body.sequence === now.sequence + 1).toBe(true);
  });

  it("finds nothing in the records", async () => {
    for (const query of [`?person=${twin.id}`, `?q=${foreign.jobId}`, "?q=twin", "?q=southlight"]) {
      expect((await request("GET", `/api/companies/${own.companyId}/audit${query}`, { as: owner })).body.records).toEqual([]);
    }
  });
});
