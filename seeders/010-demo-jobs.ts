import { readFile } from "node:fs/promises";
import path from "node:path";
import type { Drawing, Site } from "@/lib/diagram/schema";
import { seedCompany, seedJob, seedJurisdiction, seedLicense, seedPerson } from "@/lib/server/data/seeding";
import { DEMO_COMPANY, demoPeople } from "./demoAccounts";
import { cleanDrawing } from "./demo/cleanDrawing";
import { plantedDrawing } from "./demo/planted";

/** Amendments of the invented county ordinance 26-4. */
const AMENDMENTS: Site["amendments"] = {
  "oc-1": { rule: "ess-location-total", effect: "note", limit: null, unit: "", severity: null, citation: "County ordinance 26-4, OC-1 (storage in accessory buildings by the dwelling table)" },
  "oc-2": { rule: "string-over-building-cap", effect: "limit", limit: 600, unit: "V", severity: null, citation: "County ordinance 26-4, OC-2 (PV dc at most 600 V on or in any building)" },
};

/** The demo: one company, its people, one job drawn clean and the same as its owner first drew it. */
export async function up(): Promise<void> {
  const companyId = await seedCompany(DEMO_COMPANY);
  const people = await Promise.all(Object.values(demoPeople).map(async (each) => ({
    roles: each.jobRoles, actor: await seedPerson({ email: each.email, name: each.name, password: each.password, companyId, roles: each.companyRoles }),
  })));
  const actorOf = (email: string) => {
    const found = people.find((each) => each.actor.email === email);
    if (!found) throw new Error(`${email} was not seeded`);
    return found.actor;
  };
  await seedLicense(actorOf(demoPeople.licensee.email).id, {
    state: "State of the demonstration", number: "E-00000", title: "PE", expiresOn: "2027-12-31",
    sealGraphic: await readFile(path.join(import.meta.dirname, "demo/sealGraphic.png")),
  });
  const jurisdictionId = await seedJurisdiction({ name: "Orrin County", edition: "2023", ordinance: "county ordinance 26-4", amendments: AMENDMENTS });
  const members = people.map((each) => ({ userId: each.actor.id, roles: each.roles }));
  const author = actorOf(demoPeople.designer.email);
  const common = { companyId, jurisdictionId, author, members };
  // As the job page copies them, so that the demo's jobs and their county agree.
  const here = (drawing: Drawing): Drawing => ({ ...drawing, site: { ...drawing.site, amendments: AMENDMENTS } });
  const planted = here(plantedDrawing());
  const owners = { ...planted, sheet: { ...planted.sheet, titleBlock: { ...planted.sheet.titleBlock, jobNumber: "26-031P" } } };
  await seedJob({ ...common, number: "26-031P", name: "Teasel Hill Creamery, as drawn by the owner", drawing: owners });
  await seedJob({ ...common, number: "26-031", name: "Teasel Hill Creamery", drawing: here(cleanDrawing()) });
}
