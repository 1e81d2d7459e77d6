import { beforeAll, describe, expect, it } from "vitest";
import { emptyVisit } from "@/lib/diagram/siteVisit";
import { place, save } from "./support/drawings";
import { uploadPath } from "./support/files";
import { png } from "./support/png";
import { firstAdministrator, inCompany, newJob, ofAnotherCompany, onJob, type Person } from "./support/people";
import { allRoutes, request, type Call } from "./support/server";
import { things, type Things } from "./support/things";

let owner: Person & { companyId: string };
let stranger: Person;
let twin: Person & { companyId: string; jobId: string };
let colleague: Person;
let people: Record<"licensee" | "installer" | "clerk", Person>;
/** One of everything that has an address, of the first company and of its twin. */
let ids: Things;
let twinIds: Things;

beforeAll(async () => {
  owner = await firstAdministrator();
  const jobId = await newJob(owner);
  const elsewhere = await newJob(owner);
  stranger = await onJob(owner, elsewhere, ["designer", "licensee", "installer", "permit clerk"], "Stranger");
  twin = await ofAnotherCompany();
  colleague = await inCompany(owner, owner.companyId, ["designer"]);
  people = {
    licensee: await onJob(owner, jobId, ["licensee"]), installer: await onJob(owner, jobId, ["installer"]), clerk: await onJob(owner, jobId, ["permit clerk"]),
  };
  ids = await things(owner, jobId, people.installer, colleague);
  twinIds = await things(twin, twin.jobId, await onJob(twin, twin.jobId, ["installer"]), await inCompany(twin, twin.companyId, ["designer"]));
});

/** An address with ids put in; one that is missing would make a test that proves nothing. */
const fill = (pattern: string, from: Things = ids) => pattern.replace(/\[(\w+)\]/g, (_, name: string) => {
  const id = from[name as keyof Things];
  if (!id) throw new Error(`nothing was made for [${name}]`);
  return id;
});

/** What the owner sends, and is answered well, on every route that belongs to something. */
const OWNED: Record<string, { body?: unknown; raw?: BodyInit; type?: string; query?: string; by?: "licensee" | "clerk"; status?: number; /** A designer of another of the company's jobs reads it too. */ shared?: true }> = {
  "GET /api/companies/[companyId]": {},
  "PATCH /api/companies/[companyId]": { body: { jobNumberScheme: "{yyyy}-{nnn}" } },
  "GET /api/companies/[companyId]/audit": {},
  "GET /api/companies/[companyId]/audit.csv": {},
  "GET /api/companies/[companyId]/people": {},
  "POST /api/companies/[companyId]/people": { body: { email: "new@example.test", name: "New", password: "long enough, really", roles: ["installer"] }, status: 201 },
  "PATCH /api/companies/[companyId]/people/[membershipId]": { body: { roles: ["designer", "installer"] } },
  "DELETE /api/companies/[companyId]/people/[membershipId]": { status: 204 },
  "GET /api/jobs/[jobId]": {},
  "PATCH /api/jobs/[jobId]": { body: { parcel: "07-1" } },
  "GET /api/jobs/[jobId]/history": {},
  "POST /api/jobs/[jobId]/duplicate": { body: { number: "COPY-1", name: "A copy" }, status: 201 },
  "POST /api/jobs/[jobId]/archive": { body: { archived: false } },
  "GET /api/companies/[companyId]/next-job-number": {},
  "GET /api/jobs/[jobId]/drawing": {},
  "GET /api/jobs/[jobId]/members": {},
  "POST /api/jobs/[jobId]/members": { body: { email: "other@example.test", name: "Other", password: "long enough, really", roles: ["installer"] }, status: 201 },
  "PATCH /api/jobs/[jobId]/members/[memberId]": { body: { roles: ["installer"] } },
  "DELETE /api/jobs/[jobId]/members/[memberId]": { status: 204 },
  "GET /api/jobs/[jobId]/jurisdiction-update": {},
  "POST /api/jobs/[jobId]/jurisdiction-update": { body: { version: 1 } },
  "GET /api/jurisdictions/[jurisdictionId]": {},
  "PATCH /api/jurisdictions/[jurisdictionId]": { body: { version: 1, notes: "Counter open on Tuesdays." } },
  "DELETE /api/jurisdictions/[jurisdictionId]": { status: 204 },
  "GET /api/jobs/[jobId]/revisions": {},
  "POST /api/jobs/[jobId]/revisions": { body: { purpose: "issued for permit" }, status: 409 },
  "GET /api/drawings/[drawingId]/patches": { query: "?since=0" },
  "POST /api/drawings/[drawingId]/patches": {
    body: { saveId: "7d444840-9dc0-11d1-b245-5ffdce74fad2", baseSequence: 1, patches: place("ds-9", "DS-9"), title: "Place" },
  },
  "GET /api/revisions/[revisionId]": {},
  "GET /api/revisions/[revisionId]/status": {},
  "GET /api/revisions/[revisionId]/sheets.pdf": { status: 409 },
  "POST /api/revisions/[revisionId]/accept": { body: { findingKey: "none", reason: "none" }, by: "licensee", status: 422 },
  "POST /api/revisions/[revisionId]/seal": { body: { password: "a password of the tests" }, by: "licensee", status: 409 },
  "POST /api/revisions/[revisionId]/return": { body: { comment: "Look again." }, by: "licensee" },
  "GET /api/counter/[jobId]": { by: "clerk" },
  "GET /api/companies/[companyId]/library": {},
  "POST /api/companies/[companyId]/library": { body: { kind: "breaker", name: "Own breaker", data: { props: { ratingA: 60 }, sources: {}, ports: {} } }, status: 201 },
  "POST /api/companies/[companyId]/library/import": { query: "?kind=breaker", raw: "Name,Poles\nFrom a table,2\n", type: "text/csv" },
  "GET /api/companies/[companyId]/library/template.csv": { query: "?kind=breaker&fill=yes" },
  "GET /api/library/[entryId]": {},
  "PATCH /api/library/[entryId]": { body: { baseVersion: 1, name: "Renamed entry" } },
  "GET /api/library/[entryId]/versions/[version]": {},
  "GET /api/jobs/[jobId]/library": { query: "?kind=breaker" },
  "GET /api/jobs/[jobId]/library-updates": {},
  "GET /api/jobs/[jobId]/files": {},
  "POST /api/jobs/[jobId]/files": { query: uploadPath("", "roof.png", "site photo").slice("/files".length), raw: new Uint8Array(png(90, 90)), type: "image/png", status: 201 },
  "GET /api/library/[entryId]/files": { shared: true },
  "POST /api/library/[entryId]/files": { query: uploadPath("", "breaker.png", "picture").slice("/files".length), raw: new Uint8Array(png(70, 70)), type: "image/png", status: 201 },
  "GET /api/files/[fileId]": {},
  "DELETE /api/files/[fileId]": { status: 204 },
  "GET /api/jobs/[jobId]/visits": {},
  "POST /api/jobs/[jobId]/visits": { body: { id: "5d0c0a1e-7c3d-4b58-8f0e-2a1b6c9d4e33", visitedOn: "2026-12-01", byName: "K. Fenner", data: emptyVisit() }, status: 201 },
  "GET /api/visits/[visitId]": {},
  "PATCH /api/visits/[visitId]": { body: { version: 1, byName: "K. Fenner" } },
};
/** Routes that answer each person about themselves, and the one for the first visitor. */
const OWN = [
  "GET /api/counter", "GET /api/jobs", "POST /api/jobs", "GET /api/jurisdictions", "POST /api/jurisdictions", "GET /api/me", "GET /api/me/license", "PUT /api/me/license",
  "GET /api/me/license/seal-graphic", "PUT /api/me/license/seal-graphic", "POST /api/me/password", "GET /api/setup", "POST /api/setup",
];
const call = (entry: (typeof OWNED)[string]): Call => ({
  ...(entry.body === undefined ? {} : { body: entry.body }), ...(entry.raw === undefined ? {} : { raw: entry.raw, headers: { "content-type": entry.type ?? "" } }),
});
const address = (route: string, entry: (typeof OWNED)[string], from: Things = ids) => `${fill(route.split(" ")[1] ?? "", from)}${entry.query ?? ""}`;
const idsOf = (route: string) => [...route.matchAll(/\[(\w+)\]/g)].map(([, name]) => name ?? "").filter((name) => name !== "version");
const method = (route: string) => route.split(" ")[0] ?? "";

describe("every route", () => {
  it("is in one of the two lists of this file", async () => {
    const listed = [...Object.keys(OWNED), ...OWN].sort();
    expect((await allRoutes()).map((route) => `${route.method} ${route.pattern}`).sort()).toEqual(listed);
  });

  it.each([...Object.keys(OWNED), ...OWN.filter((route) => !route.endsWith("/setup"))])("%s asks for a session", async (route) => {
    const entry = OWNED[route] ?? {};
    expect(await request(method(route), address(route, entry), call(entry))).toMatchObject({ status: 401, body: { code: "sign-in" } });
  });

  it.each(Object.keys(OWNED))("%s is not there for somebody who has every role in another company", async (route) => {
    const entry = OWNED[route] ?? {};
    const answer = await request(method(route), address(route, entry), { ...call(entry), as: twin });
    expect(answer).toMatchObject({ status: 404, body: { code: "not-found" } });
    expect(JSON.stringify(answer.body)).not.toContain("Test barn");
  });

  it.each(Object.keys(OWNED))("%s of the other company is not there for this one's administrator either", async (route) => {
    const entry = OWNED[route] ?? {};
    expect(await request(method(route), address(route, entry, twinIds), { ...call(entry), as: owner })).toMatchObject({ status: 404, body: { code: "not-found" } });
  });

  // Without it, the refusals above would be as true of things that are nowhere.
  it.each(Object.keys(OWNED).filter((route) => method(route) === "GET"))("%s of the other company is there for its own", async (route) => {
    const entry = OWNED[route] ?? {};
    expect((await request("GET", address(route, entry, twinIds), { ...call(entry), as: twin })).status).toBe(entry.status ?? 200);
  });

  it.each(Object.keys(OWNED).filter((route) => idsOf(route).length > 1))("%s takes no part of the other company within one's own, nor the other way round", async (route) => {
    const entry = OWNED[route] ?? {};
    for (const foreign of idsOf(route)) {
      const mixed = { ...ids, [foreign]: twinIds[foreign as keyof Things] };
      for (const as of [owner, twin]) expect(await request(method(route), address(route, entry, mixed), { ...call(entry), as })).toMatchObject({ status: 404, body: { code: "not-found" } });
    }
  });

  it.each([...Object.keys(OWNED), ...OWN].filter((route) => method(route) === "GET"))("%s holds nothing of the other company", async (route) => {
    const entry = OWNED[route] ?? {};
    const answer = await request("GET", address(route, entry), { ...call(entry), as: owner });
    const text = answer.bytes.toString("latin1");
    for (const foreign of [...Object.values(twinIds).filter((id) => id.length > 8), twin.email, "Twin barn", "Southlight"]) expect(text).not.toContain(foreign);
  });

  it.each(Object.keys(OWNED).filter((route) => !OWNED[route]?.shared))("%s is not there for a stranger, whatever their roles elsewhere", async (route) => {
    const entry = OWNED[route] ?? {};
    const answer = await request(method(route), address(route, entry), { ...call(entry), as: stranger });
    expect(answer).toMatchObject({ status: 404, body: { code: "not-found" } });
    expect(JSON.stringify(answer.body)).not.toContain("Test barn");
  });

  it.each(Object.keys(OWNED).filter((route) => method(route) !== "GET"))("%s refuses a request from another site", async (route) => {
    const entry = OWNED[route] ?? {};
    for (const origin of ["https://elsewhere.example", null]) {
      expect(await request(method(route), address(route, entry), { ...call(entry), as: owner, origin })).toMatchObject({ status: 403, body: { code: "not-allowed" } });
    }
  });

  it.each(Object.entries(OWNED))("%s answers whom it belongs to", async (route, entry) => {
    const answer = await request(method(route), address(route, entry), { ...call(entry), as: entry.by ? people[entry.by] : owner });
    expect([answer.status, answer.body?.code ?? ""]).toEqual([entry.status ?? 200, expect.any(String)]);
    expect(answer.headers.get("x-request-id")).toMatch(/^[0-9a-f-]{36}$/);
  });

  it.each(Object.keys(OWNED).filter((route) => route.includes("[jobId]")))("%s answers a made-up id as it answers a stranger", async (route) => {
    const entry = OWNED[route] ?? {};
    for (const id of ["00000000-0000-4000-8000-000000000000", "1", "..%2F.."]) {
      const place = (route.split(" ")[1] ?? "").replace("[jobId]", id).replace("[memberId]", ids.memberId);
      expect((await request(method(route), `${place}${entry.query ?? ""}`, { ...call(entry), as: owner })).status).toBe(404);
    }
  });
});

describe("somebody of the company who is not on the job", () => {
  it("does not see it, and an administrator of the company does", async () => {
    const other = await inCompany(owner, owner.companyId, ["designer", "installer"]);
    const administrator = await inCompany(owner, owner.companyId, ["administrator"]);
    expect((await request("GET", `/api/jobs/${ids.jobId}`, { as: other })).status).toBe(404);
    expect((await request("GET", "/api/jobs", { as: other })).body.jobs).toEqual([]);
    expect((await request("GET", `/api/jobs/${ids.jobId}`, { as: administrator })).status).toBe(200);
    expect((await request("GET", "/api/jobs", { as: administrator })).body.jobs.map((job: { id: string }) => job.id)).toContain(ids.jobId);
  });
});

describe("roles on a job", () => {
  it("let an installer read the drawing and nothing be changed by them", async () => {
    const { installer } = { installer: await onJob(owner, ids.jobId, ["installer"]) };
    const drawing = await request("GET", `/api/jobs/${ids.jobId}/drawing`, { as: installer });
    expect(drawing.body.may).toEqual({ edit: false, issue: false, seal: false });
    expect(await save(installer, ids.drawingId, drawing.body.sequence, place("mine", "M"))).toMatchObject({ status: 403, body: { code: "not-allowed" } });
    expect((await request("PATCH", `/api/jobs/${ids.jobId}`, { as: installer, body: { parcel: "x" } })).status).toBe(403);
    expect((await request("POST", `/api/jobs/${ids.jobId}/revisions`, { as: installer, body: { purpose: "issued for permit" } })).status).toBe(403);
  });

  it("keep a designer from reviewing and a licensee from drawing", async () => {
    for (const step of ["return", "accept", "seal"]) {
      const body = { return: { comment: "x" }, accept: { findingKey: "x", reason: "x" }, seal: { password: "x" } }[step];
      expect((await request("POST", `/api/revisions/${ids.revisionId}/${step}`, { as: owner, body })).status).toBe(403);
    }
    expect((await save(people.licensee, ids.drawingId, 2, place("mine", "M"))).status).toBe(403);
  });

  it("hide from a clerk what is not sealed: drawing, members, revisions and preview", async () => {
    const as = people.clerk;
    expect((await request("GET", `/api/jobs/${ids.jobId}/drawing`, { as })).status).toBe(403);
    expect((await request("GET", `/api/jobs/${ids.jobId}/members`, { as })).status).toBe(403);
    expect((await request("GET", `/api/jobs/${ids.jobId}/revisions`, { as })).body).toEqual({ revisions: [] });
    for (const part of ["", "/status", "/sheets.pdf"]) expect((await request("GET", `/api/revisions/${ids.revisionId}${part}`, { as })).status).toBe(404);
    expect((await request("GET", `/api/counter/${ids.jobId}`, { as })).body).toMatchObject({ revisions: [], addressLines: "", parcel: "" });
    expect((await request("GET", "/api/jobs", { as })).body.jobs).toEqual([]);
  });

  it("cannot be given to oneself", async () => {
    const members = await request("GET", `/api/jobs/${ids.jobId}/members`, { as: people.licensee });
    const own = members.body.members.find((each: { userId: string }) => each.userId === people.licensee.id);
    expect((await request("PATCH", `/api/jobs/${ids.jobId}/members/${own.id}`, { as: people.licensee, body: { roles: ["designer"] } })).status).toBe(403);
    expect((await request("POST", `/api/jobs/${ids.jobId}/members`, { as: people.licensee, body: { email: people.licensee.email, roles: ["designer"] } })).status).toBe(403);
  });

  it("never leave a job or a company without an administrator", async () => {
    const members = await request("GET", `/api/jobs/${ids.jobId}/members`, { as: owner });
    const own = members.body.members.find((each: { userId: string }) => each.userId === owner.id);
    expect(await request("DELETE", `/api/jobs/${ids.jobId}/members/${own.id}`, { as: owner })).toMatchObject({ status: 409, body: { code: "last-administrator" } });
    expect((await request("PATCH", `/api/jobs/${ids.jobId}/members/${own.id}`, { as: owner, body: { roles: ["designer"] } })).body.code).toBe("last-administrator");
  });
});
