import "server-only";
import type { Counts } from "@/lib/api";
import { RULE_SET_VERSION } from "@/lib/rules";
import { check } from "@/lib/rules/engine/run";
import type { Drawing, Revision } from "@/models";
import { database } from "./database";
import { checkOf } from "./sheetSets";

/** Counts of the draft's check for lists, kept until the drawing or the rule set changes. */
async function draftCounts(drawing: Drawing): Promise<Counts> {
  if (drawing.checkCounts && drawing.checkedSequence === drawing.sequence && drawing.checkedRuleSet === RULE_SET_VERSION) return drawing.checkCounts;
  const { counts } = check(drawing.document);
  // Not part of anyone's edit: `silent` leaves the time of the last change alone.
  await database().Drawing.update(
    { checkCounts: counts, checkedSequence: drawing.sequence, checkedRuleSet: RULE_SET_VERSION },
    { where: { id: drawing.id, sequence: drawing.sequence }, silent: true },
  );
  return counts;
}

/** Counts of a job's open redlines: with what was accepted in review, while the drawing is the one that was issued. */
export async function shownCounts(drawing: Drawing, latest: Pick<Revision, "id" | "state" | "sequence" | "ruleSet"> | null): Promise<Counts> {
  // A sealed revision that is not void is the drawing, whatever was done and undone since.
  const same = latest && latest.ruleSet === RULE_SET_VERSION && (latest.state === "sealed" || latest.sequence === drawing.sequence);
  const { FindingAcceptance, Revision } = database();
  const accepted = same ? await FindingAcceptance.findAll({ where: { revisionId: latest.id } }) : [];
  if (!same || accepted.length === 0) return draftCounts(drawing);
  const issued = await Revision.findByPk(latest.id, { attributes: ["id", "checkResult"], rejectOnEmpty: true });
  issued.acceptances = accepted;
  return checkOf(issued).counts;
}
