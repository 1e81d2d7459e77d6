import type { DrawingGraph } from "@/lib/diagram/graph";
import type { ElementRef } from "@/lib/diagram/schema";
import { SYSTEM_WORDS } from "./landing";

/** Tag of an element as people call it, or what it is where it has none. */
export function tagOf(graph: DrawingGraph, ref: ElementRef): string {
  const { drawing } = graph;
  switch (ref.collection) {
    case "equipment": return drawing.equipment[ref.id]?.tag || (drawing.equipment[ref.id] ? graph.kind(ref.id).title : "");
    case "circuits": return drawing.circuits[ref.id]?.tag || (drawing.circuits[ref.id]?.wiring === "factory" ? "factory wiring" : "circuit");
    case "raceways": return drawing.raceways[ref.id]?.tag || drawing.raceways[ref.id]?.kind || "";
    case "bonds": return drawing.bonds[ref.id]?.tag || drawing.bonds[ref.id]?.kind || "";
    case "interlocks": return drawing.interlocks[ref.id]?.tag || "interlock";
    case "sensors": return drawing.sensors[ref.id]?.tag || "current sensor";
    case "labels": return `label ${drawing.labels[ref.id]?.number ?? ""}`;
    case "texts": return (drawing.texts[ref.id]?.lines ?? "").split("\n")[0] ?? "";
    case "acceptances": return "acceptance";
  }
}

const end = (graph: DrawingGraph, id: string, side: "from" | "to"): string => {
  const endpoint = graph.drawing.circuits[id]?.[side];
  if (!endpoint) return "";
  const equipment = graph.drawing.equipment[endpoint.equipment];
  const port = graph.port(endpoint.equipment, endpoint.port);
  return `${equipment?.tag || "?"}${port ? ` ${port.label.toLowerCase()}` : ""}`;
};
export const circuitEnd = end;

/** What an element is, in one line: for headings and for people who hear the drawing. */
export function kindOf(graph: DrawingGraph, ref: ElementRef): string {
  const { drawing } = graph;
  switch (ref.collection) {
    case "equipment": return drawing.equipment[ref.id] ? graph.kind(ref.id).title : "";
    case "circuits": {
      const circuit = drawing.circuits[ref.id];
      return circuit ? `${circuit.wiring === "factory" ? "Factory wiring" : "Circuit"}, ${SYSTEM_WORDS[circuit.system]}` : "";
    }
    case "raceways": {
      const raceway = drawing.raceways[ref.id];
      return raceway ? { conduit: "Conduit", nipple: "Nipple", wireway: "Wireway", box: "Box" }[raceway.kind] : "";
    }
    case "bonds": return drawing.bonds[ref.id]?.kind ?? "";
    case "interlocks": return `Interlock, ${drawing.interlocks[ref.id]?.kind ?? ""}`;
    case "sensors": return "Current sensor";
    case "labels": return "Label";
    case "texts": return "Note";
    case "acceptances": return "Acceptance";
  }
}

/** Full accessible name: kind, tag, ratings or ends. */
export function nameOf(graph: DrawingGraph, ref: ElementRef): string {
  const kind = kindOf(graph, ref);
  const tag = tagOf(graph, ref);
  if (ref.collection === "circuits") return `${kind}${graph.drawing.circuits[ref.id]?.tag ? ` ${tag}` : ""}, ${end(graph, ref.id, "from")} to ${end(graph, ref.id, "to")}`;
  if (ref.collection === "equipment") {
    const equipment = graph.drawing.equipment[ref.id];
    const ratings = equipment ? graph.kind(ref.id).annotation(equipment.props as never).join(", ") : "";
    return `${kind} ${tag}${ratings ? `, ${ratings}` : ""}`;
  }
  return kind === tag ? kind : `${kind} ${tag}`;
}

/** Finds elements by tag, name or rating; the best matches first. */
export function findElements(graph: DrawingGraph, query: string): readonly ElementRef[] {
  const words = query.trim().toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return [];
  const collections = ["equipment", "circuits", "raceways", "sensors", "bonds", "interlocks", "texts"] as const;
  return collections
    .flatMap((collection) => Object.keys(graph.drawing[collection]).map((id): ElementRef => ({ collection, id })))
    .map((ref) => ({ ref, tag: tagOf(graph, ref).toLowerCase(), name: nameOf(graph, ref).toLowerCase() }))
    .filter(({ name }) => words.every((word) => name.includes(word)))
    .sort((a, b) => Number(b.tag === words.join(" ")) - Number(a.tag === words.join(" ")) || Number(b.tag.startsWith(words[0] as string)) - Number(a.tag.startsWith(words[0] as string)) || a.tag.localeCompare(b.tag, "en", { numeric: true }))
    .map(({ ref }) => ref);
}
