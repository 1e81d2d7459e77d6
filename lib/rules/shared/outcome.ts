import type { CheckContext, FindingDraft, Outcome } from "@/lib/rules/engine/types";
import type { ElementRef } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";

export const PASS: Outcome = { outcome: "pass" };
export const NOT_APPLICABLE: Outcome = { outcome: "not-applicable" };
export const found = (finding: FindingDraft): Outcome => ({ outcome: "finding", finding });

export const equipmentRef = (id: string): ElementRef => ({ collection: "equipment", id });
export const circuitRef = (id: string): ElementRef => ({ collection: "circuits", id });
export const racewayRef = (id: string): ElementRef => ({ collection: "raceways", id });
export const sensorRef = (id: string): ElementRef => ({ collection: "sensors", id });
export const refKey = (ref: ElementRef): string => `${ref.collection}/${ref.id}`;

/** Name of an element as a person reads it: its tag, or its kind where it has none. For printing only; nothing is decided by it. */
export function nameOf({ drawing }: Pick<CheckContext, "drawing">, ref: ElementRef): string {
  const element = ref.collection === "texts" || ref.collection === "acceptances" || ref.collection === "labels" ? undefined : drawing[ref.collection][ref.id];
  if (element && element.tag.trim() !== "") return element.tag;
  if (ref.collection === "equipment") return kindDefinition(drawing.equipment[ref.id]?.kind ?? "load").title;
  return ref.collection === "circuits" ? "circuit without number" : ref.collection.replace(/s$/, "");
}
/** Names in one list: A, B and C. */
export function names(context: Pick<CheckContext, "drawing">, refs: readonly ElementRef[]): string {
  const list = refs.map((ref) => nameOf(context, ref)).sort((a, b) => a.localeCompare(b, "en", { numeric: true }));
  return list.length < 2 ? list.join("") : `${list.slice(0, -1).join(", ")} and ${list.at(-1)}`;
}

/** Field that a rule needs and the drawing does not hold yet. */
export interface Missing { ref: ElementRef; field: string; label: string }

/** Reads values and remembers what is missing, so that a rule asks for everything at once. */
export class Reader {
  readonly missing: Missing[] = [];
  constructor(private readonly context: CheckContext) {}

  /** A number among an equipment's properties, or null and noted as missing. */
  number(equipment: string, key: string): number | null {
    const value = this.context.drawing.equipment[equipment]?.props[key];
    if (typeof value === "number") return value;
    this.ask(equipmentRef(equipment), `props.${key}`, propertyLabel(this.context, equipment, key));
    return null;
  }
  /** A word among an equipment's properties, or null and noted as missing. */
  text(equipment: string, key: string): string | null {
    const value = this.context.drawing.equipment[equipment]?.props[key];
    if (typeof value === "string" && value.trim() !== "") return value;
    this.ask(equipmentRef(equipment), `props.${key}`, propertyLabel(this.context, equipment, key));
    return null;
  }
  /** Notes a missing field of any element. */
  ask(ref: ElementRef, field: string, label: string): void {
    if (!this.missing.some((one) => one.field === field && refKey(one.ref) === refKey(ref))) this.missing.push({ ref, field, label });
  }
  get complete(): boolean { return this.missing.length === 0; }
  /** The outcome that asks for what was missing. */
  outcome(): Outcome { return { outcome: "needs-data", fields: this.missing }; }
}

/** Words of a property as its form shows them. */
export function propertyLabel(context: Pick<CheckContext, "drawing">, equipment: string, key: string): string {
  const kind = context.drawing.equipment[equipment]?.kind;
  return (kind ? kindDefinition(kind).properties[key]?.label : undefined) ?? key;
}
/** A property as number, or null. */
export function numberOf(context: Pick<CheckContext, "drawing">, equipment: string, key: string): number | null {
  const value = context.drawing.equipment[equipment]?.props[key];
  return typeof value === "number" ? value : null;
}
/** A property as text, or null. */
export function textOf(context: Pick<CheckContext, "drawing">, equipment: string, key: string): string | null {
  const value = context.drawing.equipment[equipment]?.props[key];
  return typeof value === "string" && value.trim() !== "" ? value : null;
}
/** True only where the property is a stated yes. */
export const isTrue = (context: Pick<CheckContext, "drawing">, equipment: string, key: string): boolean => context.drawing.equipment[equipment]?.props[key] === true;
