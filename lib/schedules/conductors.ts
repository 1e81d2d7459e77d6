import type { Command } from "@/lib/diagram/commands";
import type { DrawingGraph } from "@/lib/diagram/graph";
import { INSULATIONS, type Circuit, type Conductor, type Section } from "@/lib/diagram/schema";
import { CONDUCTOR_SIZES, parseConductorSize, QuantityError } from "@/lib/units";
import { circuitFigures, sectionFigures } from "./circuitFigures";
import { choose, figure, landing, one, schedule, tagColumn, type ColumnPlan } from "./columns";
import { readNumber } from "./readField";
import type { CellAnswer, Schedule, ScheduleRow } from "./types";

type Role = "ungrounded" | "grounded" | "equipmentGround";
const ROLES: readonly Role[] = ["ungrounded", "grounded", "equipmentGround"];
const FRESH: Conductor = { count: 1, size: null, metal: "Cu", insulation: "THWN-2", strands: "class B", outerDiameterIn: null, voltageRatingV: 600, color: null };

/** Conductors as the trade writes them: `3 × 1 AWG + 6 AWG G`, neutrals among the first number where they have the same size. */
export function conductorText(section: Section): string {
  const { ungrounded, grounded, equipmentGround, cable, parallelSets } = section;
  if (cable) return `${cable.count > 1 ? `${cable.count} × ` : ""}${cable.type}`;
  const alike = grounded !== null && grounded.size === ungrounded?.size;
  const groups = [
    ungrounded && ungrounded.count > 0 ? `${ungrounded.count + (alike ? grounded.count : 0)} × ${ungrounded.size ?? "?"}` : "",
    grounded && !alike && grounded.count > 0 ? `${grounded.count} × ${grounded.size ?? "?"} N` : "",
    equipmentGround && equipmentGround.count > 0 ? `${equipmentGround.count > 1 ? `${equipmentGround.count} × ` : ""}${equipmentGround.size ?? "?"} G` : "",
  ].filter(Boolean).join(" + ");
  return parallelSets > 1 ? `${parallelSets} sets of ${groups}` : groups;
}

/** Conductors: one line a section of every field circuit, with what the drawing gives for load, ampacity and drop. */
export function conductorSchedule(graph: DrawingGraph): Schedule {
  const { circuits } = graph.drawing;
  const circuit = (row: ScheduleRow): Circuit => circuits[row.ref.id] as Circuit;
  const section = (row: ScheduleRow): Section => circuit(row).sections[row.section ?? ""] as Section;
  const set = (row: ScheduleRow, change: Partial<Section>): CellAnswer => one({ type: "setSection", circuit: row.ref.id, section: row.section ?? "", change });
  const power = (row: ScheduleRow): boolean => circuit(row).system !== "data";
  const lines = (row: ScheduleRow): boolean => power(row) && section(row).ungrounded !== null;
  const first = (row: ScheduleRow): boolean => graph.sections(row.ref.id)[0]?.id === row.section;
  /** Single fields, so that two people at the wires of one circuit do not meet. */
  const field = (row: ScheduleRow, role: Role, name: string, value: unknown): Command =>
    ({ type: "setField", ref: row.ref, path: ["sections", row.section ?? "", role, name], value });
  /** Wires bought as one change together: those that had the same value as the ungrounded conductors. */
  const together = (row: ScheduleRow, key: "insulation" | "metal", value: string | null): CellAnswer => {
    const before = section(row).ungrounded?.[key];
    return { commands: ROLES.filter((role) => section(row)[role] && (role === "ungrounded" || section(row)[role]?.[key] === before)).map((role) => field(row, role, key, value)) };
  };
  const resize = (row: ScheduleRow, role: Role, to: string | null): CellAnswer => {
    const now = section(row)[role];
    if (!now) return set(row, { [role]: to === null ? null : { ...FRESH, size: to } });
    // A measured diameter belongs to the old wire.
    return { commands: [field(row, role, "size", to), ...(to !== now.size && now.outerDiameterIn !== null ? [field(row, role, "outerDiameterIn", null)] : [])] };
  };
  const size = (role: Role, label: string): ColumnPlan => ({
    id: role, label, group: "Conductors", width: 84, options: CONDUCTOR_SIZES, screenOnly: true, when: (row) => role !== "ungrounded" ? power(row) : power(row) && circuit(row).system !== "ground",
    value: (row) => section(row)[role]?.size ?? null, fields: (row) => [`sections.${row.section}.${role}.size`, `sections.${row.section}.${role}`],
    write: (row, text) => {
      if (text.trim() === "") return resize(row, role, null);
      try {
        return resize(row, role, parseConductorSize(text.trim()));
      } catch (error) {
        if (error instanceof QuantityError) return { reason: "write a size as 8 AWG, 1/0 AWG or 250 kcmil" };
        throw error;
      }
    },
  });
  const whole = (id: string, label: string, unit: string, group: string, decimals: number, key: "loadA" | "requiredA" | "deviceA" | "dropPct"): ColumnPlan =>
    figure(id, label, unit, group, decimals, (row) => (first(row) ? circuitFigures(graph, row.ref.id)[key] : null));
  const plans: ColumnPlan[] = [
    tagColumn("Ckt", 64),
    { id: "from", label: "From", group: "Run", width: 140, value: (row) => landing(graph, row.ref.id, "from") },
    { id: "to", label: "To", group: "Run", width: 140, value: (row) => landing(graph, row.ref.id, "to") },
    { id: "conductors", label: "Conductors", group: "Conductors", width: 150, value: (row) => conductorText(section(row)), fields: (row) => [`sections.${row.section}.parallelSets`, `sections.${row.section}.cable`] },
    {
      id: "sets", label: "Sets", group: "Conductors", width: 48, right: true, screenOnly: true, when: power, value: (row) => section(row).parallelSets, fields: (row) => [`sections.${row.section}.parallelSets`],
      write: (row, text) => { const answer = readNumber(text, "", 1, 12, true); return answer.ok ? (typeof answer.value === "number" ? set(row, { parallelSets: answer.value }) : { reason: "write 1 to 12" }) : answer; },
    },
    size("ungrounded", "Size"), size("grounded", "Neutral"), size("equipmentGround", "EGC"),
    {
      id: "insulation", label: "Type", group: "Conductors", width: 78, options: INSULATIONS, when: lines, fields: (row) => [`sections.${row.section}.ungrounded.insulation`],
      value: (row) => (power(row) ? section(row).ungrounded?.insulation ?? section(row).equipmentGround?.insulation ?? null : null),
      write: (row, text) => { const value = choose(text, INSULATIONS); return value === undefined ? { reason: `choose ${INSULATIONS.join(", ")}` } : together(row, "insulation", value); },
    },
    {
      id: "metal", label: "Metal", group: "Conductors", width: 52, options: ["Cu", "Al"], when: lines, value: (row) => section(row).ungrounded?.metal ?? section(row).equipmentGround?.metal ?? null, fields: (row) => [`sections.${row.section}.ungrounded.metal`],
      write: (row, text) => { const value = choose(text, ["Cu", "Al"] as const); return value === undefined ? { reason: "choose Cu or Al" } : together(row, "metal", value); },
    },
    routeColumn(graph, section, set),
    {
      id: "lengthFt", label: "Length", unit: "ft", group: "Raceway", width: 70, right: true, value: (row) => section(row).lengthFt, fields: (row) => [`sections.${row.section}.lengthFt`],
      write: (row, text) => { const answer = readNumber(text, "ft", 0, 20000); return answer.ok ? set(row, { lengthFt: answer.value as number | null }) : answer; },
    },
    whole("loadA", "Load", "A", "Load and device", 2, "loadA"), whole("requiredA", "Required", "A", "Load and device", 2, "requiredA"), whole("deviceA", "Device", "A", "Load and device", 1, "deviceA"),
    figure("terminalC", "Terminals", "°C", "Ampacity", 0, (row) => (sectionFigures(graph, row.ref.id, row.section ?? "").terminalA === null ? null : circuitFigures(graph, row.ref.id).terminalC)),
    figure("terminalA", "At terminals", "A", "Ampacity", 1, (row) => sectionFigures(graph, row.ref.id, row.section ?? "").terminalA, 84),
    figure("correctedA", "Corrected", "A", "Ampacity", 2, (row) => sectionFigures(graph, row.ref.id, row.section ?? "").correctedA, 84),
    figure("usableA", "Usable", "A", "Ampacity", 2, (row) => sectionFigures(graph, row.ref.id, row.section ?? "").usableA),
    whole("dropPct", "Drop", "%", "Drop", 2, "dropPct"),
  ];
  const rows = Object.entries(circuits).filter(([, each]) => each.wiring === "field")
    .flatMap(([id, each]) => graph.sections(id).map((part): ScheduleRow => ({ key: `${id}/${part.id}`, ref: { collection: "circuits", id }, tag: each.tag, section: part.id })));
  return schedule("Conductor schedule", plans, rows);
}

/** Raceways in order, written by their tags; a compartment follows its raceway after a colon. */
function routeColumn(graph: DrawingGraph, section: (row: ScheduleRow) => Section, set: (row: ScheduleRow, change: Partial<Section>) => CellAnswer): ColumnPlan {
  const { raceways } = graph.drawing;
  const named = (raceway: string, compartment: string | null): string => {
    const inside = raceways[raceway]?.compartments ?? {};
    return `${raceways[raceway]?.tag ?? "?"}${compartment !== null && Object.keys(inside).length > 1 ? `:${inside[compartment]?.name ?? "?"}` : ""}`;
  };
  return {
    id: "route", label: "Route", group: "Raceway", width: 150, fields: (row) => [`sections.${row.section}.route`],
    value: (row) => section(row).route.map((step) => named(step.raceway, step.compartment)).join(" ") || null,
    write: (row, text) => {
      const route: Section["route"] = [];
      for (const word of text.split(/[\s,;]+/).filter(Boolean)) {
        const [tag = "", name] = word.split(":");
        const found = Object.entries(raceways).filter(([, each]) => each.tag.toLowerCase() === tag.toLowerCase());
        const [match] = found;
        if (!match || found.length > 1) return { reason: found.length > 1 ? `more than one raceway is tagged ${tag}` : `no raceway is tagged ${tag}` };
        const compartments = Object.entries(match[1].compartments).sort(([, a], [, b]) => a.order - b.order);
        const compartment = compartments.length === 1 ? compartments[0]?.[0] ?? null : compartments.find(([, each]) => each.name.toLowerCase() === name?.toLowerCase())?.[0] ?? null;
        if (compartments.length > 1 && compartment === null) return { reason: `${match[1].tag} has compartments ${compartments.map(([, each]) => each.name).join(", ")}: write ${match[1].tag}:${compartments[0]?.[1].name ?? ""}` };
        if (route.some((step) => step.raceway === match[0])) return { reason: `${match[1].tag} is written twice` };
        route.push({ raceway: match[0], compartment });
      }
      return set(row, { route });
    },
  };
}
