import { describe, expect, it } from "vitest";
import { buildGraph, equipmentOfNode, type ConductionEdge, type DrawingGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import { reacher } from "@/lib/rules/shared/reach";
import { cleanDrawing } from "@/seeders/demo/cleanDrawing";
import { secondSystem } from "@/tests/fixtures/secondSystem";

/*
 * The same question answered the plain way: put every transfer switch into each of its positions in turn, walk what is
 * joined then, and take all of it together.
 */
function plainly(graph: DrawingGraph, start: string, without: ConductionEdge): Set<string> {
  const throws = graph.edges.filter((edge) => edge.by === "throw");
  const switches = [...new Set(throws.map((edge) => edge.id))];
  const positions = switches.map((id) => throws.filter((edge) => edge.id === id));
  const all = new Set<string>();
  const choose = (at: number, chosen: readonly ConductionEdge[]): void => {
    const list = positions[at];
    if (list) { for (const edge of list) choose(at + 1, [...chosen, edge]); return; }
    const seen = new Set([start]);
    const queue = [start];
    for (let node = queue.pop(); node !== undefined; node = queue.pop()) {
      for (const edge of graph.edgesAt(node)) {
        if (edge === without || edge.by === "converter" || (edge.by === "throw" && !chosen.includes(edge))) continue;
        const far = edge.a === node ? edge.b : edge.a;
        if (!seen.has(far)) { seen.add(far); queue.push(far); }
      }
    }
    for (const node of seen) all.add(node);
  };
  choose(0, []);
  return all;
}
const withDoubleCircuit = (): Drawing => {
  const drawing = cleanDrawing();
  const circuit = Object.entries(drawing.circuits).find(([, one]) => one.system === "ac" && one.wiring === "field");
  if (!circuit) throw new Error("no ac circuit");
  drawing.circuits["second-way"] = structuredClone(circuit[1]);
  return drawing;
};

describe("sides of a circuit against a plain walk", () => {
  it.each([["farm system", cleanDrawing], ["second system with a transfer switch", secondSystem], ["farm system with a circuit drawn twice", withDoubleCircuit]] as const)("%s", (_, make) => {
    const graph = buildGraph(make());
    const beyond = reacher(graph);
    let asked = 0;
    for (const edge of graph.edges) {
      if (edge.by === "converter" || edge.by === "throw") continue;
      for (const start of [edge.a, edge.b]) {
        asked += 1;
        const [side, expected] = [beyond(start, edge), plainly(graph, start, edge)];
        expect([...side.nodes].sort()).toEqual([...expected].sort());
        const having = (test: (id: string) => boolean) => [...new Set([...expected].map(equipmentOfNode))].filter(test).sort();
        const can = (id: string) => graph.kind(id).capabilities;
        expect(side.utilities).toEqual(having((id) => can(id).source === "utility"));
        expect(side.generators).toEqual(having((id) => can(id).source === "generator"));
        expect(side.converters).toEqual(having((id) => can(id).converter === true));
        expect(side.loads).toEqual(having((id) => can(id).load !== undefined));
        expect([...side.edges].sort()).toEqual(graph.edges.filter((one) => one.by === "circuit" && one !== edge && expected.has(one.a) && expected.has(one.b)).map((one) => one.id).sort());
      }
    }
    expect(asked).toBeGreaterThan(60);
  });
});
