import { buildGraph } from "@/lib/diagram/graph";
import type { Drawing } from "@/lib/diagram/schema";
import type { CheckOnSheet, SealOnSheet, SheetContext } from "@/lib/sheets/context";
import { stateSpace } from "@/lib/states";

export const DIGEST = "0123456789abcdef".repeat(4);
export const SEAL: SealOnSheet = {
  licensee: "Tobias Wrenfield", title: "Professional Engineer", state: "OR", number: "E-00000", expiresOn: "2027-12-31", signedOn: "2026-04-23",
  sealCode: "F7K2-91QD", legend: "DEMONSTRATION ONLY", graphic: null,
};
export const CHECK: CheckOnSheet = {
  ruleSet: "2026-1", edition: "2023", digest: DIGEST, rulesRun: 27, findings: [],
  counts: { mustFix: 0, shouldFix: 1, advice: 0, needsData: 0, accepted: 0, declared: 0, pass: 100 },
};
/** What a sheet set of a drawing is drawn from, sealed unless said otherwise. */
export function contextOf(drawing: Drawing, change: Partial<SheetContext> = {}): SheetContext {
  const graph = buildGraph(drawing);
  return {
    drawing, graph, states: stateSpace(graph), check: CHECK, digest: DIGEST, seal: SEAL, sealPlace: "DRAFT",
    revisions: [{ letter: "A", description: "Issued for permit", date: "2026-04-02", by: "Ines Okafor-Lund" }], ...change,
  };
}
