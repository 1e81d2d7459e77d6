import type { PortData, TERMINAL_METALS } from "@/lib/diagram/schema";
import { wholeEquipmentData, type EquipmentData } from "../libraryData";
import { kindDefinition, type KindId, type KindProps } from "../registry";

/** What stands as the source of every rated value of the starter set, so that nobody takes it for a datasheet. */
export const STARTER_SOURCE = { document: "Starter example, invented values", page: "" } as const;

export interface StarterEntry { kind: KindId; name: string; data: EquipmentData }

/**
 * One generic entry. Rated values get the starter source; what depends on the place or is not stated stays not known.
 * @param ports values at the ports, by port id
 */
export function entry<K extends KindId>(kind: K, name: string, props: Partial<KindProps<K>>, ports: Record<string, PortData> = {}): StarterEntry {
  const definition = kindDefinition(kind);
  const stated = { ...definition.defaults, ...props } as EquipmentData["props"];
  const data = wholeEquipmentData(definition, { props: stated, sources: {}, ports });
  for (const [property, { rated }] of Object.entries(definition.properties)) {
    if (rated && data.props[property] !== null) data.sources[property] = { ...STARTER_SOURCE };
  }
  for (const port of Object.keys(ports)) data.sources[`ports.${port}`] = { ...STARTER_SOURCE };
  return { kind, name, data };
}

/** Terminal for copper and aluminum at 75 °C, as most are marked; sizes and torque (lbf·in) are invented. */
export function terminal(smallest: string, largest: string, torqueLbfIn: number, metals: (typeof TERMINAL_METALS)[number] = "CU-AL"): PortData {
  return { terminal: { temperatureC: 75, metals, smallest, largest, torqueLbfIn, torqueSource: STARTER_SOURCE.document } };
}
export const both = (data: PortData): Record<string, PortData> => ({ line: data, load: data });
