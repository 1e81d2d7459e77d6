import { describe, expect, it } from "vitest";
import { JOB_ACTIONS, ROLES, may, mayInCompany, type JobAction, type Role } from "@/lib/policy";
import { REVISION_STATES, type RevisionState } from "@/lib/workflow";

/*
 * Who may do what, written out a second time from the product's description of its people: a designer draws and issues, a
 * licensee reviews and seals, a clerk sees sealed sets alone, an installer reads, an administrator looks after people and
 * job data.
 */
const A = "administrator", D = "designer", L = "licensee", I = "installer", C = "permit clerk";
const OFFICE: Role[] = [A, D, L, I];
const IN_REVIEW: RevisionState[] = ["in review"];
const SEALED: RevisionState[] = ["sealed", "superseded", "void"];
const EXPECTED: Record<JobAction, { roles: Role[]; states?: (role: Role) => readonly RevisionState[] }> = {
  "job.view": { roles: [A, D, L, I, C] },
  "job.edit": { roles: [A, D] },
  "members.view": { roles: OFFICE },
  "members.manage": { roles: [A] },
  "drawing.view": { roles: OFFICE },
  "drawing.edit": { roles: [D] },
  "revision.view": { roles: [A, D, L, I, C], states: (role) => (role === C ? SEALED : REVISION_STATES) },
  "revision.issue": { roles: [D] },
  "revision.return": { roles: [L], states: () => IN_REVIEW },
  "finding.accept": { roles: [L], states: () => IN_REVIEW },
  "revision.seal": { roles: [L], states: () => IN_REVIEW },
  "sheets.preview": { roles: OFFICE },
  "sheets.download": { roles: [A, D, L, I, C], states: () => SEALED },
  "files.view": { roles: OFFICE },
  "files.add": { roles: OFFICE },
  "files.remove": { roles: [A, D] },
  "visit.view": { roles: OFFICE },
  "visit.edit": { roles: [A, D, I] },
  "history.view": { roles: OFFICE },
  "job.duplicate": { roles: [A, D] },
  "job.archive": { roles: [A] },
};

describe("the policy table", () => {
  it.each(JOB_ACTIONS.flatMap((action) => ROLES.map((role) => [action, role] as const)))("%s by %s", (action, role) => {
    const { roles, states } = EXPECTED[action];
    for (const state of REVISION_STATES) {
      expect([state, may([role], action, state)]).toEqual([state, roles.includes(role) && (states?.(role) ?? REVISION_STATES).includes(state)]);
    }
  });

  it("gives a person with several roles what any of them may", () => {
    expect(may([D, I], "drawing.edit")).toBe(true);
    expect(may([C, I], "revision.view", "in review")).toBe(true);
    expect(may([], "job.view")).toBe(false);
  });

  it("refuses an action on a revision when no revision is named", () => {
    expect(may([L], "revision.seal")).toBe(false);
    expect(may([C], "sheets.download")).toBe(false);
  });

  it("lets administrators alone look after a company's people", () => {
    expect(ROLES.filter((role) => mayInCompany([role], "company.people"))).toEqual([A]);
    expect(ROLES.filter((role) => mayInCompany([role], "jobs.create"))).toEqual([A, D]);
    expect(ROLES.filter((role) => mayInCompany([role], "company.view"))).not.toContain(C);
    for (const action of ["company.settings", "audit.view"] as const) expect(ROLES.filter((role) => mayInCompany([role], action))).toEqual([A]);
    for (const action of ["library.edit", "jurisdictions.edit"] as const) expect(ROLES.filter((role) => mayInCompany([role], action))).toEqual([A, D]);
    for (const action of ["library.view", "jurisdictions.view"] as const) expect(ROLES.filter((role) => mayInCompany([role], action))).toEqual(OFFICE);
  });
});
