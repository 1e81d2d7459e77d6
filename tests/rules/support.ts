import type { Circuit, Conductor, Drawing, Section } from "@/lib/diagram/schema";
import type { PropertyValue } from "@/lib/equipment/define";
import { check } from "@/lib/rules/engine/run";
import { rules } from "@/lib/rules";
import { secondSystem } from "@/tests/fixtures/secondSystem";
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
  /** Declared rules: ids of the elements whose question is open, and of those that somebody answered. */
  open?: readonly string[];
  stated?: readonly string[];
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

export interface Said { finds: string[]; asks: string[]; open: string[]; stated: string[] }
/** What a person states about an element under a rule, on an invented day. */
export function state(drawing: Drawing, rule: string, anchor: string, value: "yes" | "no" | "not applicable", on = "2026-04-20"): void {
  (drawing.statements ??= {})[`${rule}-${Object.keys(drawing.statements ?? {}).length + 1}`] = { rule, anchor, value, by: "T. Wrenfield", on, note: "" };
}
/** What one rule alone says of the clean farm system after an edit. */
export function say(rule: string, edit: (drawing: Drawing) => void): Said {
  const found = rules.find((each) => each.meta.id === rule);
  if (!found) throw new Error(`there is no rule ${rule}`);
  const drawing = cleanDrawing();
  edit(drawing);
  const { findings, declarations } = check(drawing, { rules: [found] });
  const broken = findings.find((finding) => finding.variant === "engine-error");
  if (broken) throw new Error(broken.message);
  return {
    finds: findings.filter((finding) => finding.kind === "finding" && finding.rule === rule).map((finding) => finding.anchor.id).sort(),
    asks: [...new Set(findings.filter((finding) => finding.kind === "needs-data").map((finding) => finding.anchor.id))].sort(),
    open: declarations.filter((one) => one.statement === null).map((one) => one.anchor.id).sort(),
    stated: declarations.filter((one) => one.statement !== null).map((one) => one.anchor.id).sort(),
  };
}

/** A third inverter like the second, with a breaker of its own on the cabinet's bus, on the battery bus, linked with the second. */
export function thirdUnit(drawing: Drawing): void {
  const copy = <T>(value: T | undefined): T => { if (value === undefined) throw new Error("the farm system lacks a part"); return structuredClone(value); };
  const moved = (at: { x: number; y: number }): { x: number; y: number } => ({ x: at.x, y: at.y + 30 });
  const unit = copy(drawing.equipment["inv-2"]);
  drawing.equipment["inv-3"] = { ...unit, tag: "INV-3", at: moved(unit.at), props: { ...unit.props, address: 3 } };
  drawing.equipment["inv-2"]!.props.terminator = false;
  const device = copy(drawing.equipment["cb-i2"]);
  drawing.equipment["cb-i3"] = { ...device, tag: "CB-I3", at: moved(device.at), spaces: [11, 12] };
  const lead = copy(drawing.equipment["cb-d2"]);
  drawing.equipment["cb-d3"] = { ...lead, tag: "CB-D3", at: moved(lead.at) };
  const joint = (from: string, id: string): void => { drawing.circuits[id] = { ...copy(Object.values(drawing.circuits).find((each) => each.wiring === "factory" && each.to.equipment === from)), to: { equipment: id.slice(2), port: "line", offset: 0 } }; };
  joint("cb-i2", "j-cb-i3");
  joint("cb-d2", "j-cb-d3");
  drawing.circuits["f6"] = { ...copy(drawing.circuits["f3"]), tag: "F6", from: { equipment: "inv-3", port: "ac", offset: 0 }, to: { equipment: "cb-i3", port: "load", offset: 0 } };
  drawing.circuits["d3"] = { ...copy(drawing.circuits["d2"]), tag: "D3", from: { equipment: "cb-d3", port: "load", offset: 0 }, to: { equipment: "inv-3", port: "battery", offset: 0 } };
  drawing.circuits["k-12"] = { ...copy(drawing.circuits["k-2"]), tag: "K-12", from: { equipment: "inv-2", port: "data", offset: 0 }, to: { equipment: "inv-3", port: "data", offset: 0 } };
}

/** Puts the second system, with its transfer switch, in the place of the farm system. */
export function second(drawing: Drawing): void { Object.assign(drawing, secondSystem()); }
/** The second system with its generator wired straight to the transfer switch. */
export function direct(drawing: Drawing): void {
  second(drawing);
  circuitOf(drawing, "c3").from = { equipment: "gen", port: "load", offset: 0 };
  for (const [id, each] of Object.entries(drawing.circuits)) if (each.wiring === "factory" && each.to.equipment === "qg") delete drawing.circuits[id];
  delete drawing.equipment["qg"];
}
export const home = (drawing: Drawing): void => { drawing.site.occupancy = "one- or two-family dwelling"; };
