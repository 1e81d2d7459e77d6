"use client";
import { BUTTON, HEADING } from "@/components/diagram/chrome/controls";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { nameOf, tagOf } from "@/lib/client/describe";
import { newId } from "@/lib/client/newId";
import { readNumber, showValue } from "@/lib/client/readField";
import { stretchesOf } from "@/lib/diagram/graph";
import { RACEWAY_TYPES, type Raceway } from "@/lib/diagram/schema";
import { TRADE_SIZES } from "@/lib/units";
import { ChoiceField, FieldGroup, TextField } from "@/components/fields/fields";
import { useEdit } from "./useEdit";

const EXPOSURES = ["indoor dry", "indoor damp", "outdoor", "roof", "underground"] as const;
const yes = (value: boolean | null): string => (value === null ? "" : value ? "yes" : "no");
const fromYes = (value: string): boolean | null => (value === "" ? null : value === "yes");

/** Type, size, stretches, compartments and what lies inside a raceway. */
export function RacewayForm({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const raceway = graph.drawing.raceways[id] as Raceway;
  const { readOnly, set, take, mark } = useEdit({ collection: "raceways", id });
  const tube = raceway.kind === "conduit" || raceway.kind === "nipple";
  const inches = (field: "widthIn" | "heightIn" | "depthIn", label: string) => <TextField label={label} unit="in" value={showValue(raceway[field])} readOnly={readOnly} mark={mark(field)} onCommit={(text) => take(field, readNumber(text, "in", 0.5, 96))} />;
  const ends = Object.fromEntries([...Object.keys(graph.drawing.equipment).filter((each) => !graph.drawing.equipment[each]?.integral).map((each) => [each, tagOf(graph, { collection: "equipment", id: each })]), ...Object.keys(graph.drawing.raceways).filter((each) => each !== id).map((each) => [each, tagOf(graph, { collection: "raceways", id: each })])]) as Record<string, string>;
  return (
    <>
      <FieldGroup title="Construction">
        {tube && <ChoiceField label="Type" value={raceway.type ?? ""} options={RACEWAY_TYPES} readOnly={readOnly} mark={mark("type")} onCommit={(value) => set("type", value || null)} />}
        {tube && <ChoiceField label="Trade size" value={raceway.tradeSize ?? ""} options={TRADE_SIZES} words={Object.fromEntries(TRADE_SIZES.map((size) => [size, `${size} in`]))} readOnly={readOnly} mark={mark("tradeSize")} onCommit={(value) => set("tradeSize", value || null)} />}
        {!tube && inches("widthIn", "Width")}
        {!tube && inches("heightIn", "Height")}
        {!tube && inches("depthIn", raceway.kind === "wireway" ? "Length" : "Depth")}
        <ChoiceField label="Metal" value={yes(raceway.metal)} options={["yes", "no"]} readOnly={readOnly} mark={mark("metal")} onCommit={(value) => set("metal", fromYes(value))} />
        {tube && <TextField label="Bends" unit="degrees" value={showValue(raceway.bendsDegrees)} readOnly={readOnly} mark={mark("bendsDegrees")} onCommit={(text) => take("bendsDegrees", readNumber(text, "", 0, 3600))} />}
        {tube && <ChoiceField label="Sealed" value={yes(raceway.sealed)} options={["yes", "no"]} readOnly={readOnly} mark={mark("sealed")} onCommit={(value) => set("sealed", fromYes(value))} />}
        <ChoiceField label="From" value={raceway.from ?? ""} options={Object.keys(ends)} words={ends} readOnly={readOnly} onCommit={(value) => set("from", value || null)} />
        <ChoiceField label="To" value={raceway.to ?? ""} options={Object.keys(ends)} words={ends} readOnly={readOnly} onCommit={(value) => set("to", value || null)} />
        <ChoiceField label="Exposure" value={raceway.location.exposure ?? ""} options={EXPOSURES} readOnly={readOnly} mark={mark("location.exposure")} onCommit={(value) => set("location.exposure", value || null)} />
        <ChoiceField label="Drawn" value={raceway.vertical ? "upright" : "level"} options={["level", "upright"]} unknown={false} readOnly={readOnly} onCommit={(value) => set("vertical", value === "upright")} />
      </FieldGroup>
      <Stretches id={id} raceway={raceway} />
      {!tube && <Compartments id={id} raceway={raceway} />}
      <Inside id={id} />
    </>
  );
}

function Stretches({ id, raceway }: { id: string; raceway: Raceway }) {
  const { readOnly, set, take, mark } = useEdit({ collection: "raceways", id });
  const stretches = stretchesOf(raceway);
  const total = stretches.reduce<number | null>((sum, stretch) => (sum === null || stretch.lengthFt === null ? null : sum + stretch.lengthFt), 0);
  return (
    <FieldGroup title="Stretches" note={total === null ? "length not known" : `${Number(total.toFixed(2))} ft`}>
      {stretches.map((stretch, index) => {
        const base = `stretches.${stretch.id}`;
        return (
          <fieldset key={stretch.id} className="col-span-2 grid grid-cols-2 gap-2 border-b border-desk2 pb-2">
            <legend className="sr-only">Stretch {index + 1}</legend>
            <TextField label="Length" unit="ft" value={showValue(stretch.lengthFt)} readOnly={readOnly} mark={mark(`${base}.lengthFt`)} onCommit={(text) => take(`${base}.lengthFt`, readNumber(text, "ft", 0, 20000), `length of ${raceway.tag}`)} />
            <TextField label="Ambient" unit="°C" value={showValue(stretch.ambientC)} readOnly={readOnly} mark={mark(`${base}.ambientC`)} onCommit={(text) => take(`${base}.ambientC`, readNumber(text, "°C", -60, 120))} />
            <ChoiceField label="Exposure" value={stretch.exposure ?? ""} options={EXPOSURES} readOnly={readOnly} mark={mark(`${base}.exposure`)} onCommit={(value) => set(`${base}.exposure`, value || null)} />
            <TextField label="Above roof" unit="in" value={showValue(stretch.aboveRoofIn)} readOnly={readOnly} mark={mark(`${base}.aboveRoofIn`)} onCommit={(text) => take(`${base}.aboveRoofIn`, readNumber(text, "in", 0, 240))} />
            <TextField label="Burial depth" unit="in" value={showValue(stretch.burialDepthIn)} readOnly={readOnly} mark={mark(`${base}.burialDepthIn`)} onCommit={(text) => take(`${base}.burialDepthIn`, readNumber(text, "in", 0, 240))} />
            {!readOnly && stretches.length > 1 && <button type="button" className={`${BUTTON} self-end`} onClick={() => set(base, undefined, `stretch of ${raceway.tag}`)}>Remove</button>}
          </fieldset>
        );
      })}
      {!readOnly && <button type="button" className={`${BUTTON} col-span-2`} onClick={() => set(`stretches.${newId("st")}`, { order: Math.min(20, (stretches.at(-1)?.order ?? -1) + 1), lengthFt: null, ambientC: null, exposure: null, aboveRoofIn: null, burialDepthIn: null }, `stretch of ${raceway.tag}`)}>Add a stretch</button>}
    </FieldGroup>
  );
}

function Compartments({ id, raceway }: { id: string; raceway: Raceway }) {
  const { readOnly, set, take, mark } = useEdit({ collection: "raceways", id });
  const list = Object.entries(raceway.compartments).sort(([, a], [, b]) => a.order - b.order);
  return (
    <FieldGroup title="Compartments" note={list.length > 1 ? "fixed dividers" : "no divider"} open={list.length > 0}>
      {list.map(([key, compartment]) => (
        <div key={key} className="contents">
          <TextField label="Name" value={compartment.name} readOnly={readOnly} onCommit={(text) => set(`compartments.${key}.name`, text.trim())} />
          <TextField label="Width" unit="in" value={showValue(compartment.widthIn)} readOnly={readOnly} mark={mark(`compartments.${key}.widthIn`)} onCommit={(text) => take(`compartments.${key}.widthIn`, readNumber(text, "in", 0.5, 48))} />
        </div>
      ))}
      {!readOnly && list.length < 7 && <button type="button" className={`${BUTTON} col-span-2`} onClick={() => set(`compartments.${newId("k")}`, { order: list.length, name: `C${list.length + 1}`, widthIn: null }, `compartment of ${raceway.tag}`)}>Add a compartment</button>}
    </FieldGroup>
  );
}

function Inside({ id }: { id: string }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const circuits = [...new Set(graph.occupants(id).map((occupant) => occupant.circuit))];
  const routed = Object.keys(graph.drawing.circuits).filter((circuit) => !circuits.includes(circuit) && graph.racewaysOf(circuit).some((step) => step.raceway === id));
  const all = [...circuits, ...routed];
  const conductors = (circuit: string): number => graph.occupants(id).filter((occupant) => occupant.circuit === circuit).reduce((sum, occupant) => sum + (occupant.conductor?.count ?? 1) * occupant.parallelSets, 0);
  return (
    <section aria-label="Inside">
      <h3 className={HEADING}><span>Inside</span><span className="text-small font-normal text-ink2">{all.length} {all.length === 1 ? "circuit" : "circuits"}</span></h3>
      <ul className="list-none">
        {all.map((circuit) => (
          <li key={circuit}>
            <button type="button" className="flex w-full justify-between border-b border-desk2 py-1 text-left text-label hover:bg-panel" aria-label={nameOf(graph, { collection: "circuits", id: circuit })} onClick={() => store.getState().select([{ collection: "circuits", id: circuit }])}>
              <span className="font-finding">{tagOf(graph, { collection: "circuits", id: circuit })}</span><span className="text-ink2">{conductors(circuit) > 0 ? `${conductors(circuit)} conductors or cables` : "conductors not known"}</span>
            </button>
          </li>
        ))}
        {all.length === 0 && <li className="py-1 text-label text-ink2">Nothing yet. Select a circuit and add this raceway to its route, or drag the circuit&apos;s line onto a wireway.</li>}
      </ul>
    </section>
  );
}
