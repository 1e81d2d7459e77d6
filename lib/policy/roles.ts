/** What a person may be in a company or in one job; several at once are allowed. */
export const ROLES = ["administrator", "designer", "licensee", "installer", "permit clerk"] as const;
export type Role = (typeof ROLES)[number];

/** One line for the place where a role is handed out. */
export const ROLE_HELP: Readonly<Record<Role, string>> = {
  administrator: "Adds people, hands out roles, edits the job's data",
  designer: "Draws, clears redlines, issues revisions",
  licensee: "Reviews, accepts findings in writing, seals",
  installer: "Reads the drawing and the sheets, builds from them",
  "permit clerk": "Sees and downloads sealed sets, nothing else",
};
