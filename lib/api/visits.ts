import { z } from "zod";
import { visitDataSchema } from "@/lib/diagram/siteVisit";
import type { VisitData } from "@/lib/diagram/siteVisit";
import { line } from "./text";

const content = {
  visitedOn: z.iso.date("is no date"),
  /** Who was there, by name; they need no account. */
  byName: line(80),
  data: visitDataSchema,
};
/** `id` is made by the client, so that a visit begun without a connection is stored once however often it is sent. */
export const visitInput = z.strictObject({ id: z.uuid(), ...content });
/** `version` is the one that was edited. What is left out stays. */
export const visitChange = z.strictObject({ version: z.number().int().min(1), ...z.object(content).partial().shape });
export type VisitInput = z.input<typeof visitInput>;
export type VisitChange = z.input<typeof visitChange>;

export interface VisitContent { visitedOn: string; byName: string; data: VisitData }
export interface VisitAnswer extends VisitContent {
  id: string; jobId: string; version: number; createdBy: string; createdAt: string; updatedBy: string; updatedAt: string;
  /** `take`: into the drawing. */
  may: { edit: boolean; take: boolean };
}
export interface VisitsAnswer { jobNumber: string; jobName: string; visits: VisitAnswer[]; may: VisitAnswer["may"] }
/** Members of the 409 answer `stale-version`, beside those of every problem. */
export interface StaleVisit { visit: VisitAnswer }
