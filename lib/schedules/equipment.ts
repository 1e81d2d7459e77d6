import { propertyFault } from "@/lib/diagram/check";
import type { DrawingGraph } from "@/lib/diagram/graph";
import { equipmentSchema, locationSchema, type Equipment } from "@/lib/diagram/schema";
import { kindDefinition, KIND_IDS } from "@/lib/equipment/registry";
import { choose, one, schedule, tagColumn, tagOf, type ColumnPlan } from "./columns";
import { readNumber, readProperty, showValue } from "./readField";
import type { CellValue, Schedule, ScheduleRow } from "./types";

const STATUS = equipmentSchema.shape.status.options;
const EXPOSURE = locationSchema.shape.exposure.unwrap().options;

/** Heading of a column that several kinds share: their words where they agree, else the words all of them end with (Trip rating, Continuous rating: Rating). */
function sharedLabel(labels: readonly string[]): string | undefined {
  const [first, ...others] = [...new Set(labels)].map((label) => label.toLowerCase().split(" "));
  if (!first || others.length === 0) return labels[0];
  let common = 0;
  while (common < first.length && others.every((each) => each.at(-1 - common) === first.at(-1 - common))) common += 1;
  const words = first.slice(first.length - common).join(" ");
  return words ? words.charAt(0).toUpperCase() + words.slice(1) : labels[0];
}

/** Equipment: tag, kind and place, and every value that the kinds on the sheet show, each a column that is empty where a kind has none. */
export function equipmentSchedule(graph: DrawingGraph): Schedule {
  const { equipment } = graph.drawing;
  const of = (row: ScheduleRow): Equipment => equipment[row.ref.id] as Equipment;
  const present = KIND_IDS.filter((kind) => Object.values(equipment).some((each) => each.kind === kind));
  const property = (row: ScheduleRow, name: string) => graph.kind(row.ref.id).properties[name];

  // Columns in the order in which kinds name them; the same property of two kinds shares one.
  const names = [...new Set(present.flatMap((kind) => kindDefinition(kind).scheduleFields))];
  const values = names.map((name): ColumnPlan => {
    const described = present.flatMap((kind) => kindDefinition(kind).properties[name] ?? []);
    const [sample] = described;
    const options = [...new Set(described.flatMap((each) => (each.type === "choice" ? each.options : each.type === "flag" ? ["yes", "no"] : [])))];
    const value = (row: ScheduleRow): CellValue => (property(row, name) ? of(row).props[name] ?? null : null);
    return {
      id: name, label: sharedLabel(described.map((each) => each.label)) ?? name, unit: sample?.type === "number" ? sample.unit : "", group: sample?.group === "rating" ? "Ratings" : "Construction and settings",
      width: sample?.type === "number" ? 92 : 118, right: sample?.type === "number", value, fields: () => [`props.${name}`], when: (row) => property(row, name) !== undefined,
      ...(options.length > 0 ? { options } : {}),
      write: (row, text) => {
        const wanted = property(row, name);
        if (!wanted) return { reason: "this kind has no such value" };
        const answer = readProperty(text, wanted);
        if (!answer.ok) return answer;
        const fault = propertyFault(wanted, answer.value);
        return fault ? { reason: fault } : one({ type: "setProperty", id: row.ref.id, name, value: answer.value });
      },
    };
  });
  const words = (field: "building" | "place", label: string): ColumnPlan => ({
    id: field, label, group: "Place", width: 130, value: (row) => of(row).location[field], fields: () => [`location.${field}`],
    write: (row, text) => (text.trim().length > 80 ? { reason: "at most 80 characters" } : one({ type: "setField", ref: row.ref, path: ["location", field], value: text.trim() || null })),
  });
  const place: ColumnPlan[] = [
    words("building", "Building"), words("place", "Place"),
    {
      id: "exposure", label: "Exposure", group: "Place", width: 92, options: EXPOSURE, value: (row) => of(row).location.exposure, fields: () => ["location.exposure"],
      write: (row, text) => { const value = choose(text, EXPOSURE); return value === undefined ? { reason: `choose ${EXPOSURE.join(", ")}` } : one({ type: "setField", ref: row.ref, path: ["location", "exposure"], value }); },
    },
    {
      id: "ambientC", label: "Ambient", unit: "°C", group: "Place", width: 72, right: true, value: (row) => of(row).location.ambientC, fields: () => ["location.ambientC"],
      write: (row, text) => { const answer = readNumber(text, "°C", -60, 120); return answer.ok ? one({ type: "setField", ref: row.ref, path: ["location", "ambientC"], value: answer.value }) : answer; },
    },
  ];
  // A sheet has no room for a column a value: there they follow one another, each with its name where the unit does not tell.
  const OWN_COLUMN = ["make", "model", "enclosureType", "listing"];
  const ratings: ColumnPlan = {
    id: "ratings", label: "Ratings and settings", group: "Ratings", width: 320,
    value: (row) => graph.kind(row.ref.id).scheduleFields.flatMap((name) => {
      const described = property(row, name);
      const value = of(row).props[name] ?? null;
      if (!described || value === null || OWN_COLUMN.includes(name)) return [];
      return [described.type === "number" || described.type === "flag" ? `${described.label.toLowerCase()} ${showValue(value)}${described.type === "number" && described.unit ? ` ${described.unit}` : ""}` : showValue(value)];
    }).join(", ") || null,
  };
  const rows = Object.keys(equipment).map((id): ScheduleRow => ({ key: id, ref: { collection: "equipment", id }, tag: equipment[id]?.tag ?? "", section: null }));
  return schedule("Equipment schedule", [
    tagColumn("Tag"),
    { id: "kind", label: "Kind", group: "Equipment", width: 150, value: (row) => graph.kind(row.ref.id).title },
    {
      id: "status", label: "Status", group: "Equipment", width: 78, options: STATUS, value: (row) => of(row).status, fields: () => ["status"],
      write: (row, text) => { const value = choose(text, STATUS); return value ? one({ type: "setField", ref: row.ref, path: ["status"], value }) : { reason: `choose ${STATUS.join(", ")}` }; },
    },
    { id: "parent", label: "Stands in", group: "Equipment", width: 84, value: (row) => tagOf(graph, of(row).parent) || null },
    ...values.filter((each) => each.group === "Ratings"), ...values.filter((each) => each.group !== "Ratings"), ...place,
  ], rows, ["tag", "kind", "status", "parent", "make", "model", ratings, "enclosureType", "listing", "building", "place", "ambientC"]);
}
