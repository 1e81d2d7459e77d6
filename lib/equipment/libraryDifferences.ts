import { pointer } from "@/lib/diagram/patch";
import type { KindDefinition, PropertyValue } from "./define";
import type { EquipmentData } from "./libraryData";

export interface DataDifference { path: string; label: string; unit: string; drawn: PropertyValue; now: PropertyValue }
interface Value { label: string; unit: string; value: PropertyValue }

/** Words and unit of the values at a port and at its terminal. */
const PORT_FIELDS: Readonly<Record<string, readonly [string, string]>> = {
  nominalV: ["nominal voltage", "V"], maximumV: ["largest voltage", "V"], continuousA: ["continuous current", "A"], maximumA: ["largest current", "A"],
  maximumOvercurrentA: ["largest overcurrent device", "A"], spare: ["left spare", ""],
  temperatureC: ["terminal temperature", "°C"], metals: ["terminal metals", ""], smallest: ["smallest conductor", ""], largest: ["largest conductor", ""],
  torqueLbfIn: ["torque", "lbf·in"], torqueSource: ["source of the torque", ""], conductorsMost: ["conductors in one terminal at most", ""], fineStrand: ["identified for fine strands", ""],
  noTemperatureMark: ["without a temperature marking", ""],
};

const FIELD_ORDER = Object.keys(PORT_FIELDS);

/** Members in a given order, others after them: the database keeps no order of its own. */
function inOrder<Value>(members: Readonly<Record<string, Value>>, order: readonly string[]): [string, Value][] {
  const place = (name: string): number => (order.includes(name) ? order.indexOf(name) : order.length);
  return Object.entries(members).sort(([a], [b]) => place(a) - place(b));
}

/** Every single value of the data by its JSON pointer, in the order in which a form shows them. */
function values(definition: KindDefinition, data: EquipmentData): Map<string, Value> {
  const all = new Map<string, Value>();
  const ports = new Map(definition.ports(data.props as never).map((port) => [port.id, port.label]));
  const label = (name: string): string => definition.properties[name]?.label ?? (name.startsWith("ports.") ? ports.get(name.slice("ports.".length)) : undefined) ?? name;
  for (const [name, property] of Object.entries(definition.properties)) {
    all.set(pointer("props", name), { label: property.label, unit: property.type === "number" ? property.unit : "", value: data.props[name] ?? null });
  }
  for (const [name, source] of inOrder(data.sources, Object.keys(definition.properties))) {
    all.set(pointer("sources", name, "document"), { label: `${label(name)}: datasheet`, unit: "", value: source.document });
    all.set(pointer("sources", name, "page"), { label: `${label(name)}: page`, unit: "", value: source.page });
    if (source.file) all.set(pointer("sources", name, "file"), { label: `${label(name)}: stored datasheet`, unit: "", value: source.file });
  }
  for (const [id, port] of inOrder(data.ports, [...ports.keys()])) {
    const at = ports.get(id) ?? id;
    const { terminal, ...fields } = port;
    const put = (name: string, value: PropertyValue, ...under: string[]): void => {
      const [words, unit] = PORT_FIELDS[name] ?? [name, ""];
      all.set(pointer("ports", id, ...under, name), { label: `${at}: ${words}`, unit, value });
    };
    for (const [name, value] of inOrder(fields, FIELD_ORDER)) put(name, value ?? null);
    for (const [name, value] of inOrder(terminal ?? {}, FIELD_ORDER)) put(name, value ?? null, "terminal");
  }
  return all;
}

/**
 * What taking over a later version of an entry would change: values that differ between the two versions and that the drawing does not
 * hold already. `drawn` is what the drawing holds. What the designer changed for the job, and the entry did not, stays out.
 */
export function libraryDifferences(definition: KindDefinition, data: { then: EquipmentData; now: EquipmentData; held: EquipmentData }): DataDifference[] {
  const then = values(definition, data.then);
  const now = values(definition, data.now);
  const held = values(definition, data.held);
  const differences: DataDifference[] = [];
  for (const path of new Set([...then.keys(), ...now.keys()])) {
    const shown = now.get(path) ?? then.get(path);
    const value = now.get(path)?.value ?? null;
    const drawn = held.get(path)?.value ?? null;
    if (shown && (then.get(path)?.value ?? null) !== value && drawn !== value) differences.push({ path, label: shown.label, unit: shown.unit, drawn, now: value });
  }
  return differences;
}
