import { TERMINAL_60C_MAX_A } from "@/lib/code/tables/source-constants";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { columnAmpacityA, wireOf } from "@/lib/rules/shared/conductors";
import { carriedBy } from "@/lib/rules/shared/currents";
import { circuitRef, equipmentRef, found, nameOf, NOT_APPLICABLE, PASS, Reader } from "@/lib/rules/shared/outcome";
import { comparison, guardsOf, largestDevice } from "@/lib/rules/shared/protection";
import { askTerminal, terminalField, terminalsAt, terminalSubjects, type Landed } from "@/lib/rules/shared/terminals";
import { motorCircuit } from "@/lib/rules/shared/topology";
import { compareSizes } from "@/lib/units";

/** What a circuit asks at a terminal column and what the column gives; null where it holds. */
function shortfall(context: CheckContext, landed: Landed, column: 60 | 75, reader: Reader): { what: string; amperes: number; givesA: number; size: string } | null {
  const { circuit, section } = landed;
  const wire = wireOf(context, circuit, section, reader);
  if (!wire) return null;
  const ampacityA = columnAmpacityA(wire, column);
  const size = `${wire.size} ${wire.material}`;
  const carried = carriedBy(context, circuit, new Reader(context));
  const needed = carried === null || carried.kind === "storage" || carried.kind === "generator" ? 0 : carried.required.detail.beforeFactorsA;
  if (needed > ampacityA + 1e-9) return { what: "its circuit asks for", amperes: needed, givesA: ampacityA, size };
  if (motorCircuit(context.graph, circuit)) return null;
  const most = largestDevice(context, circuit, wire, ampacityA).value;
  const guard = guardsOf(context, circuit, new Reader(context)).find((one) => one.section.id === section.id && one.ratingA > most + 1e-9);
  return guard ? { what: `${nameOf(context, equipmentRef(guard.device))} is`, amperes: guard.ratingA, givesA: most, size } : null;
}
/** Column of an unmarked terminal: 60 °C to 100 A or 1 AWG, 75 °C above. */
function assumedC(context: CheckContext, landed: Landed): 60 | 75 {
  const ratings = guardsOf(context, landed.circuit, new Reader(context)).map((one) => one.ratingA);
  const wire = wireOf(context, landed.circuit, landed.section, new Reader(context));
  return (ratings.length > 0 ? Math.max(...ratings) <= TERMINAL_60C_MAX_A : wire !== null && compareSizes(wire.size, "1 AWG") <= 0) ? 60 : 75;
}
const cable60 = ({ section }: Landed): boolean => /^(NM|UF)\b/i.test(section.cable?.type ?? "");

export const terminalUnmarked60: Rule = {
  meta: {
    id: "terminal-unmarked-60", group: "Terminals, temperature, torque", severity: "must-fix", evidence: "rated",
    statement: "To 100 A, or with 14 to 1 AWG, a terminal without a temperature marking counts as 60 °C; so do NM and UF cables at any terminal.",
    risk: "A terminal made for 60 °C runs at 75 °C, loosens and burns.",
    citations: sameSection("110.14(C)(1)(a)", ["agreed", "agreed", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.ports.terminal.temperatureC", "equipment.ports.terminal.noTemperatureMark", "circuits.sections.ungrounded", "circuits.sections.cable.type", "equipment.props.ratingA"], absorbs: [],
  },
  subjects: terminalSubjects,
  evaluate: ({ id }, context) => terminalsAt(context, id).map((landed): Outcome => {
    const marked = landed.terminal?.temperatureC ?? null;
    const nobodyLooked = marked === null && landed.terminal?.noTemperatureMark !== true;
    if (marked !== null && !cable60(landed)) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const column = cable60(landed) ? 60 : assumedC(context, landed);
    const short = shortfall(context, landed, column, reader);
    if (!reader.complete) return reader.outcome();
    if (!short) return PASS;
    // An empty field is a question, not a fault.
    if (nobodyLooked && !cable60(landed)) { askTerminal(context, reader, landed, "temperatureC", "terminal temperature marking"); return reader.outcome(); }
    const anchor = equipmentRef(id);
    const why = cable60(landed) ? `${landed.section.cable?.type ?? "the cable"} counts` : "the terminal is not marked and counts";
    return found({
      variant: `${landed.port}-${cable60(landed) ? "cable" : "unmarked"}`, anchor, field: terminalField(landed, "temperatureC"), related: [circuitRef(landed.circuit)],
      message: `${nameOf(context, anchor)}: ${why} as ${column} °C, where ${short.size} of ${nameOf(context, circuitRef(landed.circuit))} gives ${short.givesA} A; ${short.what} ${Math.round(short.amperes * 100) / 100} A.`,
      steps: [{ symbol: "At", expression: `table, ${column} °C column`, substituted: short.size, result: short.givesA, unit: "A" }, comparison("I", short.amperes, short.givesA, "A", false)],
    });
  }),
  examples: { violates: "8 AWG copper at a breaker without a marking: 40 A is below the 41.7 A of its circuit.", passes: "75 °C marked at both ends: 50 A." },
};
