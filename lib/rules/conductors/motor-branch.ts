import { motorDevice, shown, type Step } from "@/lib/calc";
import { motorTableCurrentA, standardRatingsA } from "@/lib/code";
import { MOTOR_CONDUCTOR_FACTOR } from "@/lib/code/tables/source-constants";
import { nodeKey } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, deviceRatingA, terminalsOf, wireOf } from "@/lib/rules/shared/conductors";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { compact, comparison, largerConductor } from "@/lib/rules/shared/protection";
import { topology } from "@/lib/rules/shared/topology";

/** Full-load current by horsepower from the table, else as stated; the nameplate current is for the overload device alone. */
function fullLoadA(context: CheckContext, id: string, reader: Reader): number | null {
  const horsepower = numberOf(context, id, "horsepower");
  const table = horsepower === null ? null : motorTableCurrentA(horsepower, numberOf(context, id, "phaseV") ?? 240);
  return table ?? reader.number(id, "currentA");
}
const FUSE = "nontime delay fuse" as const;
interface Motor { amperes: number; circuits: readonly string[]; device: string | null; ratingA: number | null; most: ReturnType<typeof motorDevice> }
/** A motor that is alone on its circuit. Several on one follow rules for groups. */
function motorOf(context: CheckContext, id: string, reader: Reader): Motor | null {
  const [run, more] = topology(context.graph).runsFrom(nodeKey(id, "line"));
  const field = run?.circuits.filter((circuit) => context.drawing.circuits[circuit]?.wiring === "field") ?? [];
  const own = context.graph.circuitsAt(id, "line").filter((circuit) => context.drawing.circuits[circuit]?.wiring === "field");
  const circuits = [...new Set([...own, ...field])];
  if (!run || more || circuits.length === 0) return null;
  const { side } = topology(context.graph);
  const alone = (["from", "to"] as const).some((end) => { const { loads } = side(circuits[0] ?? "", end); return loads.length === 1 && loads[0] === id; });
  const amperes = alone ? fullLoadA(context, id, reader) : null;
  if (amperes === null) return null;
  const fuse = run.device !== null && context.graph.kind(run.device).capabilities.switching !== "breaker";
  return { amperes, circuits, device: run.device, ratingA: run.device === null ? null : deviceRatingA(context, run.device), most: motorDevice({ edition: context.edition, fullLoadA: amperes, device: fuse ? FUSE : "inverse time breaker" }) };
}
const neededA = (motor: Motor): number => MOTOR_CONDUCTOR_FACTOR * motor.amperes;
const column = (context: CheckContext, circuit: string, ratingA: number | null): 60 | 75 | 90 => terminalsOf(context, circuit, ratingA, 75).lowest;

export const motorBranch: Rule = {
  meta: {
    id: "motor-branch", group: "Conductors and overcurrent", severity: "must-fix", evidence: "derived",
    statement: "Conductors of a motor must carry 125 % of its full-load current; its short-circuit device may not be above the table percentage, next standard size up; the overload device is another one.",
    risk: "Conductors too small overheat at every start; a device too large does not open on a fault in the winding.",
    citations: sameSection("430.22, 430.32, 430.52"), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.use", "equipment.props.horsepower", "equipment.props.currentA", "equipment.props.phaseV", "equipment.props.ratingA", "circuits.sections.ungrounded", "circuits.from", "circuits.to"], absorbs: [],
  },
  subjects: (context) => context.once("motors", () => Object.keys(context.drawing.equipment).sort().filter((id) => context.drawing.equipment[id]?.props.use === "motor" && context.graph.kind(id).capabilities.load !== undefined)).map(equipmentRef),
  evaluate: ({ id }, context) => {
    const reader = new Reader(context);
    const motor = motorOf(context, id, reader);
    if (!motor) return reader.complete ? NOT_APPLICABLE : reader.outcome();
    const outcomes = motor.circuits.flatMap((circuit) => context.graph.sections(circuit).flatMap((section): Outcome[] => {
      const wire = wireOf(context, circuit, section, reader);
      const ampacityA = wire && columnAmpacityA(wire, column(context, circuit, motor.ratingA));
      if (wire === null || ampacityA === null || ampacityA >= neededA(motor) - 1e-9) return [];
      const anchor = circuitRef(circuit);
      const step: Step = { symbol: "A", expression: "1.25 × full-load current", substituted: `1.25 × ${shown(motor.amperes)} A`, result: neededA(motor), unit: "A", citation: "430.22" };
      return [found({
        variant: "conductor-below-125", anchor, field: `sections.${section.id}.ungrounded.size`, related: [equipmentRef(id)],
        message: `${nameOf(context, anchor)} is ${wire.size} ${wire.material}, ${ampacityA} A; ${nameOf(context, equipmentRef(id))} of ${shown(motor.amperes)} A asks for ${shown(neededA(motor), 2)} A.`, steps: [step, comparison("A", neededA(motor), ampacityA, "A", false)],
      })];
    }));
    if (motor.device !== null && motor.ratingA === null) reader.number(motor.device, topology(context.graph).ratingField(motor.device) ?? "ratingA");
    if (motor.device !== null && motor.ratingA !== null && motor.ratingA > motor.most.value) {
      const anchor = equipmentRef(motor.device);
      outcomes.push(found({
        variant: "device-above-percentage", anchor, field: "props.ratingA", related: [equipmentRef(id), ...motor.circuits.map(circuitRef)],
        message: `${nameOf(context, anchor)} is ${motor.ratingA} A; ${nameOf(context, equipmentRef(id))} of ${shown(motor.amperes)} A permits ${motor.most.value} A.`, steps: [...motor.most.steps, comparison("In", motor.ratingA, motor.most.value, "A", false)],
      }));
    }
    return outcomes.length > 0 ? outcomes : reader.complete ? PASS : reader.outcome();
  },
  suggest: ({ anchor, related, variant }, context) => {
    const id = variant === "conductor-below-125" ? related[0]?.id : related.find((ref) => context.drawing.equipment[ref.id]?.props.use === "motor")?.id;
    const motor = id === undefined ? null : motorOf(context, id, new Reader(context));
    if (!motor) return [];
    if (variant === "conductor-below-125") return compact([largerConductor(context, anchor.id, (_, wire) => columnAmpacityA(wire, column(context, anchor.id, motor.ratingA)) >= neededA(motor), "Check the raceway fill and the terminals.")]);
    const field = topology(context.graph).ratingField(anchor.id);
    const rating = standardRatingsA(context.edition, field === "fuseA").findLast((one) => one <= motor.most.value);
    return field === null || rating === undefined ? [] : [{ label: `Set ${nameOf(context, anchor)} to ${rating} A`, also: "It must let the motor start.", patches: [{ op: "add", path: `/equipment/${anchor.id}/props/${field}`, value: rating }] }];
  },
  examples: { violates: "A 5 hp motor at 230 V, 28 A, on 12 AWG copper of 25 A: 35 A is needed.", passes: "The same motor on 8 AWG copper with a 60 A breaker." },
};
