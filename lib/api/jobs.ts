import { z } from "zod";
import { EDITIONS, OCCUPANCIES, type Edition, type Site } from "@/lib/diagram/schema";
import type { Role } from "@/lib/policy";
import type { CheckResult } from "@/lib/rules/engine/types";
import type { JobState } from "@/lib/workflow";
import type { JurisdictionAnswer } from "./jurisdictions";
import { filledLine, line, paragraph } from "./text";

/** Site data as a form holds it; null means not known yet. */
export const siteInput = z.strictObject({
  edition: z.enum(EDITIONS),
  occupancy: z.enum(OCCUPANCIES).nullable(),
  recordLowC: z.number().min(-60).max(40).nullable(),
  designHighC: z.number().min(-10).max(60).nullable(),
  elevationM: z.number().min(-100).max(5000).nullable(),
  temperatureSource: line(160).nullable(),
  utilityName: line(80).nullable(),
  availableFaultCurrentA: z.number().min(0).max(200000).nullable(),
});
export type SiteInput = z.infer<typeof siteInput>;

const placeFields = {
  name: filledLine(120),
  addressLines: paragraph(240),
  parcel: line(60),
  owner: line(120),
  scope: paragraph(400),
  permitNumber: line(60),
  preparer: line(160),
  contractor: line(160),
};
export const jurisdictionInput = z.strictObject({ name: filledLine(120), edition: z.enum(EDITIONS), ordinance: line(160).default("") });

export const jobInput = z.strictObject({
  companyId: z.uuid(),
  number: filledLine(40),
  ...placeFields,
  /** An authority that is known, or a new one that is entered with the job. */
  jurisdiction: z.union([z.strictObject({ id: z.uuid() }), jurisdictionInput]),
  site: siteInput,
});
export type JobInput = z.input<typeof jobInput>;

export const jobChange = z.strictObject({
  number: filledLine(40).optional(),
  ...z.strictObject(placeFields).partial().shape,
  jurisdictionId: z.uuid().optional(),
  site: siteInput.partial().optional(),
});
export type JobChange = z.input<typeof jobChange>;

export type Counts = CheckResult["counts"];
/** One line of the register. */
export interface JobLine {
  id: string; number: string; name: string; place: string; jurisdiction: string | null; permitNumber: string;
  revision: string | null; state: JobState; counts: Counts | null; waitsFor: { mine: boolean; text: string } | null;
  roles: Role[]; edition: Edition; addressLines: string; parcel: string; licensees: string[]; changedAt: string;
}
export interface RevisionLine {
  id: string; letter: string; issue: number; purpose: string; description: string; state: JobState;
  issuedBy: string; issuedAt: string; sealedBy: string | null; sealedAt: string | null; sealCode: string | null;
  returnComment: string | null; returnedBy: string | null; voidedAt: string | null; counts: Counts;
}
export interface JobMay { edit: boolean; manageMembers: boolean; viewDrawing: boolean; editDrawing: boolean; issue: boolean; seal: boolean }
export interface JobAnswer {
  id: string; companyId: string; companyName: string; number: string; name: string; addressLines: string; parcel: string; owner: string;
  scope: string; permitNumber: string; preparer: string; contractor: string; jurisdiction: JurisdictionAnswer | null; site: Site; roles: Role[];
  state: JobState; revision: string | null; nextLetter: string; counts: Counts | null; changedAt: string; may: JobMay;
  /** Nothing stands on the sheet yet. */
  empty: boolean;
}
