import "server-only";
import { z } from "zod";

export const jobParams = z.object({ jobId: z.uuid() });
export const memberParams = z.object({ jobId: z.uuid(), memberId: z.uuid() });
export const drawingParams = z.object({ drawingId: z.uuid() });
export const revisionParams = z.object({ revisionId: z.uuid() });
export const companyParams = z.object({ companyId: z.uuid() });
export const personParams = z.object({ companyId: z.uuid(), membershipId: z.uuid() });
export const sinceQuery = z.strictObject({ since: z.coerce.number().int().min(0) });
export const entryParams = z.object({ entryId: z.uuid() });
export const entryVersionParams = z.object({ entryId: z.uuid(), version: z.coerce.number().int().min(1).max(100_000) });
export const fileParams = z.object({ fileId: z.uuid() });
export const jurisdictionParams = z.object({ jurisdictionId: z.uuid() });
export const visitParams = z.object({ visitId: z.uuid() });
