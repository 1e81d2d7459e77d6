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
  /** Left out: the next of the company's scheme. */
  number: filledLine(40).optional(),
  ...placeFields,
  /** An authority that is known, or a new one that is entered with the job. */
  jurisdiction: z.union([z.strictObject({ id: z.uuid() }), jurisdictionInput]),
  site: siteInput,
});
export type JobInput = z.input<typeof jobInput>;

export const OFFICE_STATUSES = ["open", "on hold", "closed"] as const;
export type OfficeStatus = (typeof OFFICE_STATUSES)[number];
const day = z.iso.date("takes a date such as 2027-12-31");
export const jobChange = z.strictObject({
  number: filledLine(40).optional(),
  dueOn: day.nullable().optional(),
  officeStatus: z.enum(OFFICE_STATUSES).optional(),
  /** The office's own fee: amount in cents, day of payment and number of the receipt. No money moves here. */
  permitFeeCents: z.number().int("takes whole cents").min(0, "cannot be below zero").max(100_000_000_00).nullable().optional(),
  permitFeePaidOn: day.nullable().optional(),
  permitReceipt: line(60).optional(),
  ...z.strictObject(placeFields).partial().shape,
  jurisdictionId: z.uuid().optional(),
  site: siteInput.partial().optional(),
});
export type JobChange = z.input<typeof jobChange>;

export const JOB_TABS = ["all", "mine", "draft", "review", "sealed"] as const;
export type JobTab = (typeof JOB_TABS)[number];
export const JOB_SORTS = ["changed", "number", "name", "due"] as const;
export const jobsQuery = z.strictObject({
  q: line(120).default(""), tab: z.enum(JOB_TABS).default("all"), sort: z.enum(JOB_SORTS).default("changed"),
  /** `late`: due before today. `soon`: due within two weeks, late ones included. */
  due: z.enum(["any", "late", "soon"]).default("any"),
  /** The day where the person is; without it the server's, which is UTC. */
  today: day.optional(),
  status: z.enum(["any", ...OFFICE_STATUSES]).default("any"),
  jurisdiction: z.uuid().optional(), archived: z.enum(["yes", "no"]).default("no"),
  limit: z.coerce.number().int().min(1).max(200).default(50), offset: z.coerce.number().int().min(0).max(1_000_000).default(0),
});
export type JobsQuery = z.output<typeof jobsQuery>;
export const duplicateInput = z.strictObject({ number: filledLine(40).optional(), name: filledLine(120), drawing: z.boolean().default(true), people: z.boolean().default(false) });
export type DuplicateInput = z.input<typeof duplicateInput>;
export const archiveInput = z.strictObject({ archived: z.boolean() });
export const historyQuery = z.strictObject({ before: z.coerce.number().int().min(1).optional(), limit: z.coerce.number().int().min(1).max(100).default(30) });
export interface HistoryAnswer { entries: HistoryLine[]; more: boolean }
export interface NextNumberAnswer { number: string; scheme: string }
/** Something that was done, in words. `id` orders the list and asks for what came before. */
export interface HistoryLine { id: number; at: string; by: string | null; what: string; detail: string | null }

export type Counts = CheckResult["counts"];
/** One line of the register. */
export interface JobLine {
  id: string; number: string; name: string; place: string; jurisdiction: string | null; permitNumber: string;
  dueOn: string | null; officeStatus: OfficeStatus; archived: boolean;
  /** Null counts are being worked out; ask again. */
  revision: string | null; state: JobState; counts: Counts | null; waitsFor: { mine: boolean; text: string } | null;
  roles: Role[]; edition: Edition; addressLines: string; parcel: string; licensees: string[]; changedAt: string;
}
export interface JobsAnswer { jobs: JobLine[]; total: number; tabs: Record<JobTab, number>; jurisdictions: { id: string; name: string }[] }
export interface RevisionLine {
  id: string; letter: string; issue: number; purpose: string; description: string; state: JobState;
  issuedBy: string; issuedAt: string; sealedBy: string | null; sealedAt: string | null; sealCode: string | null;
  returnComment: string | null; returnedBy: string | null; voidedAt: string | null; counts: Counts;
}
export interface JobMay { duplicate: boolean; archive: boolean; history: boolean; edit: boolean; manageMembers: boolean; viewDrawing: boolean; editDrawing: boolean; issue: boolean; seal: boolean }
export interface JobAnswer {
  id: string; companyId: string; companyName: string; number: string; name: string; addressLines: string; parcel: string; owner: string;
  scope: string; permitNumber: string; preparer: string; contractor: string; jurisdiction: JurisdictionAnswer | null; site: Site; roles: Role[];
  dueOn: string | null; officeStatus: OfficeStatus; archivedAt: string | null;
  permitFeeCents: number | null; permitFeePaidOn: string | null; permitReceipt: string;
  state: JobState; revision: string | null; nextLetter: string; counts: Counts | null; changedAt: string; may: JobMay;
  /** Nothing stands on the sheet yet. */
  empty: boolean;
}
