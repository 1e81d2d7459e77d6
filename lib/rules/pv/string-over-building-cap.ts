import { PV_BUILDING_VOLTAGE } from "@/lib/code/tables/source-constants";
import { MUST_FIX_TO_2023, sameSection } from "@/lib/rules/engine/meta";
import type { CheckContext, Outcome, Rule } from "@/lib/rules/engine/types";
import { circuitRef, equipmentRef, found, isTrue, nameOf, NOT_APPLICABLE, PASS, Reader, textOf } from "@/lib/rules/shared/outcome";
import { comparison } from "@/lib/rules/shared/protection";
import { coldVoltage, pvStrings, stringRun, type StringRun } from "@/lib/rules/shared/strings";

const inside = (exposure: string | null | undefined): boolean => exposure === "indoor dry" || exposure === "indoor damp" || exposure === "roof";
/** On or in a building by where the array stands, what it ends in and what its circuits pass; null while that is not known. */
function onBuilding(context: CheckContext, run: StringRun): boolean | null {
  if (context.drawing.site.occupancy === "ground-mounted, no building") return false;
  const mounting = textOf(context, run.string, "mounting");
  if (mounting !== null && mounting !== "ground, no building") return true;
  const places = [run.inverter ?? "", ...run.passed].map((id) => context.drawing.equipment[id]?.location.exposure);
  const ways = run.onCircuits.flatMap((circuit) => context.graph.racewaysOf(circuit)).flatMap(({ raceway }) => {
    const one = context.drawing.raceways[raceway];
    return one ? [one.location.exposure, ...Object.values(one.stretches).map((stretch) => stretch.exposure)] : [];
  });
  return [...places, ...ways].some(inside) ? true : mounting === null ? null : false;
}

export const stringOverBuildingCap: Rule = {
  meta: {
    id: "string-over-building-cap", group: "PV source circuits", severity: "must-fix", evidence: "derived",
    statement: "PV dc circuits on or in a one- or two-family dwelling stay within 600 V, on or in other buildings within 1000 V.",
    risk: "Firefighters and occupants meet a voltage that the building's wiring rules do not allow for.",
    citations: sameSection("690.7", ["read", "read", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023,
    limits: {
      dwelling: { value: PV_BUILDING_VOLTAGE.dwelling, unit: "V", source: "690.7" },
      building: { value: PV_BUILDING_VOLTAGE.building, unit: "V", source: "690.7" },
    },
    reads: ["site.occupancy", "site.recordLowC", "site.amendments", "equipment.props.modules", "equipment.props.openCircuitV", "equipment.props.mounting", "equipment.location.exposure", "raceways.location.exposure"], absorbs: [],
  },
  subjects: (context) => pvStrings(context).map(equipmentRef),
  evaluate: ({ id }, context): Outcome => {
    const run = stringRun(context, id);
    if (!run || isTrue(context, id, "converters")) return NOT_APPLICABLE;
    const on = onBuilding(context, run);
    if (on === false) return NOT_APPLICABLE;
    const reader = new Reader(context);
    const cold = coldVoltage(context, id, reader);
    if (!cold) return reader.outcome();
    const { occupancy } = context.drawing.site;
    const [dwelling, building] = [context.limit("dwelling"), context.limit("building")];
    const limitV = occupancy === null ? Math.min(dwelling, building) : occupancy === "one- or two-family dwelling" ? dwelling : building;
    if (cold.value <= limitV + 1e-9) return PASS;
    // Only a voltage between the two limits waits for the occupancy, only one above for the place of the array.
    if (occupancy === null && cold.value <= Math.max(dwelling, building)) reader.ask(equipmentRef(id), "site.occupancy", "occupancy of the building");
    if (on === null) reader.ask(equipmentRef(id), "props.mounting", "mounting of the array");
    if (!reader.complete) return reader.outcome();
    const anchor = circuitRef(run.circuit);
    return found({
      variant: "above-cap", anchor, related: [id, ...(run.inverter ? [run.inverter] : [])].map(equipmentRef),
      message: `${nameOf(context, anchor)} reaches ${cold.value.toFixed(1)} V; ${limitV} V is the limit on or in this building.`,
      steps: [...cold.steps, comparison("Vmax", cold.value, limitV, "V", false, 1)],
    });
  },
  suggest: (finding, context) => {
    const string = finding.related[0]?.id;
    const dwelling = context.drawing.site.occupancy === "one- or two-family dwelling";
    const most = string === undefined ? 0 : coldVoltage(context, string, new Reader(context), context.limit(dwelling ? "dwelling" : "building"))?.detail.largestModuleCount ?? 0;
    return string === undefined || most < 1 ? [] : [{ label: `Use ${most} modules in series`, also: "Check the hot operating voltage and the number of strings.", patches: [{ op: "replace", path: `/equipment/${string}/props/modules`, value: most }] }];
  },
  examples: { violates: "640 V on the roof of a dwelling.", passes: "522 V." },
};
