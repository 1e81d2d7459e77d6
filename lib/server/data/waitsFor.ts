import "server-only";
import type { Counts, JobLine } from "@/lib/api";
import type { Role } from "@/lib/policy";
import type { Revision } from "@/models";

interface Question {
  roles: readonly Role[];
  revision: Pick<Revision, "state"> | null;
  /** Null while they are being worked out. */
  counts: Counts | null;
  licensees: readonly { id: string; name: string }[];
  userId: string;
}

/** Whom a job waits for, in words of the register; `mine` where it is the person who asks. */
export function waitsFor({ roles, revision, counts, licensees, userId }: Question): JobLine["waitsFor"] {
  const designer = roles.includes("designer");
  switch (revision?.state) {
    case "in review": {
      const mine = licensees.some((each) => each.id === userId);
      if (mine) return { mine, text: "You: review" };
      return { mine, text: licensees.length > 0 ? licensees.map((each) => each.name).join(", ") : "A licensee, none is on the job" };
    }
    case "sealing":
      return { mine: false, text: "The sheets are being drawn" };
    case "sealed":
      return null;
    case "returned":
      return { mine: designer, text: designer ? "You: comments of the review" : "The designer" };
    case "void":
      return { mine: designer, text: designer ? "You: issue the change" : "The designer, changed after the seal" };
    default: {
      const open = !counts ? "checking" : counts.mustFix > 0 ? `${counts.mustFix} must-fix` : counts.needsData > 0 ? `${counts.needsData} needs data` : "issue for review";
      return { mine: designer, text: designer ? `You: ${open}` : "The designer" };
    }
  }
}
