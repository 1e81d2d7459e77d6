import { randomUUID } from "node:crypto";
import { emptyVisit } from "@/lib/diagram/siteVisit";
import { drawingOf, place, save } from "./drawings";
import { uploaded } from "./files";
import type { Person } from "./people";
import { png } from "./png";
import { request } from "./server";

export type Things = Awaited<ReturnType<typeof things>>;

/** One of everything that has an address, by the names that routes give their ids. */
export async function things(as: Person & { companyId: string }, jobId: string, member: Person, ofCompany: Person) {
  const get = async (path: string) => (await request("GET", path, { as })).body;
  const { id: drawingId } = await drawingOf(as, jobId);
  await save(as, drawingId, 0, place("ds-1", "DS-1"));
  const issued = await request("POST", `/api/jobs/${jobId}/revisions`, { as, body: { purpose: "issued for permit" } });
  const made = await request("POST", "/api/jurisdictions", { as, body: { companyId: as.companyId, name: "Test barn township", editions: [{ edition: "2023", effectiveFrom: null, effectiveTo: null }] } });
  const visit = await request("POST", `/api/jobs/${jobId}/visits`, { as, body: { id: randomUUID(), visitedOn: "2026-11-30", byName: "Test barn visitor", data: emptyVisit() } });
  const isOf = (person: Person) => (each: { userId: string }) => each.userId === person.id;
  return {
    jobId, drawingId, revisionId: issued.body.id as string, companyId: as.companyId, version: "1", visitId: visit.body.id as string, jurisdictionId: made.body.id as string,
    entryId: (await get(`/api/companies/${as.companyId}/library`)).entries[0].id as string,
    fileId: (await uploaded(as, `/api/jobs/${jobId}`, png(80, 80), "meter.png")).id,
    memberId: (await get(`/api/jobs/${jobId}/members`)).members.find(isOf(member)).id as string,
    membershipId: (await get(`/api/companies/${as.companyId}/people`)).people.find(isOf(ofCompany)).id as string,
  };
}
