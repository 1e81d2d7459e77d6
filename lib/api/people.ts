import { z } from "zod";
import { ROLES, type Role } from "@/lib/policy";
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
export interface LicenseAnswer {
  state: string; number: string; title: string; expiresOn: string;
  sealGraphic: { widthPx: number; heightPx: number } | null;
  expired: boolean;
}
export interface CompanyAnswer { id: string; name: string; roles: Role[]; may: { people: boolean; createJobs: boolean; settings: boolean; records: boolean } }
export interface MeAnswer { id: string; name: string; email: string; companies: CompanyAnswer[]; office: boolean; counter: boolean }
