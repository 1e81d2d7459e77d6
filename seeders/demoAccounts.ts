import type { Role } from "@/lib/policy";

/** People of the demo, all invented. Their password is printed at start, so they belong to a local installation only. */
export const DEMO_COMPANY = "Lanternfield Electric";
const PASSWORD = "plain-sight-demo";

export interface DemoAccount {
  email: string; name: string; password: string;
  /** What to say about the person where the accounts are printed. */
  role: string;
  /** Empty for somebody from outside, who is on single jobs alone. */
  companyRoles: Role[];
  jobRoles: Role[];
}

const person = (local: string, name: string, role: string, companyRoles: Role[], jobRoles: Role[]): DemoAccount => ({
  email: `${local}@example.test`, name, password: PASSWORD, role, companyRoles, jobRoles,
});

export const demoPeople = {
  designer: person("ines", "Ines Okafor-Lund", "designer", ["designer"], ["designer"]),
  licensee: person("tobias", "Tobias Wrenfield", "licensee, seals", [], ["licensee"]),
  clerk: person("denny", "Denny Aldous", "permit clerk", [], ["permit clerk"]),
  installer: person("kit", "Kit Hesseltine", "installer", ["installer"], ["installer"]),
  ownerBuilder: person("ansel", "Ansel Thorne", "owner-builder: designer and installer", [], ["designer", "installer"]),
  administrator: person("maren", "Maren Holloway", "administrator", ["administrator"], ["administrator"]),
} satisfies Record<string, DemoAccount>;

export const demoAccounts: readonly DemoAccount[] = Object.values(demoPeople);
