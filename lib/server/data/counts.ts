import "server-only";
import type { Counts } from "@/lib/api";
import { RULE_SET_VERSION } from "@/lib/rules";
import { check } from "@/lib/rules/engine/run";
import type { Drawing, FindingAcceptance, Revision } from "@/models";
import { database } from "./database";
import { checkOf } from "./sheetSets";

/** What tells whether kept counts still hold, without the drawing itself. */
export interface CountedRow {
  id: string; drawingId: string; sequence: number; checkedSequence: number | null; checkedRuleSet: string | null; checkCounts: Counts | null;
  revisionId: string | null; state: string; revisionSequence: number | null; revisionRuleSet: string | null;
}
/** How long one list checks drawings before it answers, in ms; the rest is worked out after it, so that a list never waits for all. */
const AT_ONCE_MS = 30;
/** Rest after each check of the queue, in lengths of that check, so that requests find the core free most of the time. */
const REST = 8;
const MOST_FAILURES = 3;
/** Drawings in the queue, and how many failed in a row. */
const waiting = new Set<string>();
let failures = 0;

const holds = (row: Pick<CountedRow, "sequence" | "checkedSequence" | "checkedRuleSet" | "checkCounts">): Counts | null =>
  (row.checkCounts && row.checkedSequence === row.sequence && row.checkedRuleSet === RULE_SET_VERSION ? row.checkCounts : null);

/** Checks a draft and keeps its counts until the drawing or the rule set changes. */
async function work(drawing: Pick<Drawing, "id" | "sequence" | "document">): Promise<Counts> {
  const { counts } = check(drawing.document);
  // Not part of anyone's edit: `silent` leaves the time of the last change alone.
  await database().Drawing.update(
    { checkCounts: counts, checkedSequence: drawing.sequence, checkedRuleSet: RULE_SET_VERSION },
    { where: { id: drawing.id, sequence: drawing.sequence }, silent: true },
  );
  return counts;
}

/** A sealed revision that is not void is the drawing, whatever was done and undone since. */
const isIssued = (revision: { state: string; sequence: number; ruleSet: string }, sequence: number): boolean =>
  revision.ruleSet === RULE_SET_VERSION && (revision.state === "sealed" || revision.sequence === sequence);

async function acceptedCounts(revisionId: string, accepted: FindingAcceptance[]): Promise<Counts> {
  const issued = await database().Revision.findByPk(revisionId, { attributes: ["id", "checkResult"], rejectOnEmpty: true });
  issued.acceptances = accepted;
  return checkOf(issued).counts;
}

/** Counts of a job's open redlines: with what was accepted in review, while the drawing is the one that was issued. */
export async function shownCounts(drawing: Drawing, latest: Pick<Revision, "id" | "state" | "sequence" | "ruleSet"> | null): Promise<Counts> {
  const accepted = latest && isIssued(latest, drawing.sequence) ? await database().FindingAcceptance.findAll({ where: { revisionId: latest.id } }) : [];
  if (latest && accepted.length > 0) return acceptedCounts(latest.id, accepted);
  return holds(drawing) ?? work(drawing);
}

/** The same for the lines of a list, by drawing. What is not known yet is left out and worked out after the answer. */
export async function countsOfRows(rows: readonly CountedRow[]): Promise<Map<string, Counts>> {
  const { FindingAcceptance } = database();
  const found = new Map<string, Counts>();
  const issued = rows.filter((row) => row.revisionId !== null && isIssued({ state: row.state, sequence: row.revisionSequence ?? -1, ruleSet: row.revisionRuleSet ?? "" }, row.sequence));
  const accepted = issued.length === 0 ? [] : await FindingAcceptance.findAll({ where: { revisionId: issued.map((row) => row.revisionId as string) } });
  const unknown: string[] = [];
  for (const row of rows) {
    const own = accepted.filter((each) => each.revisionId === row.revisionId);
    const kept = own.length > 0 && row.revisionId ? await acceptedCounts(row.revisionId, own) : holds(row);
    if (kept) found.set(row.drawingId, kept);
    else unknown.push(row.drawingId);
  }
  const started = performance.now();
  let at = 0;
  // While the queue works, nothing is checked here: lists of many people would add up to what the queue avoids.
  while (at < unknown.length && waiting.size === 0 && performance.now() - started < AT_ONCE_MS) {
    const id = unknown[at++] as string;
    const counts = await countsOf(id).catch(told(id));
    if (counts) found.set(id, counts);
  }
  later(unknown.slice(at));
  return found;
}

async function countsOf(drawingId: string): Promise<Counts | null> {
  const drawing = await database().Drawing.findByPk(drawingId, { attributes: ["id", "sequence", "document", "checkedSequence", "checkedRuleSet", "checkCounts"] });
  return drawing && (holds(drawing) ?? work(drawing));
}

/** A drawing that cannot be checked must not take the list down with it. */
const told = (id: string) => (error: unknown): null => {
  console.error(`counts of drawing ${id}`, error);
  failures += 1;
  return null;
};

/** One after the other, with rests between. Where one failure follows another the queue is given up; the next list asks again. */
function later(ids: readonly string[]): void {
  const idle = waiting.size === 0;
  for (const id of ids) waiting.add(id);
  if (!idle || waiting.size === 0) return;
  failures = 0;
  const next = async (): Promise<void> => {
    const [id] = waiting;
    if (id === undefined) return;
    const began = performance.now();
    if (await countsOf(id).catch(told(id))) failures = 0;
    waiting.delete(id);
    if (failures >= MOST_FAILURES) waiting.clear();
    setTimeout(() => void next(), REST * (performance.now() - began)).unref();
  };
  setImmediate(() => void next());
}
