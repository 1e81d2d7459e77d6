import { stringVoltage, type CalcResult, type StringVoltageDetail } from "@/lib/calc";
import { equipmentOfNode, nodeKey } from "@/lib/diagram/graph";
import type { CheckContext } from "@/lib/rules/engine/types";
import { isTrue, numberOf, Reader, textOf } from "./outcome";
import { topology } from "./topology";

/** A string with the circuit it leaves by, what it passes and the inverter it ends in. */
export interface StringRun { string: string; circuit: string; passed: readonly string[]; inverter: string | null; onCircuits: readonly string[] }

/** Strings whose leads reach a converter through switches and boxes. */
export function stringRun(context: CheckContext, id: string): StringRun | null {
  const { graph } = context;
  const port = graph.ports(id).find((one) => one.system === "pv-dc");
  if (!port) return null;
  const node = nodeKey(id, port.id);
  const circuit = graph.circuitsAt(id, port.id)[0];
  if (circuit === undefined) return null;
  const side = topology(graph).beyond(node, null);
  const passed = [...new Set([...side.nodes].map(equipmentOfNode))].filter((one) => one !== id && !side.converters.includes(one) && !side.strings.includes(one)).sort();
  return { string: id, circuit, passed, inverter: side.converters[0] ?? null, onCircuits: [...side.edges].sort() };
}

/** Open-circuit voltage of a string in the cold. Crystalline modules without a coefficient go by the table. Null behind module-level converters. */
export function coldVoltage(context: CheckContext, id: string, reader: Reader, limitV?: number): CalcResult<number, StringVoltageDetail> | null {
  if (isTrue(context, id, "converters")) return null;
  const modules = reader.number(id, "modules");
  const vocV = reader.number(id, "openCircuitV");
  const lowestC = context.drawing.site.recordLowC;
  if (lowestC === null) reader.ask({ collection: "equipment", id }, "site.recordLowC", "record low temperature of the site");
  const stated = numberOf(context, id, "openCircuitPercentPerC");
  const crystalline = (textOf(context, id, "cell") ?? "").includes("crystalline");
  if (stated === null && !crystalline) reader.number(id, "openCircuitPercentPerC");
  if (modules === null || vocV === null || lowestC === null || (stated === null && !crystalline)) return null;
  return stringVoltage({ edition: context.edition, modulesInSeries: modules, vocV, lowestC, vocCoefficient: stated === null ? "table" : { pctPerC: stated }, ...(limitV === undefined ? {} : { limitV }) });
}
/** Cold voltage of the strings on a circuit, the highest; null where it cannot be worked out. */
export function coldVoltageOf(context: CheckContext, circuit: string): number | null {
  const { side } = topology(context.graph);
  const strings = [...new Set((["from", "to"] as const).flatMap((end) => side(circuit, end).strings))];
  const values = strings.map((id) => coldVoltage(context, id, new Reader(context))?.value ?? null).filter((value): value is number => value !== null);
  return values.length > 0 ? Math.max(...values) : null;
}
/** Ids of the PV strings. */
export const pvStrings = ({ graph, drawing }: CheckContext): readonly string[] => Object.keys(drawing.equipment).sort().filter((id) => graph.kind(id).capabilities.source === "pv");
