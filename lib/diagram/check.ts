import { drawingSchema, type Drawing } from "@/lib/diagram/schema";
import { forbiddenKey, pointer } from "@/lib/diagram/patch";
import { kindDefinition, isKindId } from "@/lib/equipment/registry";
import type { Property, PropertyValue } from "@/lib/equipment/define";

/** Something that keeps a document from being a drawing. `path` is a JSON pointer to the field. */
export interface DocumentFault { path: string; message: string }

const MOST_ELEMENTS = 20_000;

/** Why a value may not stand in a property, or null when it may. `null` always may: it means not known. */
export function propertyFault(property: Property, value: PropertyValue): string | null {
  if (value === null) return null;
  switch (property.type) {
    case "number":
      if (typeof value !== "number" || !Number.isFinite(value)) return "must be a number";
      if (value < property.min || value > property.max) return `must lie between ${property.min} and ${property.max}${property.unit ? ` ${property.unit}` : ""}`;
      return property.integer && !Number.isInteger(value) ? "must be a whole number" : null;
    case "choice":
      return typeof value === "string" && property.options.includes(value) ? null : `must be one of: ${property.options.join(", ")}`;
    case "flag":
      return typeof value === "boolean" ? null : "must be yes or no";
    case "text":
      if (typeof value !== "string") return "must be text";
      return value.length > property.maxLength ? `must be at most ${property.maxLength} characters` : null;
  }
}

/**
 * Every fault of a document, worst kind first: shape, then kinds and properties, then references. An empty list means it is a drawing.
 * Never throws, whatever is handed in.
 */
export function checkDocument(document: unknown): DocumentFault[] {
  const key = forbiddenKey(document);
  if (key) return [{ path: "", message: `holds the key ${key}, which is not allowed` }];
  const parsed = drawingSchema.safeParse(document);
  if (!parsed.success) {
    return parsed.error.issues.slice(0, 100).flatMap((issue) => {
      const at = issue.path.map(String);
      // The field that is too much is named, not the thing it stands in.
      if (issue.code === "unrecognized_keys") return issue.keys.map((extra) => ({ path: pointer(...at, extra), message: "is no field of a drawing" }));
      return [{ path: pointer(...at), message: issue.message }];
    });
  }
  const drawing = parsed.data;
  const count = Object.keys(drawing.equipment).length + Object.keys(drawing.circuits).length + Object.keys(drawing.raceways).length;
  if (count > MOST_ELEMENTS) return [{ path: "", message: `holds more than ${MOST_ELEMENTS} elements` }];
  const kinds = equipmentFaults(drawing);
  // Ports come from the kinds, so references are judged only on whole equipment.
  return kinds.length > 0 ? kinds : connectionFaults(drawing);
}

/** References and landings that do not hold, in a document whose shape and kinds are sound. */
export const connectionFaults = (drawing: Drawing): DocumentFault[] => [...referenceFaults(drawing), ...circuitFaults(drawing)];

function equipmentFaults(drawing: Drawing): DocumentFault[] {
  const faults: DocumentFault[] = [];
  for (const [id, equipment] of Object.entries(drawing.equipment)) {
    const at = (...rest: string[]): string => pointer("equipment", id, ...rest);
    if (!isKindId(equipment.kind)) {
      faults.push({ path: at("kind"), message: `no equipment kind is named ${equipment.kind}` });
      continue;
    }
    const definition = kindDefinition(equipment.kind);
    for (const [name, value] of Object.entries(equipment.props)) {
      const property = Object.hasOwn(definition.properties, name) ? definition.properties[name] : undefined;
      const fault = property ? propertyFault(property, value) : `${definition.title} has no property of this name`;
      if (fault) faults.push({ path: at("props", name), message: fault });
    }
    for (const name of Object.keys(equipment.sources)) {
      if (!Object.hasOwn(definition.properties, name) && !name.startsWith("ports.")) faults.push({ path: at("sources", name), message: "is the source of no property" });
    }
  }
  return faults;
}

function referenceFaults(drawing: Drawing): DocumentFault[] {
  const faults: DocumentFault[] = [];
  const need = (map: keyof Drawing, id: string | null, path: string): void => {
    if (id !== null && !Object.hasOwn(drawing[map] as object, id)) faults.push({ path, message: `refers to ${id}, which is not in ${map}` });
  };
  for (const [id, equipment] of Object.entries(drawing.equipment)) {
    need("equipment", equipment.parent, pointer("equipment", id, "parent"));
    const seen = new Set([id]);
    for (let at = equipment.parent; at !== null; at = drawing.equipment[at]?.parent ?? null) {
      if (seen.has(at)) { faults.push({ path: pointer("equipment", id, "parent"), message: "stands inside itself" }); break; }
      seen.add(at);
    }
    const portIds = kindDefinition(equipment.kind).ports(equipment.props as never).map((port) => port.id);
    for (const port of Object.keys(equipment.ports)) {
      if (!portIds.includes(port)) faults.push({ path: pointer("equipment", id, "ports", port), message: "is no port of this equipment" });
    }
  }
  for (const [id, raceway] of Object.entries(drawing.raceways)) {
    for (const end of ["from", "to"] as const) {
      const target = raceway[end];
      if (target !== null && target !== id && !Object.hasOwn(drawing.equipment, target) && !Object.hasOwn(drawing.raceways, target)) {
        faults.push({ path: pointer("raceways", id, end), message: `refers to ${target}, which is neither equipment nor a raceway` });
      }
      if (target === id) faults.push({ path: pointer("raceways", id, end), message: "ends in itself" });
    }
  }
  for (const [id, bond] of Object.entries(drawing.bonds)) need("equipment", bond.equipment, pointer("bonds", id, "equipment"));
  for (const [id, sensor] of Object.entries(drawing.sensors)) {
    need("circuits", sensor.circuit, pointer("sensors", id, "circuit"));
    need("equipment", sensor.reads, pointer("sensors", id, "reads"));
    need("circuits", sensor.lead ?? null, pointer("sensors", id, "lead"));
  }
  for (const [id, interlock] of Object.entries(drawing.interlocks)) {
    for (const member of Object.keys(interlock.switches)) {
      const path = pointer("interlocks", id, "switches", member);
      need("equipment", member, path);
      const kind = drawing.equipment[member]?.kind;
      if (kind && !kindDefinition(kind).capabilities.switching) faults.push({ path, message: "does not switch anything" });
    }
  }
  for (const [id, torque] of Object.entries(drawing.torques ?? {})) need("equipment", torque.equipment, pointer("torques", id, "equipment"));
  for (const [id, label] of Object.entries(drawing.labels)) {
    for (const place of Object.keys(label.places)) {
      if (!Object.hasOwn(drawing.equipment, place) && !Object.hasOwn(drawing.raceways, place)) {
        faults.push({ path: pointer("labels", id, "places", place), message: "is neither equipment nor a raceway" });
      }
    }
  }
  return faults;
}

function circuitFaults(drawing: Drawing): DocumentFault[] {
  const faults: DocumentFault[] = [];
  const taken = new Map<string, string>();
  for (const [id, circuit] of Object.entries(drawing.circuits)) {
    const at = (...rest: string[]): string => pointer("circuits", id, ...rest);
    const systems: string[] = [];
    for (const end of ["from", "to"] as const) {
      const endpoint = circuit[end];
      const equipment = drawing.equipment[endpoint.equipment];
      if (!equipment) { faults.push({ path: at(end, "equipment"), message: `refers to ${endpoint.equipment}, which is not in equipment` }); continue; }
      const port = kindDefinition(equipment.kind).ports(equipment.props as never).find((each) => each.id === endpoint.port);
      if (!port) { faults.push({ path: at(end, "port"), message: `${equipment.tag || equipment.kind} has no port ${endpoint.port}` }); continue; }
      systems.push(port.system);
      if (port.system !== circuit.system) faults.push({ path: at(end, "port"), message: `is a port for ${port.system}; the circuit is ${circuit.system}` });
      if (port.many) continue;
      // A factory joint and a field circuit may meet at one terminal; two field circuits may not.
      const key = `${endpoint.equipment}/${endpoint.port}/${circuit.wiring}`;
      const other = taken.get(key);
      if (other && other !== id) faults.push({ path: at(end, "port"), message: `is taken by circuit ${drawing.circuits[other]?.tag || other}` });
      taken.set(key, id);
    }
    if (circuit.from.equipment === circuit.to.equipment && circuit.from.port === circuit.to.port) faults.push({ path: at("to"), message: "ends where it starts" });
    for (const [sectionId, section] of Object.entries(circuit.sections)) {
      section.route.forEach((step, index) => {
        const path = at("sections", sectionId, "route", String(index));
        const raceway = drawing.raceways[step.raceway];
        if (!raceway) faults.push({ path, message: `refers to ${step.raceway}, which is not in raceways` });
        else if (step.compartment !== null && !Object.hasOwn(raceway.compartments, step.compartment)) faults.push({ path, message: `${raceway.tag || step.raceway} has no compartment ${step.compartment}` });
      });
      const other = section.sharesGroundOf;
      if (other !== null && (other === id || !Object.hasOwn(drawing.circuits, other))) {
        faults.push({ path: at("sections", sectionId, "sharesGroundOf"), message: "names no other circuit" });
      }
    }
  }
  return faults;
}
