import "server-only";
import { z } from "zod";

export const jobParams = z.object({ jobId: z.uuid() });
export const memberParams = z.object({ jobId: z.uuid(), memberId: z.uuid() });
export const drawingParams = z.object({ drawingId: z.uuid() });
export const revisionParams = z.object({ revisionId: z.uuid() });
export const companyParams = z.object({ companyId: z.uuid() });
export const personParams = z.object({ companyId: z.uuid(), membershipId: z.uuid() });
export const sinceQuery = z.strictObject({ since: z.coerce.number().int().min(0) });
