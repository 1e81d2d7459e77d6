import type { Drawing } from "@/lib/diagram/schema";
import type { VisitData } from "@/lib/diagram/siteVisit";
import { stretchesOf } from "@/lib/diagram/graph";
import { kindDefinition } from "@/lib/equipment/registry";
import type { PanelChoice, VisitChoices } from "./line";

const plain = (text: string): string => text.toUpperCase().replace(/[^A-Z0-9]+/g, "");
/** Tags of equipment and of what it stands in: a run "from MM-1" may land on a breaker inside MM-1. */
function tagsOf(drawing: Drawing, id: string): string[] {
  const tags: string[] = [];
  for (let at: string | null = id; at !== null && tags.length < 8; at = drawing.equipment[at]?.parent ?? null) tags.push(plain(drawing.equipment[at]?.tag ?? ""));
  return tags.filter(Boolean);
}

/**
 * What the rows of a visit are on the drawing, where their words name it plainly. A proposal for a person to change: a row that
 * names nothing, or two things, is left open.
 */
export function guessedChoices(drawing: Drawing, data: VisitData): VisitChoices {
  const one = (name: string | null, fits: (id: string) => boolean): string | null => {
    const wanted = plain(name ?? "");
    const found = wanted === "" ? [] : Object.entries(drawing.equipment).filter(([id, each]) => plain(each.tag) === wanted && fits(id));
    return found.length === 1 ? found[0]?.[0] ?? null : null;
  };
  const bus = (id: string) => kindDefinition(drawing.equipment[id]?.kind ?? "").capabilities.bus === true;
  const panels: Record<string, PanelChoice> = {};
  for (const panel of data.panels) {
    const id = one(panel.name, bus);
    panels[panel.id] = id ? { as: "update", id } : { as: "nothing" };
  }
  const lengths: Record<string, { circuit: string; section: string }> = {};
  for (const each of data.lengths) {
    const from = plain(each.from ?? "");
    const to = plain(each.to ?? "");
    if (!from || !to) continue;
    const found = Object.entries(drawing.circuits).filter(([, circuit]) => {
      if (circuit.wiring !== "field") return false;
      const a = tagsOf(drawing, circuit.from.equipment);
      const b = tagsOf(drawing, circuit.to.equipment);
      return (a.includes(from) && b.includes(to)) || (a.includes(to) && b.includes(from));
    });
    const sections = found.length === 1 ? Object.keys(found[0]?.[1].sections ?? {}) : [];
    if (found[0] && sections.length === 1 && sections[0]) lengths[each.id] = { circuit: found[0][0], section: sections[0] };
  }
  const places: Record<string, string> = {};
  for (const place of data.places) {
    const id = one(place.what, () => true);
    if (id) places[place.id] = id;
  }
  const raceways: Record<string, "roof" | "attic"> = {};
  for (const [id, raceway] of Object.entries(drawing.raceways)) {
    if (stretchesOf(raceway).some((stretch) => stretch.exposure === "roof")) raceways[id] = "roof";
    else if (raceway.location.room === "attic") raceways[id] = "attic";
  }
  return { panels, lengths, places, raceways };
}
