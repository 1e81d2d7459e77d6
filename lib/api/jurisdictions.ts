import { z } from "zod";
import { adoptionFaults, type Adoption } from "@/lib/code/adoption";
import type { LocalChange } from "@/lib/diagram/jurisdiction";
import { EDITIONS, SHEET_SIZES, amendmentSchema, idSchema, requirementsSchema, type Edition, type Requirements, type Site } from "@/lib/diagram/schema";
import type { Finding } from "@/lib/rules/engine/types";
import { templateFault } from "@/lib/sheets/fileName";
import { SIGNERS, type Signer } from "@/lib/workflow";
import { filledLine, line, paragraph } from "./text";

const day = z.iso.date("is no date").nullable();
export const adoptionsInput = z.array(z.strictObject({ edition: z.enum(EDITIONS), effectiveFrom: day, effectiveTo: day })).min(1, "needs at least one edition").max(8)
  .superRefine((adoptions, context) => {
    for (const { index, field, message } of adoptionFaults(adoptions)) context.addIssue({ code: "custom", path: [index, field], message });
  });

export const SPLITS = ["one file", "one file a sheet"] as const;
export const STAMP_PLACES = ["right", "bottom", "upper right corner", "lower right corner"] as const;
const inches = (most: number) => z.number().min(0.05, "must be at least 0.05 in").max(most, `must be at most ${most} in`);
/** How an authority wants the set. Null: it says nothing of it. */
export const exportProfileInput = z.strictObject({
  sheetSize: z.enum(SHEET_SIZES),
  leastLetteringIn: inches(1).nullable(),
  maximumBytes: z.number().int().min(100_000, "must be at least 0.1 MB").max(10_000_000_000, "must be at most 10,000 MB").nullable(),
  fileNameTemplate: line(120),
  split: z.enum(SPLITS),
  bookmarks: z.boolean(),
  stampStrip: z.strictObject({ where: z.enum(STAMP_PLACES), widthIn: inches(24), heightIn: inches(34) }).nullable(),
  cutSheets: z.enum(["yes", "no"]).nullable(),
}).superRefine((profile, context) => {
  const fault = templateFault(profile.fileNameTemplate, profile.split);
  if (fault) context.addIssue({ code: "custom", path: ["fileNameTemplate"], message: fault });
});
export type ExportProfile = z.infer<typeof exportProfileInput>;

/** A page of the authority. Only what a browser opens as a page, so that a link cannot run anything. */
const web = line(200).refine((text) => text === "" || (URL.canParse(text) && /^https?:$/.test(new URL(text).protocol)), "is no web address; write it with https://");
export const contactInput = z.strictObject({ name: filledLine(80), role: line(80), email: z.union([z.literal(""), z.email("is no mail address").max(254)]), phone: line(40), web });
export type Contact = z.infer<typeof contactInput>;

export const jurisdictionFacts = z.strictObject({
  name: filledLine(120),
  ordinance: line(160),
  editions: adoptionsInput,
  signs: z.enum(SIGNERS),
  /** Rules and limits are checked against the rule set on the server. */
  amendments: z.record(idSchema, amendmentSchema).refine((all) => Object.keys(all).length <= 200, "are more than 200"),
  requirements: requirementsSchema,
  exportProfile: exportProfileInput,
  contacts: z.array(contactInput).max(20, "are more than 20"),
  notes: paragraph(4000),
});
export type JurisdictionFacts = z.infer<typeof jurisdictionFacts>;
/** A jurisdiction of a company's own: entered anew, or begun as a copy of one it can see. */
export const jurisdictionMake = z.union([
  z.strictObject({ companyId: z.uuid(), copyOf: z.uuid(), name: filledLine(120).optional() }),
  z.strictObject({ companyId: z.uuid(), ...jurisdictionFacts.partial().shape, name: jurisdictionFacts.shape.name, editions: jurisdictionFacts.shape.editions }),
]);
export type JurisdictionMake = z.input<typeof jurisdictionMake>;
/** `version` is the one that was edited. */
export const jurisdictionChange = z.strictObject({ version: z.number().int().min(1), ...jurisdictionFacts.partial().shape });
export type JurisdictionChange = z.input<typeof jurisdictionChange>;

/** What whoever draws a job needs of its jurisdiction. `edition` is the one in force today. */
export interface JurisdictionAnswer {
  id: string; companyId: string | null; name: string; edition: Edition; editions: Adoption[]; ordinance: string; amendments: Site["amendments"]; signs: Signer;
  version: number; shared: boolean;
}
export interface JurisdictionDetail extends JurisdictionAnswer {
  requirements: Requirements; exportProfile: ExportProfile; contacts: Contact[]; notes: string; changedAt: string; changedBy: string | null;
  /** Jobs of the person's companies that use it. */
  jobs: number;
  may: { edit: boolean; copyTo: { id: string; name: string }[] };
}

/** A finding that comes, goes or changes when a jurisdiction is taken over. */
export type UpdateFinding = Pick<Finding, "key" | "rule" | "severity" | "kind" | "message" | "citation">;
export interface JurisdictionUpdate {
  jurisdiction: { id: string; name: string; version: number } | null;
  changes: LocalChange[];
  findings: { added: UpdateFinding[]; removed: UpdateFinding[]; changed: { was: UpdateFinding; now: UpdateFinding }[] };
  may: { take: boolean };
}
/** `edition: "keep"` leaves the edition a job was begun under, where only the rest is wanted. */
export const updateQuery = z.strictObject({ edition: z.enum(["take", "keep"]).default("take") });
export const updateInput = z.strictObject({ version: z.number().int().min(1), edition: z.enum(["take", "keep"]).default("take") });
export type UpdateInput = z.input<typeof updateInput>;
