import type { DrawingGraph } from "@/lib/diagram/graph";
import type { OperatingState, StateGroup, StateSpace } from "@/lib/states/types";
import { checkContext } from "@/lib/rules/engine/context";
import { busChecks } from "@/lib/rules/interconnection/busbar-no-method";
import type { SheetContext } from "./context";
import { fitColumns, type Table } from "./table";

const GROUPS: readonly (readonly [StateGroup, string])[] = [["utility", "UTILITY"], ["island", "ISLAND"], ["generator", "GENERATOR"], ["off", "OFF"]];
/** Switches shown as columns at most; the ones that interlocks or a control hold come first. */
const MOST_SWITCHES = 6;

const tag = (graph: DrawingGraph, id: string): string => graph.drawing.equipment[id]?.tag ?? id;
const closedIn = (state: OperatingState, id: string): boolean => state.closed.some((each) => each === id || each.startsWith(`${id}:`));

/** Switches worth a column: held by an interlock or a control; without any, the walked ones. */
function columnsOf(graph: DrawingGraph, space: StateSpace): string[] {
  const held = new Set([...Object.values(graph.drawing.interlocks).flatMap((each) => Object.keys(each.switches)), ...space.walked.filter((id) => graph.kind(id).capabilities.switching === "contactor")]);
  const first = space.walked.filter((id) => held.has(id));
  return (first.length ? first : space.walked).slice(0, MOST_SWITCHES);
}

/** CLOSED, OPEN, or ANY where both occur among the states of a group. */
function position(states: readonly OperatingState[], id: string): string {
  const closed = states.filter((state) => closedIn(state, id)).length;
  return closed === 0 ? "OPEN" : closed === states.length ? "CLOSED" : "ANY";
}

/** Joints in force at once on any neutral that is live in a group: `1, MBJ`, or a span where it differs. */
function bonds(graph: DrawingGraph, states: readonly OperatingState[]): string {
  const groups = states.flatMap((state) => state.islands.filter((island) => island.hasNeutral).map((island) => island.bondGroups));
  if (groups.length === 0) return "NO NEUTRAL";
  const counts = groups.map((each) => each.length);
  const least = Math.min(...counts), most = Math.max(...counts);
  const names = [...new Set(groups.flat(2))].sort().map((id) => graph.drawing.bonds[id]?.tag ?? id);
  return `${least === most ? most : `${least} TO ${most}`}${names.length ? `, ${names.slice(0, 2).join(", ")}` : ""}`;
}

/** Operating states by group, over all switch positions that may occur. Null when the drawing has no states. */
export function statesTable(graph: DrawingGraph, space: StateSpace): Table | null {
  const switches = columnsOf(graph, space);
  const rows = GROUPS.flatMap(([group, name]) => {
    const states = space.allowed.filter((state) => state.group === group);
    if (states.length === 0) return [];
    // Converters run with the sources of their own island; what is live elsewhere does not make the state.
    const islands = states.flatMap((state) => state.islands.filter((island) => island.converters.length > 0));
    const sources = [...new Set(islands.flatMap((island) => island.sources))].sort().map((id) => tag(graph, id));
    return [[name, ...switches.map((id) => position(states, id)), group === "off" ? "-" : sources.join(", ") || "NONE", group === "off" ? "-" : bonds(graph, states)]];
  });
  if (rows.length === 0) return null;
  const heads = [{ head: "STATE" }, ...switches.map((id) => ({ head: tag(graph, id) })), { head: "INVERTERS RUN WITH" }, { head: "N-G BONDS" }];
  return { title: "STATES", columns: fitColumns(heads, rows, 150), rows };
}

/** Interlocks with the switches they tie and what they do. Null without any. */
export function interlocksTable(graph: DrawingGraph): Table | null {
  const rows = Object.keys(graph.drawing.interlocks).sort().flatMap((id) => {
    const each = graph.drawing.interlocks[id];
    if (!each) return [];
    const switches = Object.keys(each.switches).sort().map((one) => tag(graph, one));
    const kind = `${each.kind}${each.listed === true ? ", LISTED" : each.listed === false ? ", NOT LISTED" : ""}`;
    return [[each.tag, switches.join(" AND "), kind, each.note || "ONE CLOSED AT MOST"]];
  });
  if (rows.length === 0) return null;
  return { title: "INTERLOCKS", columns: fitColumns([{ head: "LOCK" }, { head: "BETWEEN" }, { head: "KIND" }, { head: "EFFECT" }], rows, 210), rows };
}

const PATH_WORDS: Readonly<Record<string, string>> = {
  sum: "SUM", "opposite ends": "120 %", "all devices": "ALL DEVICES", "center-fed": "CENTER-FED", "power control": "POWER CONTROL", none: "NO PATH",
};
/** Busbars that several sources share: sum against limit on the path each passes by. Null without any that is worked out. */
export function busTable({ graph, states }: SheetContext): Table | null {
  const rows = busChecks(checkContext(graph, { states })).map((each) => [
    [tag(graph, each.bus), each.primary === "generator" ? "GEN" : "", PATH_WORDS[each.path] ?? each.path].filter(Boolean).join(" "), `${each.sumA.toFixed(2)} A`, `${Math.round(each.limitA * 100) / 100} A`,
  ]);
  if (rows.length === 0) return null;
  const heads = [{ head: "BUS, 705.12(B)" }, { head: "SUM", anchor: "end" as const }, { head: "LIMIT", anchor: "end" as const }];
  return { title: "BUS CHECKS", columns: fitColumns(heads, rows, 150), rows };
}
