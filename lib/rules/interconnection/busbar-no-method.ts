import { busbarCheck, type BusbarPathName } from "@/lib/calc";
import { standardRatingAtMostA } from "@/lib/code";
import { equipmentOfNode, type ConductionEdge } from "@/lib/diagram/graph";
import { MUST_FIX_TO_2023, sections } from "@/lib/rules/engine/meta";
import type { CheckContext, FindingDraft, Outcome, Rule } from "@/lib/rules/engine/types";
import { carriedBy, outputA } from "@/lib/rules/shared/currents";
import { equipmentRef, found, nameOf, NOT_APPLICABLE, numberOf, PASS, Reader } from "@/lib/rules/shared/outcome";
import { topology } from "@/lib/rules/shared/topology";

/** One way off a bus: what it leads to and the first overcurrent device on it. */
interface Branch { edge: ConductionEdge; node: string; converters: readonly string[]; utilities: readonly string[]; generators: readonly string[]; device: string | null; loads: readonly string[] }

function branches(context: CheckContext, bus: string): readonly Branch[] {
  const top = topology(context.graph);
  const at = `${bus}/bus`;
  return context.graph.edgesAt(at).map((edge) => {
    const node = edge.a === at ? edge.b : edge.a;
    const beyond = top.beyond(node, edge);
    const inner = equipmentOfNode(node);
    const own = context.graph.edgesAt(node).some((each) => each.by === "switch" && each.id === inner) && top.ratingField(inner) !== null ? inner : null;
    const run = own === null ? top.runsFrom(node).find((each) => each.device !== null)?.device ?? deviceBehind(context, node, edge) : own;
    return { edge, node, device: run, converters: beyond.converters, utilities: beyond.utilities, generators: beyond.generators, loads: beyond.loads };
  });
}
/** First overcurrent device behind equipment that only passes the conductors on, such as a contactor. */
function deviceBehind(context: CheckContext, start: string, came: ConductionEdge): string | null {
  const top = topology(context.graph);
  const seen = new Set<ConductionEdge>([came]);
  for (let node = start, hops = 0; hops < 50; hops += 1) {
    const onward = context.graph.edgesAt(node).filter((edge) => !seen.has(edge) && edge.by !== "converter");
    const next = onward[0];
    if (!next || onward.length > 1) return null;
    if (next.by === "switch" && top.ratingField(next.id) !== null) return next.id;
    seen.add(next);
    node = next.a === node ? next.b : next.a;
    if (node.endsWith("/bus")) return null;
  }
  return null;
}

const rowOf = (spaces: readonly number[] | null, ends: string | null): number | null =>
  spaces === null ? null : spaces.length === 0 ? (ends === "bottom" ? Number.MAX_SAFE_INTEGER : 0) : Math.ceil((spaces[0] ?? 1) / 2);
/** Sources stand at the end of the bus away from its main: derived from the spaces, asked for where they are not known. */
function opposite(context: CheckContext, bus: string, main: string, sources: readonly string[], others: readonly string[], reader: Reader): boolean {
  const { drawing } = context;
  const ends = String(drawing.equipment[bus]?.props.busEnds ?? "");
  if (ends === "center") return false;
  const total = numberOf(context, bus, "spacesTotal");
  const rows = new Map([main, ...sources, ...others].map((id) => [id, rowOf(drawing.equipment[id]?.spaces ?? null, ends)] as const));
  const unknown = [main, ...sources].filter((id) => rows.get(id) === null);
  if (total === null) reader.number(bus, "spacesTotal");
  for (const id of unknown) reader.ask(equipmentRef(id), "spaces", `spaces of ${nameOf(context, equipmentRef(id))}`);
  if (total === null || unknown.length > 0) return false;
  const away = (id: string): number => Math.abs((rows.get(id) ?? 0) - (rows.get(main) ?? 0));
  const last = Math.ceil(total / 2);
  const farthest = Math.max(...sources.map(away));
  // A two-pole device takes two rows; its far pole is the one that reaches the end.
  const mainRow = rows.get(main) ?? 0;
  const reaches = sources.some((id) => (drawing.equipment[id]?.spaces ?? []).some((space) => Math.ceil(space / 2) === (mainRow <= last / 2 ? last : 1)));
  return reaches && farthest > 0 && others.every((id) => rows.get(id) === null || sources.every((source) => away(id) <= away(source)));
}

/** One bus with one primary source, worked out: the path it passes by, or none. */
export interface BusCheck { bus: string; primary: "utility" | "generator"; path: BusbarPathName | "none"; sumA: number; limitA: number }
interface Judged { outcome: Outcome; draft?: FindingDraft; check?: BusCheck }
function judge(context: CheckContext, bus: string, primary: "utilities" | "generators"): Judged | null {
  const list = branches(context, bus);
  const feeds = list.filter((each) => each[primary].length > 0);
  const feed = feeds[0];
  if (!feed || feeds.length > 1) return null;
  // Inverters on the feed's own side come through its device; they are counted where they join.
  const sources = list.filter((each) => each !== feed && each.converters.length > 0 && (primary === "utilities" || each.utilities.length === 0));
  if (sources.length === 0) return null;
  const together = context.states().allowed.some((state) => state.islands.some((island) =>
    island.nodes.has(`${bus}/bus`) && island.sources.some((id) => feed[primary].includes(id)) && sources.some((each) => each.converters.some((id) => island.converters.includes(id)))));
  if (!together) return null;
  const reader = new Reader(context);
  const busA = reader.number(bus, "busA");
  const mainA = feed.device === null ? null : reader.number(feed.device, topology(context.graph).ratingField(feed.device) ?? "ratingA");
  if (feed.device === null) reader.ask(equipmentRef(bus), "props.mainDevice", `overcurrent device between ${nameOf(context, equipmentRef(bus))} and its supply`);
  const outputs = [...new Set(sources.flatMap((each) => each.converters))].map((id) => outputA(context, id, reader));
  const devices = list.filter((each) => each !== feed && each.device !== null).map((each) => ({ id: each.device as string, ratingA: numberOf(context, each.device as string, "ratingA"), branch: each }));
  if (busA === null || mainA === null || feed.device === null || outputs.some((each) => each === null)) return { outcome: reader.outcome() };
  const sourceDevices = sources.map((each) => each.device).filter((id): id is string => id !== null);
  const others = devices.map((each) => each.id).filter((id) => !sourceDevices.includes(id));
  const placeReader = new Reader(context);
  const oppositeEnds = opposite(context, bus, feed.device, sourceDevices, others, placeReader);
  const unknown = devices.filter((each) => each.ratingA === null);
  const base = {
    edition: context.edition, busbarA: busA, mainDeviceA: mainA, sourceOutputsA: outputs as number[], oppositeEnds,
    branchDevicesA: unknown.length > 0 ? null : devices.map((each) => each.ratingA as number),
    centerFedDwelling: context.drawing.equipment[bus]?.props.busEnds === "center" && context.drawing.site.occupancy === "one- or two-family dwelling",
  };
  const result = busbarCheck(base);
  const passing = result.detail.paths.find((path) => path.name === result.value);
  const check: BusCheck = {
    bus, primary: primary === "utilities" ? "utility" : "generator", path: result.value,
    sumA: passing?.sumA ?? mainA + result.detail.sourceA, limitA: passing?.limitA ?? busA,
  };
  if (result.detail.complies) return { outcome: PASS, check };
  const open = !oppositeEnds && !placeReader.complete && busbarCheck({ ...base, oppositeEnds: true }).detail.complies;
  if (open) return { outcome: placeReader.outcome() };
  if (result.detail.undecided) { for (const each of unknown) reader.number(each.id, "ratingA"); return { outcome: reader.outcome() }; }
  const sum = devices.reduce((total, each) => total + (each.ratingA ?? 0), 0);
  const draft: FindingDraft = {
    variant: "no-path", anchor: equipmentRef(bus), field: "props.busA", related: [feed.device, ...sourceDevices, ...others].map(equipmentRef),
    message: `The ${busA} A bus of ${nameOf(context, equipmentRef(bus))} passes by no path: ${mainA} A main and ${result.detail.sourceA.toFixed(2)} A of sources are ${(mainA + result.detail.sourceA).toFixed(2)} A, the breakers but the main add up to ${sum} A.`,
    steps: result.steps,
  };
  return { outcome: found(draft), draft, check };
}

const acBuses = ({ drawing, graph }: CheckContext): string[] =>
  Object.keys(drawing.equipment).sort().filter((id) => graph.kind(id).capabilities.bus && graph.port(id, "bus")?.system === "ac");

/** Sum and limit of every ac bus that sources share, by primary source; for the sheet. Buses that wait for data are left out. */
export const busChecks = (context: CheckContext): BusCheck[] => acBuses(context).flatMap((bus) =>
  (["utilities", "generators"] as const).flatMap((primary) => judge(context, bus, primary)?.check ?? []));

export const busbarNoMethod: Rule = {
  meta: {
    id: "busbar-no-method", group: "Inverters and interconnection", severity: "must-fix", evidence: "derived",
    statement: "A busbar fed by its primary source and by others complies by one of the listed paths: sum of sources, 120 percent with sources at the opposite end, sum of all devices, and so on.",
    risk: "Loads can draw the main and the sources together through a bus that no breaker protects; it overheats unseen.",
    citations: sections(["705.12(B)(2)(3)", "read"], ["705.12(B)(3)", "agreed"], ["705.12(B)", "agreed"]), mustFixAllowed: MUST_FIX_TO_2023, limits: {},
    reads: ["equipment.props.busA", "equipment.props.ratingA", "equipment.props.continuousA", "equipment.spaces", "equipment.props.spacesTotal", "circuits.from", "circuits.to", "interlocks"],
    absorbs: ["busbar-every-panel", "busbar-not-opposite-end", "supply-breaker-counted"],
  },
  subjects: (context) => acBuses(context).map(equipmentRef),
  evaluate: ({ id }, context) => {
    const results = (["utilities", "generators"] as const).map((primary) => judge(context, id, primary)).filter((each): each is Judged => each !== null);
    if (results.length === 0) return NOT_APPLICABLE;
    const findings = results.filter((each) => each.draft);
    // The same bus in two states is one fault; the first, with the utility, speaks.
    return findings[0] ? findings[0].outcome : results.map((each) => each.outcome);
  },
  suggest: (finding, context) => {
    const bus = finding.anchor.id;
    const busA = numberOf(context, bus, "busA");
    if (busA === null) return [];
    const [main, ...others] = finding.related.map((ref) => ref.id);
    const mainA = main === undefined ? null : numberOf(context, main, "ratingA");
    const ratings = others.map((id) => numberOf(context, id, "ratingA") ?? 0);
    const sum = ratings.reduce((a, b) => a + b, 0);
    if (mainA === null || mainA > busA) return [];
    return others.flatMap((id, i) => {
      const own = ratings[i] ?? 0;
      const room = busA - (sum - own);
      const next = room <= 0 ? null : standardRatingAtMostA(Math.min(room, own - 0.01), context.edition);
      const circuit = context.graph.circuitsAt(id).find((each) => context.drawing.circuits[each]?.wiring === "field");
      const carried = circuit === undefined ? null : carriedBy(context, circuit, new Reader(context))?.required.value ?? null;
      if (next === null || (carried !== null && next < carried)) return [];
      return [{ label: `Set ${nameOf(context, equipmentRef(id))} to ${next} A`, also: `All breakers but the main then add up to ${sum - own + next} A on the ${busA} A bus. Check the load of that circuit; post the sign that the sum asks for.`, patches: [{ op: "replace" as const, path: `/equipment/${id}/props/ratingA`, value: next }] }];
    }).slice(0, 3);
  },
  examples: { violates: "225 A bus, 200 A main, 81.25 A of sources: 281.25 A above 270 A, breakers but the main 245 A.", passes: "The same with breakers of 225 A." },
};
