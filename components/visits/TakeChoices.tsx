"use client";

import { useMemo } from "react";
import { circuitEnd } from "@/lib/client/describe";
import { newId } from "@/lib/client/newId";
import { buildGraph } from "@/lib/diagram/graph";
import type { PanelChoice, VisitChoices } from "@/lib/diagram/fromVisit";
import type { Drawing } from "@/lib/diagram/schema";
import type { VisitData } from "@/lib/diagram/siteVisit";
import { kindDefinition } from "@/lib/equipment/registry";
import { SelectField } from "@/components/ui/Field";

interface Props { drawing: Drawing; data: VisitData; choices: VisitChoices; onChange: (choices: VisitChoices) => void }

/** What the rows of the visit are on the drawing. */
export function TakeChoices({ drawing, data, choices, onChange }: Props) {
  const graph = useMemo(() => buildGraph(drawing), [drawing]);
  const equipment = Object.entries(drawing.equipment).filter(([, each]) => !each.integral).sort(([, a], [, b]) => a.tag.localeCompare(b.tag, "en", { numeric: true }));
  const panels = equipment.filter(([, each]) => kindDefinition(each.kind).capabilities.bus);
  const sections = Object.entries(drawing.circuits).filter(([, circuit]) => circuit.wiring === "field").sort(([, a], [, b]) => a.tag.localeCompare(b.tag, "en", { numeric: true }))
    .flatMap(([circuit]) => graph.sections(circuit).map((section, index, all) => ({
      value: `${circuit}/${section.id}`, words: `${drawing.circuits[circuit]?.tag || "circuit"}, ${circuitEnd(graph, circuit, "from")} to ${circuitEnd(graph, circuit, "to")}${all.length > 1 ? `, part ${index + 1}` : ""}`,
    })));
  const raceways = Object.entries(drawing.raceways).sort(([, a], [, b]) => a.tag.localeCompare(b.tag, "en", { numeric: true }));
  const rows = [...data.panels.filter((each) => each.busA !== null || each.mainA !== null || each.name !== null), ...data.lengths.filter((each) => each.lengthFt !== null), ...data.places];
  const over = (["roof", "attic"] as const).filter((where) => data.temperatures[where] !== null || (where === "roof" && data.roof.conduitAboveRoofIn !== null));
  const chosenWords = raceways.flatMap(([id, raceway]) => (choices.raceways[id] ? [`${raceway.tag} ${choices.raceways[id]}`] : [])).join(", ") || "none";
  if (rows.length === 0 && over.length === 0) return null;
  const kindOf = (choice: PanelChoice | undefined) => (!choice || choice.as === "nothing" ? "" : choice.as === "update" ? choice.id : `new ${choice.as}`);
  const asPanel = (value: string): PanelChoice =>
    value === "" ? { as: "nothing" } : value === "new panelboard" ? { as: "panelboard", id: newId("eq") } : value === "new meter-main" ? { as: "meter-main", id: newId("eq") } : { as: "update", id: value };
  const without = <T,>(map: Readonly<Record<string, T>>, id: string, to: T | null): Record<string, T> => { const { [id]: _, ...rest } = map; return to === null ? rest : { ...rest, [id]: to }; };
  return (
    <div className="grid grid-cols-2 gap-x-5 gap-y-4 border-b border-g1 px-6 py-5 phone:grid-cols-1 phone:px-4">
      <p className="col-span-full max-w-[68ch] text-text text-ink2">Say what each of these is on the drawing. Words that name a tag were matched already; look whether it is right.</p>
      {data.panels.map((panel, index) => (
        <SelectField key={panel.id} label={`Panel: ${panel.name ?? index + 1}`} value={kindOf(choices.panels[panel.id])} onChange={(event) => onChange({ ...choices, panels: { ...choices.panels, [panel.id]: asPanel(event.target.value) } })}>
          <option value="">leave it out</option>
          <option value="new panelboard">place a new panelboard, existing</option>
          <option value="new meter-main">place a new meter-main panelboard, existing</option>
          {panels.map(([id, each]) => <option key={id} value={id}>it is {each.tag}, {kindDefinition(each.kind).title.toLowerCase()}</option>)}
        </SelectField>
      ))}
      {data.lengths.filter((each) => each.lengthFt !== null).map((each) => {
        const choice = choices.lengths[each.id];
        return (
          <SelectField
            key={each.id} label={`Run: ${each.from ?? "?"} to ${each.to ?? "?"}, ${each.lengthFt} ft`} value={choice ? `${choice.circuit}/${choice.section}` : ""}
            onChange={(event) => { const [circuit = "", section = ""] = event.target.value.split("/"); onChange({ ...choices, lengths: without(choices.lengths, each.id, circuit ? { circuit, section } : null) }); }}
          >
            <option value="">leave it out</option>
            {sections.map(({ value, words }) => <option key={value} value={value}>{words}</option>)}
          </SelectField>
        );
      })}
      {data.places.map((place, index) => (
        <SelectField key={place.id} label={`Place: ${[place.what ?? `place ${index + 1}`, place.place].filter(Boolean).join(", ")}`} value={choices.places[place.id] ?? ""} onChange={(event) => onChange({ ...choices, places: without(choices.places, place.id, event.target.value || null) })}>
          <option value="">leave it out</option>
          {equipment.map(([id, each]) => <option key={id} value={id}>{each.tag}, {kindDefinition(each.kind).title.toLowerCase()}</option>)}
        </SelectField>
      ))}
      {over.length > 0 && raceways.length > 0 && (
        <details className="col-span-full min-w-0">
          <summary className="cursor-pointer text-text"><span className="font-medium text-ink2">Raceways on the roof or through the attic: </span>{chosenWords}</summary>
          <div className="mt-3 grid grid-cols-4 gap-2 phone:grid-cols-2">
            {raceways.map(([id, raceway]) => (
              <label key={id} className="flex items-center gap-2 border border-g1 py-1 pr-1 pl-3 text-text">
                <span className="min-w-0 flex-1 truncate">{raceway.tag}</span>
                <select aria-label={`${raceway.tag} runs`} className="h-bar-control border border-rule bg-paper px-2 text-body" value={choices.raceways[id] ?? ""} onChange={(event) => onChange({ ...choices, raceways: without(choices.raceways, id, event.target.value === "roof" || event.target.value === "attic" ? event.target.value : null) })}>
                  <option value="">neither</option>
                  <option value="roof">roof</option>
                  <option value="attic">attic</option>
                </select>
              </label>
            ))}
          </div>
        </details>
      )}
    </div>
  );
}
