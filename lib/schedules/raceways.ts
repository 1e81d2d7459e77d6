import { stretchesOf, type DrawingGraph } from "@/lib/diagram/graph";
import { RACEWAY_TYPES, type Raceway } from "@/lib/diagram/schema";
import { racewayLengthFt } from "@/lib/rules/shared/raceways";
import { formatNumber, TRADE_SIZES } from "@/lib/units";
import { choose, figure, one, schedule, tagColumn, tagOf, type ColumnPlan } from "./columns";
import { racewayFigures } from "./racewayFigures";
import { readNumber } from "./readField";
import type { CellAnswer, Schedule, ScheduleRow } from "./types";

/** Raceways: kind, size and run, what lies inside, and how full that makes them. */
export function racewaySchedule(graph: DrawingGraph): Schedule {
  const { circuits, equipment, raceways } = graph.drawing;
  const of = (row: ScheduleRow): Raceway => raceways[row.ref.id] as Raceway;
  const tube = (row: ScheduleRow): boolean => of(row).kind === "conduit" || of(row).kind === "nipple";
  const set = (row: ScheduleRow, change: Partial<Raceway>): CellAnswer => one({ type: "setRaceway", id: row.ref.id, change });
  const length = (row: ScheduleRow): number | null => (of(row).kind === "box" ? null : racewayLengthFt(of(row)));
  const inches = (id: "widthIn" | "heightIn" | "depthIn", label: string): ColumnPlan => ({
    id, label, unit: "in", group: "Construction", width: 70, right: true, when: (row) => !tube(row), value: (row) => of(row)[id], fields: () => [id],
    write: (row, text) => { const answer = readNumber(text, "in", 0.5, 96); return answer.ok ? set(row, { [id]: answer.value }) : answer; },
  });
  const end = (id: "from" | "to", label: string): ColumnPlan => ({
    id, label, group: "Run", width: 96, value: (row) => tagOf(graph, of(row)[id]) || null, fields: () => [id],
    write: (row, text) => {
      const tag = text.trim().toLowerCase();
      if (tag === "") return set(row, { [id]: null });
      const found = [...Object.entries(equipment), ...Object.entries(raceways)].filter(([key, each]) => each.tag.toLowerCase() === tag && key !== row.ref.id);
      return found.length === 1 ? set(row, { [id]: found[0]?.[0] ?? null }) : { reason: found.length > 1 ? `more than one element is tagged ${text.trim()}` : `nothing else is tagged ${text.trim()}` };
    },
  });
  const plans: ColumnPlan[] = [
    tagColumn("Tag"),
    { id: "kind", label: "Kind", group: "Construction", width: 84, value: (row) => of(row).kind, fields: () => ["kind"] },
    {
      id: "type", label: "Type", group: "Construction", width: 78, options: RACEWAY_TYPES, when: tube, value: (row) => of(row).type, fields: () => ["type"],
      write: (row, text) => { const value = choose(text, RACEWAY_TYPES); return value === undefined ? { reason: `choose ${RACEWAY_TYPES.join(", ")}` } : set(row, { type: value }); },
    },
    {
      id: "tradeSize", label: "Trade size", unit: "in", group: "Construction", width: 84, right: true, options: TRADE_SIZES, when: tube, value: (row) => of(row).tradeSize, fields: () => ["tradeSize"],
      write: (row, text) => { const value = choose(text.replace(/\s*(in|")\s*$/i, ""), TRADE_SIZES); return value === undefined ? { reason: `choose ${TRADE_SIZES.join(", ")}` } : set(row, { tradeSize: value }); },
    },
    inches("widthIn", "Width"), inches("heightIn", "Height"), inches("depthIn", "Length inside"),
    {
      id: "lengthFt", label: "Length", unit: "ft", group: "Run", width: 70, right: true, when: (row) => of(row).kind !== "box" && stretchesOf(of(row)).length === 1, fields: (row) => stretchesOf(of(row)).map((stretch) => `stretches.${stretch.id}.lengthFt`),
      value: length, print: (row) => { const lengthFt = length(row); return lengthFt === null ? "" : formatNumber(lengthFt, 2); },
      write: (row, text) => {
        const answer = readNumber(text, "ft", 0, 20000);
        const stretch = stretchesOf(of(row))[0]?.id;
        if (!answer.ok) return answer;
        return stretch ? one({ type: "setStretch", raceway: row.ref.id, stretch, change: { lengthFt: answer.value as number | null } }) : { reason: "it has no stretch" };
      },
    },
    {
      id: "bendsDegrees", label: "Bends", unit: "°", group: "Run", width: 62, right: true, when: tube, value: (row) => of(row).bendsDegrees, fields: () => ["bendsDegrees"],
      write: (row, text) => { const answer = readNumber(text, "°", 0, 3600); return answer.ok ? set(row, { bendsDegrees: answer.value as number | null }) : answer; },
    },
    end("from", "From"), end("to", "To"),
    {
      id: "inside", label: "Circuits inside", group: "Fill", width: 200,
      value: (row) => [...new Set(graph.occupants(row.ref.id).map((each) => each.circuit))].map((id) => circuits[id]?.tag || "circuit").sort((a, b) => a.localeCompare(b, "en", { numeric: true })).join(" ") || null,
    },
    figure("currentCarrying", "Carrying", "", "Fill", 0, (row) => racewayFigures(graph, row.ref.id).currentCarrying),
    figure("usedIn2", "Used", "in²", "Fill", 3, (row) => racewayFigures(graph, row.ref.id).usedIn2),
    figure("fillPct", "Fill", "%", "Fill", 1, (row) => racewayFigures(graph, row.ref.id).fillPct),
    figure("limitPct", "Limit", "%", "Fill", 0, (row) => racewayFigures(graph, row.ref.id).limitPct),
    figure("roomLeftIn2", "Room left", "in²", "Fill", 3, (row) => racewayFigures(graph, row.ref.id).roomLeftIn2, 78),
  ];
  const rows = Object.keys(raceways).map((id): ScheduleRow => ({ key: id, ref: { collection: "raceways", id }, tag: raceways[id]?.tag ?? "", section: null }));
  return schedule("Raceway schedule", plans, rows);
}
