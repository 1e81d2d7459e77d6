import type { End } from "@/lib/diagram/graph";
import type { Circuit, PortData } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import type { SectionOf } from "./conductors";
import { equipmentRef, nameOf, type Reader } from "./outcome";
import { powerCircuits } from "./topology";

export type Terminal = NonNullable<PortData["terminal"]>;
/** End of a field circuit at a terminal, with the section that lands there. `terminal` is null where nothing was entered. */
export interface Landed { circuit: string; end: End; equipment: string; port: string; section: SectionOf; terminal: Terminal | null }

/** Terminals on which field conductors land, by equipment. Array leads, listed connectors and the utility's drop have none. */
export function landedTerminals(context: CheckContext): ReadonlyMap<string, readonly Landed[]> {
  return context.once("terminals of field circuits", () => {
    const map = new Map<string, Landed[]>();
    for (const circuit of powerCircuits(context.graph)) {
      const drawn = context.drawing.circuits[circuit] as Circuit;
      const sections = context.graph.sections(circuit);
      for (const end of ["from", "to"] as const) {
        const { equipment, port } = drawn[end];
        const { source, follower, enclosure } = context.graph.kind(equipment).capabilities;
        const section = end === "from" ? sections[0] : sections.at(-1);
        if (!section || source === "pv" || source === "utility" || (follower && !enclosure)) continue;
        const list = map.get(equipment);
        const landed: Landed = { circuit, end, equipment, port, section, terminal: context.graph.port(equipment, port)?.data.terminal ?? null };
        if (list) list.push(landed);
        else map.set(equipment, [landed]);
      }
    }
    return map;
  });
}
export const terminalSubjects = (context: CheckContext) => [...landedTerminals(context).keys()].sort().map(equipmentRef);
export const terminalsAt = (context: CheckContext, id: string): readonly Landed[] => landedTerminals(context).get(id) ?? [];

/** Asks for a value marked at a terminal. */
export function askTerminal(context: CheckContext, reader: Reader, { equipment, port }: Landed, field: keyof Terminal, label: string): void {
  reader.ask(equipmentRef(equipment), `ports.${port}.terminal.${field}`, `${label} at ${nameOf(context, equipmentRef(equipment))}`);
}
export const terminalField = ({ port }: Landed, field: keyof Terminal): string => `ports.${port}.terminal.${field}`;
