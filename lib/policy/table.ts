import type { RevisionState } from "@/lib/workflow/revision";
import type { Role } from "./roles";

/** Everything a person can do in one job. */
export const JOB_ACTIONS = [
  "job.view", "job.edit", "members.view", "members.manage",
  "drawing.view", "drawing.edit",
  "revision.view", "revision.issue", "revision.return", "finding.accept", "revision.seal",
  "sheets.preview", "sheets.download",
  "files.view", "files.add", "files.remove", "visit.view", "visit.edit", "history.view", "job.duplicate", "job.archive",
] as const;
export type JobAction = (typeof JOB_ACTIONS)[number];

/** Everything a person can do in a company outside of its jobs. */
export const COMPANY_ACTIONS = [
  "company.view", "company.people", "company.settings", "jobs.create", "jurisdictions.view", "jurisdictions.edit", "library.view", "library.edit", "audit.view",
] as const;
export type CompanyAction = (typeof COMPANY_ACTIONS)[number];

const OFFICE: readonly Role[] = ["administrator", "designer", "licensee", "installer"];
const ALL: readonly Role[] = [...OFFICE, "permit clerk"];
const SEALED: readonly RevisionState[] = ["sealed", "superseded", "void"];

interface Grant {
  roles: readonly Role[];
  /** States of the revision in which it is allowed; left out where no revision is meant. */
  states?: Partial<Record<Role, readonly RevisionState[]>>;
}

/** Role × action × state. What is not in here is not allowed. */
export const POLICY: Readonly<Record<JobAction, Grant>> = {
  "job.view": { roles: ALL },
  "job.edit": { roles: ["administrator", "designer"] },
  "members.view": { roles: OFFICE },
  "members.manage": { roles: ["administrator"] },
  "drawing.view": { roles: OFFICE },
  "drawing.edit": { roles: ["designer"] },
  // A clerk never learns of a revision that is not sealed.
  "revision.view": { roles: ALL, states: { "permit clerk": SEALED } },
  "revision.issue": { roles: ["designer"] },
  "revision.return": { roles: ["licensee"], states: { licensee: ["in review"] } },
  "finding.accept": { roles: ["licensee"], states: { licensee: ["in review"] } },
  "revision.seal": { roles: ["licensee"], states: { licensee: ["in review"] } },
  "sheets.preview": { roles: OFFICE },
  "files.view": { roles: OFFICE },
  "files.add": { roles: OFFICE },
  "files.remove": { roles: ["administrator", "designer"] },
  "visit.view": { roles: OFFICE },
  "visit.edit": { roles: ["administrator", "designer", "installer"] },
  "history.view": { roles: OFFICE },
  "job.duplicate": { roles: ["administrator", "designer"] },
  "job.archive": { roles: ["administrator"] },
  "sheets.download": { roles: ALL, states: { administrator: SEALED, designer: SEALED, licensee: SEALED, installer: SEALED, "permit clerk": SEALED } },
};

const COMPANY_POLICY: Readonly<Record<CompanyAction, readonly Role[]>> = {
  "company.view": OFFICE,
  "company.people": ["administrator"],
  "company.settings": ["administrator"],
  "audit.view": ["administrator"],
  "jobs.create": ["administrator", "designer"],
  "jurisdictions.view": OFFICE,
  "jurisdictions.edit": ["administrator", "designer"],
  "library.view": OFFICE,
  "library.edit": ["administrator", "designer"],
};

/**
 * Whether a person with these roles in the job may do it.
 * @param state state of the revision in question; an action on a revision without it is refused where states matter
 */
export function may(roles: readonly Role[], action: JobAction, state?: RevisionState): boolean {
  const grant = POLICY[action];
  return roles.some((role) => {
    if (!grant.roles.includes(role)) return false;
    const states = grant.states?.[role];
    return states === undefined || (state !== undefined && states.includes(state));
  });
}

/** Whether a person with these roles in the company may do it. */
export function mayInCompany(roles: readonly Role[], action: CompanyAction): boolean {
  return roles.some((role) => COMPANY_POLICY[action].includes(role));
}
