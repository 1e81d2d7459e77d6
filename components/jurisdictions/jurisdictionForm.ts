import { set, type FieldErrors, type Resolver } from "react-hook-form";
import { jurisdictionFacts, type Contact, type ExportProfile, type JurisdictionDetail, type JurisdictionFacts } from "@/lib/api";
import type { Edition, Requirements } from "@/lib/diagram/schema";
import { amendmentFaults, limitOf, ruleMeta } from "@/lib/rules/engine/amendments";
import type { Signer } from "@/lib/workflow";

type Typed<Value> = Value extends number | null ? string : Value;
type YesNo = "yes" | "no" | "";
export interface AmendmentForm { key: string; rule: string; effect: "off" | "limit" | "severity" | "note"; limitName: string; limit: string; severity: "must-fix" | "should-fix" | "advice" | ""; citation: string }
/** A jurisdiction as its form holds it: numbers as typed, empty where the authority says nothing. */
export interface Form {
  name: string; ordinance: string; notes: string; signs: Signer;
  editions: { edition: Edition; effectiveFrom: string; effectiveTo: string }[];
  amendments: AmendmentForm[];
  requirements: { lockableVisibleSwitch: YesNo; separateMeter: YesNo; notes: string };
  exportProfile: {
    sheetSize: ExportProfile["sheetSize"]; leastLetteringIn: string;
    /** In megabytes. */
    maximumBytes: string;
    fileNameTemplate: string; split: ExportProfile["split"]; bookmarks: "yes" | "no"; stampStrip: { where: NonNullable<ExportProfile["stampStrip"]>["where"] | ""; widthIn: string; heightIn: string }; cutSheets: YesNo;
  };
  contacts: Contact[];
}

const MEGABYTE = 1_000_000;
const typed = (value: number | null): Typed<number | null> => (value === null ? "" : String(value));
/** Empty is not said; what is no number is caught by the check that follows. */
const number = (text: string): number | null => (text.trim() === "" ? null : Number(text.trim().replace(/,(?=\d{3}\b)/g, "")));
const said = <Value extends string>(value: Value | ""): Value | null => (value === "" ? null : value);

export function formOf(answer: JurisdictionDetail): Form {
  const { exportProfile: profile, requirements } = answer;
  return {
    name: answer.name, ordinance: answer.ordinance, notes: answer.notes, signs: answer.signs,
    editions: answer.editions.map((each) => ({ edition: each.edition, effectiveFrom: each.effectiveFrom ?? "", effectiveTo: each.effectiveTo ?? "" })),
    amendments: Object.entries(answer.amendments).map(([key, each]) => ({
      key, rule: each.rule, effect: each.effect, limitName: each.limitName ?? "", limit: typed(each.limit), severity: each.severity ?? "", citation: each.citation,
    })),
    requirements: { lockableVisibleSwitch: requirements.lockableVisibleSwitch ?? "", separateMeter: requirements.separateMeter ?? "", notes: requirements.notes },
    exportProfile: {
      sheetSize: profile.sheetSize, leastLetteringIn: typed(profile.leastLetteringIn), maximumBytes: typed(profile.maximumBytes === null ? null : profile.maximumBytes / MEGABYTE),
      fileNameTemplate: profile.fileNameTemplate, split: profile.split, bookmarks: profile.bookmarks ? "yes" : "no", cutSheets: profile.cutSheets ?? "",
      stampStrip: { where: profile.stampStrip?.where ?? "", widthIn: typed(profile.stampStrip?.widthIn ?? null), heightIn: typed(profile.stampStrip?.heightIn ?? null) },
    },
    contacts: answer.contacts,
  };
}

/**
 * What the form yields, not yet checked. An amendment as it came keeps what only older ones have: a limit without a name.
 * @param before the jurisdiction as it was loaded
 */
export function factsOf(form: Form, before: JurisdictionDetail): JurisdictionFacts {
  const { exportProfile: profile, requirements: asked } = form;
  const requirements: Requirements = { lockableVisibleSwitch: said(asked.lockableVisibleSwitch), separateMeter: said(asked.separateMeter), notes: asked.notes.trim() };
  const untouched = formOf(before).amendments;
  return {
    name: form.name, ordinance: form.ordinance, notes: form.notes, signs: form.signs, contacts: form.contacts, requirements,
    editions: form.editions.map((each) => ({ edition: each.edition, effectiveFrom: each.effectiveFrom || null, effectiveTo: each.effectiveTo || null })),
    amendments: Object.fromEntries(form.amendments.map((each) => {
      const kept = untouched.find((one) => one.key === each.key);
      const was = before.amendments[each.key];
      return [each.key, was && kept && JSON.stringify(kept) === JSON.stringify({ ...kept, ...each }) ? was : amendmentOf(each)];
    })),
    exportProfile: {
      sheetSize: profile.sheetSize, leastLetteringIn: number(profile.leastLetteringIn), maximumBytes: megabytes(profile.maximumBytes), fileNameTemplate: profile.fileNameTemplate,
      split: profile.split, bookmarks: profile.bookmarks === "yes", cutSheets: said(profile.cutSheets),
      stampStrip: profile.stampStrip.where === "" ? null : { where: profile.stampStrip.where, widthIn: number(profile.stampStrip.widthIn) ?? Number.NaN, heightIn: number(profile.stampStrip.heightIn) ?? Number.NaN },
    },
  };
}

const megabytes = (text: string): number | null => {
  const value = number(text);
  return value === null ? null : Math.round(value * MEGABYTE);
};

function amendmentOf(form: AmendmentForm): JurisdictionFacts["amendments"][string] {
  const { rule, effect, citation } = form;
  const meta = ruleMeta(rule);
  const meant = effect === "limit" && meta ? limitOf(meta, form.limitName || undefined) : null;
  return {
    rule, effect, citation, limit: effect === "limit" ? number(form.limit) : null, severity: effect === "severity" ? said(form.severity) : null, unit: meant?.limit.unit ?? "",
    ...(effect === "limit" && form.limitName !== "" ? { limitName: form.limitName } : {}),
  };
}

/** Checks the form as the server will. Faults stand at the field they belong to. */
export const resolverFor = (before: JurisdictionDetail): Resolver<Form, unknown, JurisdictionFacts> => (form) => {
  const facts = factsOf(form, before);
  const errors: FieldErrors<Form> = {};
  const fault = (path: readonly PropertyKey[], message: string) => set(errors, formPath(form, path), { type: "value", message });
  const parsed = jurisdictionFacts.safeParse(facts);
  for (const issue of parsed.error?.issues ?? []) fault(issue.path, issue.code === "invalid_type" ? "is not a number" : issue.message);
  for (const [id, amendment] of Object.entries(facts.amendments)) {
    if (amendment === before.amendments[id]) continue;
    for (const { field, message } of amendmentFaults(amendment)) fault(["amendments", id, field], message);
  }
  return parsed.success && Object.keys(errors).length === 0 ? { values: parsed.data, errors: {} } : { values: {}, errors };
};

/** Place in the form of a place in what is sent: amendments go by their id there and by their order here. */
export function formPath(form: Form, path: readonly PropertyKey[]): string {
  const [first, second, ...rest] = path.map(String);
  if (first !== "amendments" || second === undefined) return path.map(String).join(".");
  const index = form.amendments.findIndex((each) => each.key === second);
  return ["amendments", String(index), ...(rest.length > 0 ? rest : ["rule"])].join(".");
}
