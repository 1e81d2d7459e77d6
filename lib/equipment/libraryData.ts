import { propertyFault, type DocumentFault } from "@/lib/diagram/check";
import { pointer } from "@/lib/diagram/patch";
import { portDataSchema, sourceSchema, type PortData } from "@/lib/diagram/schema";
import type { z } from "zod";
import type { KindDefinition, Properties, PropertyValue } from "./define";

/** Ratings of equipment apart from any drawing: what a library entry's version holds, and what placing it copies. */
export interface EquipmentData {
  props: Record<string, PropertyValue>;
  sources: Record<string, z.infer<typeof sourceSchema>>;
  ports: Record<string, PortData>;
}

/**
 * Every reason why these values do not describe equipment of this kind; empty when they do. `path` is a JSON pointer into the data.
 * Missing properties are no fault: they are not known. Sources are optional, also of a rated value.
 */
export function equipmentDataFaults(definition: KindDefinition, data: EquipmentData): DocumentFault[] {
  const faults: DocumentFault[] = [];
  for (const [name, value] of Object.entries(data.props)) {
    const property = Object.hasOwn(definition.properties, name) ? definition.properties[name] : undefined;
    const fault = property ? propertyFault(property, value) : `${definition.title} has no property of this name`;
    if (fault) faults.push({ path: pointer("props", name), message: fault });
  }
  // Which ports there are may follow from the properties, so it is asked of sound ones alone.
  const ports = faults.length === 0 ? definition.ports(wholeProps(definition, data.props) as never).map((port) => port.id) : null;
  for (const [id, port] of Object.entries(data.ports)) {
    if (ports && !ports.includes(id)) faults.push({ path: pointer("ports", id), message: `${definition.title} has no port of this name` });
    const parsed = portDataSchema.safeParse(port);
    if (!parsed.success) faults.push(...issues(parsed.error, "ports", id));
  }
  for (const [name, source] of Object.entries(data.sources)) {
    const known = Object.hasOwn(definition.properties, name) || (name.startsWith("ports.") && (!ports || ports.includes(name.split(".")[1] ?? "")));
    if (!known) faults.push({ path: pointer("sources", name), message: "is the source of no property" });
    const parsed = sourceSchema.safeParse(source);
    if (!parsed.success) faults.push(...issues(parsed.error, "sources", name));
  }
  return faults;
}

const issues = (error: z.ZodError, ...at: string[]): DocumentFault[] =>
  error.issues.map((issue) => ({ path: pointer(...at, ...issue.path.map(String)), message: issue.code === "unrecognized_keys" ? `has no ${issue.keys.join(", ")}` : issue.message }));

function wholeProps(definition: KindDefinition, props: Readonly<Record<string, PropertyValue>>): Record<string, PropertyValue> {
  return Object.fromEntries(Object.keys(definition.properties).map((name) => [name, Object.hasOwn(props, name) ? props[name] ?? null : null]));
}

/**
 * The same data with every property of the kind, in the kind's order: what is not stated becomes null. So an entry written
 * before the kind gained a property can still be placed.
 */
export function wholeEquipmentData(definition: KindDefinition, data: EquipmentData): EquipmentData {
  return { props: wholeProps(definition, data.props), sources: data.sources, ports: data.ports };
}

/** Rated properties that have a value, and of those the ones whose source is named. */
export function ratedCounts(properties: Properties, data: EquipmentData): { rated: number; sourced: number } {
  const rated = Object.entries(properties).filter(([name, property]) => property.rated && (data.props[name] ?? null) !== null);
  return { rated: rated.length, sourced: rated.filter(([name]) => (data.sources[name]?.document ?? "") !== "").length };
}

/** What a drawing prints beside the tag of such equipment, in one line and without maker and model; empty while nothing of it is known. */
export function keyRating(definition: KindDefinition, data: EquipmentData): string {
  const props = wholeProps(definition, data.props);
  return definition.annotation(props as never).filter((line) => line !== props["make"] && line !== props["model"]).join(", ");
}
