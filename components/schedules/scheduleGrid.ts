import { circuitEnd, tagOf } from "@/lib/client/describe";
import { readNumber, readProperty, showValue } from "@/lib/client/readField";
import type { Command } from "@/lib/diagram/commands";
import { stretchesOf, type DrawingGraph } from "@/lib/diagram/graph";
import { INSULATIONS, RACEWAY_TYPES, type Circuit, type Conductor, type ElementRef, type Equipment, type Raceway, type Section } from "@/lib/diagram/schema";
import { KIND_IDS, kindDefinition } from "@/lib/equipment/registry";
import { CONDUCTOR_SIZES, parseConductorSize, QuantityError, TRADE_SIZES } from "@/lib/units";
import type { GridColumn } from "./gridTypes";

/** One line of a schedule: an element, or one section of a circuit. */
export interface ScheduleRow { readonly key: string; readonly ref: ElementRef; readonly tag: string; readonly section: string | null }
export type CellAnswer = { readonly commands: readonly Command[] } | { readonly reason: string };
export interface ScheduleGrid {
  readonly label: string;
  readonly columns: readonly GridColumn<ScheduleRow>[];
  readonly rows: readonly ScheduleRow[];
  /** Fields of the element that a column shows, as findings name them. */
  readonly fieldsOf: (row: ScheduleRow, column: string) => readonly string[];
  readonly command: (row: ScheduleRow, column: string, text: string) => CellAnswer;
}

interface ColumnPlan extends Omit<GridColumn<ScheduleRow>, "editable" | "unit" | "right"> {
  readonly unit?: string;
  readonly right?: boolean;
  readonly fields: (row: ScheduleRow) => readonly string[];
  /** Absent where the cell is worked out from the drawing. */
  readonly write?: (row: ScheduleRow, text: string) => CellAnswer;
  readonly when?: (row: ScheduleRow) => boolean;
}
const byTag = (a: ScheduleRow, b: ScheduleRow): number => a.tag.localeCompare(b.tag, "en", { numeric: true }) || (a.key < b.key ? -1 : 1);
const finish = (label: string, plans: readonly ColumnPlan[], rows: readonly ScheduleRow[]): ScheduleGrid => {
  const plan = new Map(plans.map((each) => [each.id, each]));
  return {
    label, rows,
    columns: plans.map((each) => ({ ...each, unit: each.unit ?? "", right: each.right ?? false, editable: (row) => each.write !== undefined && (each.when?.(row) ?? true) })),
    fieldsOf: (row, column) => plan.get(column)?.fields(row) ?? [],
    command: (row, column, text) => plan.get(column)?.write?.(row, text) ?? { reason: "it is worked out from the drawing" },
  };
};
const one = (command: Command): CellAnswer => ({ commands: [command] });
const tagColumn = (label: string, width = 84): ColumnPlan => ({
  id: "tag", label, group: "", width, text: (row) => row.tag, fields: () => ["tag"],
  write: (row, text) => (text.trim() === "" ? { reason: "a tag is needed" } : one({ type: "setTag", ref: row.ref, tag: text.trim() })),
});
const choose = <T extends string>(text: string, options: readonly T[]): T | null | undefined => (text.trim() === "" ? null : options.find((each) => each.toLowerCase() === text.trim().toLowerCase()));

/** Equipment: tag, kind, and every rated value of the kinds on the sheet, each a column that is empty where a kind has none. */
export function equipmentGrid(graph: DrawingGraph): ScheduleGrid {
  const { equipment } = graph.drawing;
  const of = (row: ScheduleRow): Equipment => equipment[row.ref.id] as Equipment;
  const kinds = new Set(Object.values(equipment).map((each) => each.kind));
  // Columns in the order in which kinds name them; the same property of two kinds shares one.
  const names = [...new Set(KIND_IDS.filter((kind) => kinds.has(kind)).flatMap((kind) => kindDefinition(kind).scheduleFields))];
  const property = (row: ScheduleRow, name: string) => graph.kind(row.ref.id).properties[name];
  const plans = names.map((name): ColumnPlan => {
    const sample = KIND_IDS.filter((kind) => kinds.has(kind)).map((kind) => kindDefinition(kind).properties[name]).find(Boolean);
    return {
      id: name, label: sample?.label ?? name, unit: sample?.type === "number" ? sample.unit : "", group: sample?.group === "rating" ? "Ratings" : "Construction and settings", width: sample?.type === "number" ? 92 : 118, right: sample?.type === "number",
      text: (row) => (property(row, name) ? showValue(of(row).props[name]) : ""), fields: () => [`props.${name}`], when: (row) => property(row, name) !== undefined,
      ...(sample?.type === "choice" ? { options: sample.options } : sample?.type === "flag" ? { options: ["yes", "no"] } : {}),
      write: (row, text) => {
        const described = property(row, name);
        if (!described) return { reason: "this kind has no such value" };
        const answer = readProperty(text, described);
        return answer.ok ? one({ type: "setProperty", id: row.ref.id, name, value: answer.value }) : answer;
      },
    };
  });
  const rows = Object.keys(equipment).map((id): ScheduleRow => ({ key: id, ref: { collection: "equipment", id }, tag: equipment[id]?.tag ?? "", section: null })).sort(byTag);
  return finish("Equipment schedule", [
    tagColumn("Tag"),
    { id: "kind", label: "Kind", group: "Equipment", width: 150, text: (row) => graph.kind(row.ref.id).title, fields: () => [] },
    { id: "parent", label: "Stands in", group: "Equipment", width: 84, text: (row) => { const { parent } = of(row); return parent ? tagOf(graph, { collection: "equipment", id: parent }) : ""; }, fields: () => [] },
    ...[...plans].sort((a, b) => Number(b.group === "Ratings") - Number(a.group === "Ratings")),
  ], rows);
}

/** Conductors: one line a section of every field circuit. */
export function conductorGrid(graph: DrawingGraph): ScheduleGrid {
  const { circuits, raceways } = graph.drawing;
  const circuit = (row: ScheduleRow): Circuit => circuits[row.ref.id] as Circuit;
  const section = (row: ScheduleRow): Section => circuit(row).sections[row.section ?? ""] as Section;
  const set = (row: ScheduleRow, change: Partial<Section>): CellAnswer => one({ type: "setSection", circuit: row.ref.id, section: row.section ?? "", change });
  const empty: Conductor = { count: 1, size: null, metal: "Cu", insulation: "THWN-2", strands: null, outerDiameterIn: null, voltageRatingV: null, color: null };
  const power = (row: ScheduleRow): boolean => circuit(row).system !== "data";
  type Role = "ungrounded" | "grounded" | "equipmentGround";
  const size = (role: Role, label: string): ColumnPlan => ({
    id: role, label, group: "Conductors", width: 84, options: CONDUCTOR_SIZES, when: power, text: (row) => section(row)[role]?.size ?? "", fields: (row) => [`sections.${row.section}.${role}.size`, `sections.${row.section}.${role}`],
    write: (row, text) => {
      if (text.trim() === "") return set(row, { [role]: section(row)[role] ? { ...(section(row)[role] as Conductor), size: null } : null });
      try {
        return set(row, { [role]: { ...empty, ...section(row)[role], size: parseConductorSize(text.trim()) } });
      } catch (error) {
        return { reason: error instanceof QuantityError ? error.message : "write a size as 8 AWG, 1/0 AWG or 250 kcmil" };
      }
    },
  });
  const plans: ColumnPlan[] = [
    tagColumn("Ckt", 64),
    { id: "from", label: "From", group: "Run", width: 140, text: (row) => circuitEnd(graph, row.ref.id, "from"), fields: () => [] },
    { id: "to", label: "To", group: "Run", width: 140, text: (row) => circuitEnd(graph, row.ref.id, "to"), fields: () => [] },
    {
      id: "count", label: "No.", group: "Conductors", width: 44, right: true, when: power, text: (row) => String((section(row).ungrounded?.count ?? 0) + (section(row).grounded?.count ?? 0)), fields: () => [],
    },
    size("ungrounded", "Size"), size("grounded", "Neutral"), size("equipmentGround", "EGC"),
    {
      id: "insulation", label: "Type", group: "Conductors", width: 78, options: INSULATIONS, text: (row) => (power(row) ? section(row).ungrounded?.insulation ?? section(row).equipmentGround?.insulation ?? "" : section(row).cable?.type ?? ""), fields: (row) => [`sections.${row.section}.ungrounded.insulation`],
      when: (row) => power(row) && section(row).ungrounded !== null,
      write: (row, text) => { const value = choose(text, INSULATIONS); return value === undefined ? { reason: `choose ${INSULATIONS.join(", ")}` } : set(row, { ungrounded: { ...(section(row).ungrounded as Conductor), insulation: value } }); },
    },
    {
      id: "metal", label: "Metal", group: "Conductors", width: 52, options: ["Cu", "Al"], when: (row) => power(row) && section(row).ungrounded !== null, text: (row) => section(row).ungrounded?.metal ?? "", fields: (row) => [`sections.${row.section}.ungrounded.metal`],
      write: (row, text) => { const value = choose(text, ["Cu", "Al"] as const); return value === undefined ? { reason: "choose Cu or Al" } : set(row, { ungrounded: { ...(section(row).ungrounded as Conductor), metal: value } }); },
    },
    { id: "route", label: "Route", group: "Raceway", width: 150, text: (row) => section(row).route.map((step) => raceways[step.raceway]?.tag ?? "?").join(" "), fields: (row) => [`sections.${row.section}.route`] },
    {
      id: "lengthFt", label: "Length", unit: "ft", group: "Raceway", width: 70, right: true, text: (row) => showValue(section(row).lengthFt), fields: (row) => [`sections.${row.section}.lengthFt`],
      write: (row, text) => { const answer = readNumber(text, "ft", 0, 20000); return answer.ok ? set(row, { lengthFt: answer.value as number | null }) : answer; },
    },
  ];
  const rows = Object.entries(circuits).filter(([, each]) => each.wiring === "field").flatMap(([id, each]) => graph.sections(id).map((part): ScheduleRow => ({ key: `${id}/${part.id}`, ref: { collection: "circuits", id }, tag: each.tag, section: part.id }))).sort(byTag);
  return finish("Conductor schedule", plans, rows);
}

/** Raceways: type, size, length and what lies inside. */
export function racewayGrid(graph: DrawingGraph): ScheduleGrid {
  const { raceways } = graph.drawing;
  const of = (row: ScheduleRow): Raceway => raceways[row.ref.id] as Raceway;
  const tube = (row: ScheduleRow): boolean => of(row).kind === "conduit" || of(row).kind === "nipple";
  const set = (row: ScheduleRow, change: Partial<Raceway>): CellAnswer => one({ type: "setRaceway", id: row.ref.id, change });
  const inches = (id: "widthIn" | "heightIn", label: string): ColumnPlan => ({
    id, label, unit: "in", group: "Construction", width: 70, right: true, when: (row) => !tube(row), text: (row) => showValue(of(row)[id]), fields: () => [id],
    write: (row, text) => { const answer = readNumber(text, "in", 0.5, 96); return answer.ok ? set(row, { [id]: answer.value }) : answer; },
  });
  const plans: ColumnPlan[] = [
    tagColumn("Tag"),
    { id: "kind", label: "Kind", group: "Construction", width: 84, text: (row) => of(row).kind, fields: () => ["kind"] },
    { id: "type", label: "Type", group: "Construction", width: 78, options: RACEWAY_TYPES, when: tube, text: (row) => of(row).type ?? "", fields: () => ["type"], write: (row, text) => { const value = choose(text, RACEWAY_TYPES); return value === undefined ? { reason: `choose ${RACEWAY_TYPES.join(", ")}` } : set(row, { type: value }); } },
    { id: "tradeSize", label: "Trade size", unit: "in", group: "Construction", width: 84, right: true, options: TRADE_SIZES, when: tube, text: (row) => of(row).tradeSize ?? "", fields: () => ["tradeSize"], write: (row, text) => { const value = choose(text.replace(/\s*(in|")$/i, ""), TRADE_SIZES); return value === undefined ? { reason: `choose ${TRADE_SIZES.join(", ")}` } : set(row, { tradeSize: value }); } },
    inches("widthIn", "Width"), inches("heightIn", "Height"),
    {
      id: "lengthFt", label: "Length", unit: "ft", group: "Run", width: 70, right: true, when: (row) => stretchesOf(of(row)).length === 1, fields: (row) => stretchesOf(of(row)).map((stretch) => `stretches.${stretch.id}.lengthFt`),
      text: (row) => { const lengths = stretchesOf(of(row)).map((stretch) => stretch.lengthFt); return lengths.some((each) => each === null) ? "" : showValue(Number(lengths.reduce<number>((sum, each) => sum + (each ?? 0), 0).toFixed(2))); },
      write: (row, text) => { const answer = readNumber(text, "ft", 0, 20000); const stretch = stretchesOf(of(row))[0]?.id; return !answer.ok ? answer : stretch ? one({ type: "setStretch", raceway: row.ref.id, stretch, change: { lengthFt: answer.value as number | null } }) : { reason: "it has no stretch" }; },
    },
    { id: "from", label: "From", group: "Run", width: 96, text: (row) => endTag(graph, of(row).from), fields: () => ["from"] },
    { id: "to", label: "To", group: "Run", width: 96, text: (row) => endTag(graph, of(row).to), fields: () => ["to"] },
    { id: "inside", label: "Circuits inside", group: "Run", width: 220, text: (row) => [...new Set(Object.keys(graph.drawing.circuits).filter((id) => graph.racewaysOf(id).some((step) => step.raceway === row.ref.id)))].map((id) => tagOf(graph, { collection: "circuits", id })).join(" "), fields: () => [] },
  ];
  const rows = Object.keys(raceways).map((id): ScheduleRow => ({ key: id, ref: { collection: "raceways", id }, tag: raceways[id]?.tag ?? "", section: null })).sort(byTag);
  return finish("Raceway schedule", plans, rows);
}
const endTag = (graph: DrawingGraph, id: string | null): string => (id === null ? "" : tagOf(graph, { collection: Object.hasOwn(graph.drawing.equipment, id) ? "equipment" : "raceways", id }));
