import { voltageDropPct, type VoltageDropInput } from "@/lib/calc";
import type { Circuit } from "@/lib/diagram/schema";
import type { CheckContext } from "@/lib/rules/engine/types";
import { wireOf, type SectionOf, type Wire } from "./conductors";
import { carriedBy, loadA, type Carried } from "./currents";
import { circuitRef, nameOf, numberOf, Reader } from "./outcome";
import { motorCircuit, powerCircuits, topology } from "./topology";
import { acVoltageV, serviceSystem } from "./voltage";

export interface Flow { amperes: number; volts: number; kind: Carried["kind"] }
/** Current that flows for hours and the voltage at which it does; null where nothing tells. */
function flowOf(context: CheckContext, id: string, reader: Reader): Flow | null {
  const { system } = context.drawing.circuits[id] as Circuit;
  const { side } = topology(context.graph);
  const sides = [side(id, "from"), side(id, "to")];
  const carried = carriedBy(context, id, new Reader(context));
  if (system === "ac") {
    const motors = !carried && motorCircuit(context.graph, id) ? sides.find((one) => one.utilities.length + one.converters.length + one.generators.length === 0)?.loads ?? [] : [];
    const amperes = carried?.required.detail.maximumA ?? motors.reduce((sum, load) => sum + (loadA(context, load) ?? 0), 0);
    const volts = amperes > 0 ? acVoltageV(context, id, reader) : null;
    return volts === null ? null : { amperes, volts, kind: carried?.kind ?? "motor" };
  }
  if (!carried) return null;
  if (system === "battery-dc") {
    const volts = [...new Set(sides.flatMap((one) => one.batteries))].map((battery) => numberOf(context, battery, "nominalV")).find((value) => value !== null) ?? null;
    return volts === null ? null : { amperes: carried.required.detail.maximumA, volts, kind: "storage" };
  }
  const string = carried.from[0] ?? "";
  const [modules, volts, amperes] = [numberOf(context, string, "modules"), numberOf(context, string, "maximumPowerV"), numberOf(context, string, "maximumPowerA")];
  return modules === null || volts === null || amperes === null ? null : { amperes: amperes * carried.from.length, volts: modules * volts, kind: "pv" };
}
/** Input of the calculation for one section. */
export function sectionInput(context: CheckContext, id: string, section: SectionOf, wire: Wire, flow: Flow): VoltageDropInput {
  const dc = context.drawing.circuits[id]?.system !== "ac";
  const raceway = section.route.map((step) => context.drawing.raceways[step.raceway]).find((one) => one?.kind === "conduit");
  const conduit = raceway?.metal === true ? (raceway.type === "EMT" || raceway.type === "RMC" || raceway.type === "IMC" ? "steel" : "aluminum") : "pvc";
  return { edition: context.edition, system: dc ? "dc" : serviceSystem(context)?.phases === 3 ? "ac 3-phase" : "ac 1-phase", currentA: flow.amperes, voltageV: flow.volts, lengthFt: section.lengthFt ?? 0, size: wire.size, material: wire.material, sets: wire.sets, ...(dc ? {} : { conduit }) };
}
export interface Drop { percent: number; flow: Flow; missing: Reader["missing"] }
/** Drop along every power circuit, worked out once; circuits of which nothing tells are left out. */
export const drops = (context: CheckContext): ReadonlyMap<string, Drop> => context.once("voltage drop of circuits", () => new Map(powerCircuits(context.graph).flatMap((id): [string, Drop][] => {
  const reader = new Reader(context);
  const flow = flowOf(context, id, reader);
  if (!flow) return [];
  const parts = context.graph.sections(id).flatMap((section) => {
    const wire = wireOf(context, id, section, reader);
    if (section.lengthFt === null) reader.ask(circuitRef(id), `sections.${section.id}.lengthFt`, `length of ${nameOf(context, circuitRef(id))}`);
    return wire && section.lengthFt !== null ? [voltageDropPct(sectionInput(context, id, section, wire, flow))] : [];
  });
  return [[id, { percent: parts.reduce((sum, part) => sum + part, 0), flow, missing: reader.missing }]];
})));
