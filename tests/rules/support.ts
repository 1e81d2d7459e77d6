import type { Circuit, Conductor, Drawing, Section } from "@/lib/diagram/schema";
import type { PropertyValue } from "@/lib/equipment/define";
import { check } from "@/lib/rules/engine/run";
import { rules } from "@/lib/rules";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";

/** One case of a rule: an edit of the clean farm system, and what this rule alone then says. */
export interface RuleCase {
  name: string;
  /** Where the limit or the expected answer comes from. */
  source: string;
  edit: (drawing: Drawing) => void;
  /** Ids of the elements at which the rule finds a fault. */
  finds?: readonly string[];
  /** Ids of the elements of which it asks a missing value. */
  asks?: readonly string[];
  /** True where nothing but the way conductors, routes, devices or bonds run was changed. */
  moved?: boolean;
}

export const set = (drawing: Drawing, id: string, name: string, value: PropertyValue): void => {
  const found = drawing.equipment[id];
  if (!found || !Object.hasOwn(found.props, name)) throw new Error(`${id} has no ${name}`);
  found.props[name] = value;
};
export const circuitOf = (drawing: Drawing, id: string): Circuit => {
  const found = drawing.circuits[id];
  if (!found) throw new Error(`no circuit ${id}`);
  return found;
};
export const sectionOf = (drawing: Drawing, id: string, section = "s1"): Section => {
  const found = circuitOf(drawing, id).sections[section];
  if (!found) throw new Error(`no section ${section} of ${id}`);
  return found;
};
/** Gives every power conductor of a section another size. */
export function resize(drawing: Drawing, id: string, size: string | null, section = "s1"): void {
  const found = sectionOf(drawing, id, section);
  for (const role of ["ungrounded", "grounded"] as const) if (found[role]) found[role] = { ...(found[role] as Conductor), size };
}
export function ground(drawing: Drawing, id: string, size: string | null): void {
  const found = sectionOf(drawing, id);
  found.equipmentGround = { ...(found.equipmentGround as Conductor), size };
}
export const reroute = (drawing: Drawing, id: string, raceways: readonly string[], section = "s1"): void => {
  sectionOf(drawing, id, section).route = raceways.map((raceway) => ({ raceway, compartment: Object.keys(drawing.raceways[raceway]?.compartments ?? {})[0] ?? null }));
};
export const lengthFt = (drawing: Drawing, raceway: string, feet: number | null): void => {
  const stretch = Object.values(drawing.raceways[raceway]?.stretches ?? {})[0];
  if (!stretch) throw new Error(`no raceway ${raceway}`);
  stretch.lengthFt = feet;
};

export interface Said { finds: string[]; asks: string[] }
/** What one rule alone says of the clean farm system after an edit. */
export function say(rule: string, edit: (drawing: Drawing) => void): Said {
  const found = rules.find((each) => each.meta.id === rule);
  if (!found) throw new Error(`there is no rule ${rule}`);
  const drawing = cleanDrawing();
  edit(drawing);
  const { findings } = check(drawing, { rules: [found] });
  const broken = findings.find((finding) => finding.variant === "engine-error");
  if (broken) throw new Error(broken.message);
  return {
    finds: findings.filter((finding) => finding.kind === "finding" && finding.rule === rule).map((finding) => finding.anchor.id).sort(),
    asks: [...new Set(findings.filter((finding) => finding.kind === "needs-data").map((finding) => finding.anchor.id))].sort(),
  };
}
