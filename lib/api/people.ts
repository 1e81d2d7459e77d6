import { z } from "zod";
import { ROLES, type Role } from "@/lib/policy";
import { schemeFault } from "@/lib/workflow/jobNumber";
import type { LicenseExpiry } from "@/lib/workflow/licenseExpiry";
import { emailAddress, filledLine, newPassword } from "./text";

export const roleList = z.array(z.enum(ROLES)).min(1, "need at least one choice").max(ROLES.length)
  .transform((roles) => ROLES.filter((role) => roles.includes(role)));

export const setupInput = z.strictObject({
  companyName: filledLine(120), name: filledLine(80), email: emailAddress, password: newPassword,
});
export type SetupInput = z.input<typeof setupInput>;

/** Name and password are asked for only where the address has no account yet. */
export const personInput = z.strictObject({
  email: emailAddress, roles: roleList, name: filledLine(80).optional(), password: newPassword.optional(),
});
export type PersonInput = z.input<typeof personInput>;
export const rolesInput = z.strictObject({ roles: roleList });
/** `active` false closes the account: its sessions end and nobody signs in with it until it is opened again. */
export const personChange = z.strictObject({ roles: roleList.optional(), active: z.boolean().optional() })
  .refine((change) => change.roles !== undefined || change.active !== undefined, { path: ["roles"], message: "are missing" });
export type PersonChange = z.input<typeof personChange>;

export const companyChange = z.strictObject({
  name: filledLine(120).optional(),
  jobNumberScheme: filledLine(40).superRefine((scheme, context) => {
    const fault = schemeFault(scheme);
    if (fault !== null) context.addIssue({ code: "custom", message: fault });
  }).optional(),
});
export type CompanyChange = z.input<typeof companyChange>;
export interface CompanyDetail { id: string; name: string; jobNumberScheme: string; createdAt: string; may: { settings: boolean } }

export const passwordInput = z.strictObject({ current: z.string().min(1, "is missing").max(200), next: newPassword });
export type PasswordInput = z.input<typeof passwordInput>;

export const licenseInput = z.strictObject({
  state: filledLine(60), number: filledLine(40), title: filledLine(80), expiresOn: z.iso.date("takes a date such as 2027-12-31"),
});
export type LicenseInput = z.input<typeof licenseInput>;
/** Largest seal graphic, bytes. */
export const SEAL_GRAPHIC_BYTES = 512 * 1024;
/** Largest side of a seal graphic, px: 2 in at 1,200 dots per inch. */
export const SEAL_GRAPHIC_SIDE_PX = 2400;

export interface PersonAnswer { id: string; userId: string; name: string; email: string; roles: Role[] }
export interface PersonLicense { state: string; number: string; title: string; expiresOn: string; expiry: LicenseExpiry }
/** Somebody of a company. `license` is there for whoever manages its people; null: none entered. */
export interface CompanyPerson extends PersonAnswer { active: boolean; license?: PersonLicense | null }
export interface LicenseAnswer {
  state: string; number: string; title: string; expiresOn: string;
  sealGraphic: { widthPx: number; heightPx: number } | null;
  expired: boolean;
  expiry: LicenseExpiry;
}
export interface CompanyAnswer { id: string; name: string; roles: Role[]; may: { people: boolean; createJobs: boolean; settings: boolean; records: boolean } }
export interface MeAnswer { id: string; name: string; email: string; companies: CompanyAnswer[]; office: boolean; counter: boolean; /** What has to be said about the end of the person's own license; null while nothing has. */ licenseWarning: LicenseExpiry | null }
