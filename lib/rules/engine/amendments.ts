import type { Amendment } from "@/lib/diagram/schema";
import { rules } from "@/lib/rules";
import type { Limit, RuleMeta } from "./types";

/** An amended limit further from the rule's own than this is a slip of the pen or of the unit, not an ordinance. */
export const MOST_TIMES = 10;

const BY_ID = new Map(rules.map(({ meta }) => [meta.id, meta]));
export const ruleMeta = (id: string): RuleMeta | undefined => BY_ID.get(id);

export interface AmendmentFault { field: "rule" | "limitName" | "limit" | "unit" | "severity" | "citation"; message: string }

/** The limit that an amendment means: the one it names, or the only one there is. */
export function limitOf(meta: RuleMeta, limitName: string | undefined): { name: string; limit: Limit } | null {
  const names = Object.keys(meta.limits);
  const name = limitName ?? (names.length === 1 ? names[0] : undefined);
  const limit = name === undefined ? undefined : meta.limits[name];
  return name === undefined || limit === undefined ? null : { name, limit };
}

/**
 * What is wrong with an amendment against the rules as they are now; empty when nothing is. Messages go on from the name
 * of the field.
 */
export function amendmentFaults(amendment: Amendment): AmendmentFault[] {
  const meta = BY_ID.get(amendment.rule);
  if (!meta) return [{ field: "rule", message: `${amendment.rule || "(empty)"} is no rule of this rule set` }];
  const faults: AmendmentFault[] = [];
  if (amendment.citation.trim() === "") faults.push({ field: "citation", message: "is missing: an amendment is printed with the ordinance it rests on" });
  if (amendment.effect !== "severity" && amendment.severity !== null) faults.push({ field: "severity", message: "belongs to an amendment of the severity" });
  if (amendment.effect === "severity" && amendment.severity === null) faults.push({ field: "severity", message: "is missing" });
  if (amendment.effect === "limit") faults.push(...limitFaults(meta, amendment));
  else if (amendment.limit !== null || amendment.limitName !== undefined) faults.push({ field: "limit", message: "belongs to an amendment of a limit" });
  return faults;
}

function limitFaults(meta: RuleMeta, { limit, limitName, unit }: Amendment): AmendmentFault[] {
  const names = Object.keys(meta.limits);
  if (names.length === 0) return [{ field: "rule", message: "has no limit that can be amended: its figures stand in the code's tables" }];
  const meant = limitOf(meta, limitName);
  if (!meant) {
    return [{ field: "limitName", message: limitName === undefined ? `is missing: the rule has ${names.length} limits (${names.join(", ")})` : `is none of ${names.join(", ")}` }];
  }
  const faults: AmendmentFault[] = [];
  if (unit !== "" && unit !== meant.limit.unit) faults.push({ field: "unit", message: `is ${meant.limit.unit} for this limit` });
  if (limit === null) faults.push({ field: "limit", message: "is missing" });
  else if (!(limit >= 0)) faults.push({ field: "limit", message: "cannot be below 0" });
  else if (limit > meant.limit.value * MOST_TIMES) {
    faults.push({ field: "limit", message: `is more than ${MOST_TIMES} times the rule's own ${meant.limit.value} ${meant.limit.unit}; check value and unit` });
  }
  return faults;
}

/** As stored: with the name and the unit of the limit it means. The amendment must have no faults. */
export function wholeAmendment(amendment: Amendment): Amendment {
  const meta = BY_ID.get(amendment.rule);
  const meant = meta && amendment.effect === "limit" ? limitOf(meta, amendment.limitName) : null;
  return meant ? { ...amendment, limitName: meant.name, unit: meant.limit.unit } : amendment;
}
