import type { CheckContext } from "@/lib/rules/engine/types";
import { parseSystemVoltage, type SystemVoltage } from "@/lib/units";
import { equipmentRef, numberOf, Reader, textOf } from "./outcome";
import { coldVoltage } from "./strings";
import { topology } from "./topology";

/** System at the service from its words; null where nobody entered it. The high leg of a delta stands higher above ground than half of it. */
export function serviceSystem(context: CheckContext): (SystemVoltage & { highLegV: number | null }) | null {
  return context.once("system at the service", () => {
    const stated = context.drawing.site.serviceSystem ?? null;
    const utility = Object.keys(context.drawing.equipment).sort().find((id) => context.graph.kind(id).capabilities.source === "utility");
    const words = stated ?? (utility === undefined ? null : textOf(context, utility, "systemVoltage"));
    if (words === null) return null;
    const volts = /\d+[Yy]?(?:\/\d+)?/.exec(words)?.[0];
    if (volts === undefined) return null;
    const highLegV = words.includes("high leg") ? 208 : null;
    return { ...parseSystemVoltage(/^\d+\/\d+$/.test(volts) && words.includes("3-ph") ? wye(volts) : volts), ...(words.includes("3-ph") || words.includes("4-wire") ? { phases: 3 as const } : {}), highLegV };
  });
}
function wye(volts: string): string {
  const [a = 0, b = 0] = volts.split("/").map(Number);
  return `${Math.max(a, b)}Y/${Math.min(a, b)}`;
}

/** Voltage between the conductors of an ac circuit, V: of a load alone on it, of the service, or of the sources drawn. Null is asked for. */
export function acVoltageV(context: CheckContext, id: string, reader: Reader): number | null {
  const { side } = topology(context.graph);
  const alone = (["from", "to"] as const).map((end) => side(id, end)).find((one) => one.loads.length === 1 && one.buses.length + one.converters.length + one.utilities.length + one.generators.length === 0);
  const own = alone ? numberOf(context, alone.loads[0] ?? "", "phaseV") : null;
  if (own !== null) return own;
  const system = serviceSystem(context);
  if (system) return system.lineToLineV;
  const sides = [side(id, "from"), side(id, "to")];
  const outputs = [...new Set(sides.flatMap((one) => [...one.converters, ...one.generators]))].map((one) => numberOf(context, one, "outputV")).filter((value): value is number => value !== null);
  if (outputs.length > 0) return Math.max(...outputs);
  const utility = sides.flatMap((one) => one.utilities)[0];
  reader.ask(utility === undefined ? { collection: "circuits", id } : equipmentRef(utility), utility === undefined ? "site.serviceSystem" : "props.systemVoltage", "system voltage");
  return null;
}

/** Largest voltage between the conductors of a circuit, V: strings in the cold, batteries full, the ac system. Null where it cannot be worked out; asked for where an entry would do. */
export function largestVoltageV(context: CheckContext, id: string, reader: Reader): number | null {
  const system = context.drawing.circuits[id]?.system;
  if (system === "pv-dc") {
    const { side } = topology(context.graph);
    const strings = [...new Set((["from", "to"] as const).flatMap((end) => side(id, end).strings))];
    const values = strings.map((string) => context.once(`cold voltage of string ${string}`, () => coldVoltage(context, string, new Reader(context))?.value ?? null)).filter((value): value is number => value !== null);
    return values.length > 0 ? Math.max(...values) : null;
  }
  if (system === "ac") return acVoltageV(context, id, reader);
  if (system !== "battery-dc") return null;
  const { side } = topology(context.graph);
  const sides = [side(id, "from"), side(id, "to")];
  const batteries = [...new Set(sides.flatMap((one) => one.batteries))];
  const from = batteries.length > 0 ? batteries : [...new Set(sides.flatMap((one) => one.converters))];
  const values = from.map((one) => reader.number(one, batteries.length > 0 ? "mostV" : "batteryMostV"));
  return values.length === 0 || values.some((value) => value === null) ? null : Math.max(...values.map((value) => value ?? 0));
}
