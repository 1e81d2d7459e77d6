"use client";
import { addSectionCommand, rerouteEdit, rerouteWith } from "@/components/diagram/actions/circuitEdits";
import { sizeEdit, type Sizing } from "@/components/diagram/actions/sizeEdit";
import { BUTTON, HEADING, PRIMARY } from "@/components/diagram/chrome/controls";
import { Worksheet } from "@/components/diagram/redlines/worksheet";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { circuitEnd, tagOf } from "@/lib/client/describe";
import { newId } from "@/lib/client/newId";
import { readNumber, showValue } from "@/lib/client/readField";
import { INSULATIONS, type Circuit, type Conductor, type Section } from "@/lib/diagram/schema";
import { CONDUCTOR_SIZES } from "@/lib/units";
import { useState } from "react";
import { ChoiceField, FieldGroup, TextField } from "@/components/fields/fields";
import { RouteList } from "./routeList";
import { useEdit } from "./useEdit";

const ROLES = [["ungrounded", "Ungrounded"], ["grounded", "Grounded (neutral)"], ["equipmentGround", "Equipment ground"]] as const;

/** One circuit: ends, load, sections with their conductors and route, and its sizing. */
export function CircuitForm({ id }: { id: string }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const circuit = graph.drawing.circuits[id] as Circuit;
  const { readOnly, set, run, mark } = useEdit({ collection: "circuits", id });
  const sections = graph.sections(id);
  const load = circuit.load;
  const setLoad = (part: Partial<NonNullable<Circuit["load"]>>): string | null => set("load", { continuousA: 0, otherA: 0, basis: "", ...load, ...part }, `load of ${circuit.tag}`);
  const amps = (text: string, part: "continuousA" | "otherA"): string | null => {
    const answer = readNumber(text, "A", 0, 10000);
    return answer.ok ? setLoad({ [part]: answer.value ?? 0 }) : answer.reason;
  };
  const jump = (end: "from" | "to"): void => store.getState().select([{ collection: "equipment", id: circuit[end].equipment }]);
  return (
    <>
      <dl className="mt-2 grid grid-cols-[44px_1fr] gap-y-1 text-body">
        {(["from", "to"] as const).map((end) => <div key={end} className="contents"><dt className="text-ink2">{end === "from" ? "From" : "To"}</dt><dd><button type="button" className="text-left font-strong underline decoration-dotted underline-offset-2" onClick={() => jump(end)}>{circuitEnd(graph, id, end)}</button></dd></div>)}
      </dl>
      <div className="mt-2 grid grid-cols-2 gap-2">
        <TextField label="Callout" empty="as the tag" value={circuit.callout ?? ""} readOnly={readOnly} onCommit={(text) => set("callout", text.trim() || null)} />
        <ChoiceField label="Status" value={circuit.status} options={["new", "existing", "relocated", "removed"]} unknown={false} readOnly={readOnly} onCommit={(value) => set("status", value)} />
        <ChoiceField label="Wiring" value={circuit.wiring} options={["field", "factory"]} unknown={false} words={{ field: "field wiring", factory: "factory, inside equipment" }} wide readOnly={readOnly} onCommit={(value) => set("wiring", value)} />
      </div>
      {circuit.wiring === "field" && circuit.system !== "data" && circuit.system !== "ground" && (
        <FieldGroup title="Load stated" note={load ? "by hand" : "from the drawing"} open={load !== null}>
          <TextField label="Continuous" unit="A" value={load ? showValue(load.continuousA) : ""} readOnly={readOnly} mark={mark("load")} onCommit={(text) => (text.trim() === "" ? set("load", null) : amps(text, "continuousA"))} />
          <TextField label="Other" unit="A" value={load ? showValue(load.otherA) : ""} readOnly={readOnly} onCommit={(text) => amps(text, "otherA")} />
          <TextField label="Basis" wide value={load?.basis ?? ""} readOnly={readOnly} onCommit={(text) => setLoad({ basis: text })} />
        </FieldGroup>
      )}
      {circuit.wiring === "field" && sections.map((section, index) => <SectionForm key={section.id} circuitId={id} section={section} only={sections.length === 1} index={index} />)}
      {circuit.wiring === "field" && !readOnly && (
        <div className="mt-3 flex flex-wrap gap-1.5">
          <button type="button" className={BUTTON} onClick={() => run([addSectionCommand(graph, id, newId("s"))], `section of ${circuit.tag}`)}>Wire changes at a box</button>
          <button type="button" className={BUTTON} onClick={() => { const edit = rerouteEdit(graph, id); run(edit.commands, edit.title); }}>Draw the line anew</button>
        </div>
      )}
      {circuit.wiring === "field" && circuit.system !== "data" && circuit.system !== "ground" && <SizeCircuit id={id} />}
    </>
  );
}

function SectionForm({ circuitId, section, only, index }: { circuitId: string; section: Section & { id: string }; only: boolean; index: number }) {
  const graph = useEditor((editor) => editor.graph);
  const circuit = graph.drawing.circuits[circuitId] as Circuit;
  const { readOnly, set, take, run, mark } = useEdit({ collection: "circuits", id: circuitId });
  const base = `sections.${section.id}`;
  const cable = section.cable;
  const setCable = (part: Partial<NonNullable<Section["cable"]>>): string | null => set(`${base}.cable`, { type: "", class: null, count: 1, outerDiameterIn: null, voltageRatingV: null, wetListed: null, ...cable, ...part }, `cable of ${circuit.tag}`);
  const sharing = Object.keys(graph.drawing.circuits).filter((id) => id !== circuitId && graph.sections(id).some((other) => other.equipmentGround));
  return (
    <>
      <FieldGroup title={only ? "Conductors" : `Section ${index + 1}`} note={section.lengthFt === null ? "length not known" : `${section.lengthFt} ft`}>
        <TextField label="Length" unit="ft" value={showValue(section.lengthFt)} readOnly={readOnly} mark={mark(`${base}.lengthFt`)} onCommit={(text) => take(`${base}.lengthFt`, readNumber(text, "ft", 0, 20000), `length of ${circuit.tag}`)} />
        <TextField label="Sets in parallel" value={String(section.parallelSets)} readOnly={readOnly} onCommit={(text) => { const answer = readNumber(text, "", 1, 12, true); return answer.ok ? set(`${base}.parallelSets`, answer.value ?? 1) : answer.reason; }} />
        {circuit.system === "data" ? (
          <>
            <TextField label="Cable" value={cable?.type ?? ""} readOnly={readOnly} onCommit={(text) => (text.trim() === "" ? set(`${base}.cable`, null) : setCable({ type: text.trim() }))} />
            <ChoiceField label="Class" value={cable?.class ?? ""} options={["class 1", "class 2", "class 3", "power"]} readOnly={readOnly} mark={mark(`${base}.cable.class`)} onCommit={(value) => setCable({ class: (value || null) as NonNullable<Section["cable"]>["class"] })} />
            <TextField label="Diameter" unit="in" value={showValue(cable?.outerDiameterIn)} readOnly={readOnly} mark={mark(`${base}.cable.outerDiameterIn`)} onCommit={(text) => { const answer = readNumber(text, "in", 0.02, 6); return answer.ok ? setCable({ outerDiameterIn: answer.value as number | null }) : answer.reason; }} />
            <TextField label="Voltage rating" unit="V" value={showValue(cable?.voltageRatingV)} readOnly={readOnly} mark={mark(`${base}.cable.voltageRatingV`)} onCommit={(text) => { const answer = readNumber(text, "V", 30, 35000); return answer.ok ? setCable({ voltageRatingV: answer.value as number | null }) : answer.reason; }} />
          </>
        ) : ROLES.map(([role, label]) => <ConductorFields key={role} label={label} conductor={section[role]} readOnly={readOnly} mark={mark(`${base}.${role}.size`) ?? mark(`${base}.${role}`)} onSet={(conductor) => set(`${base}.${role}`, conductor, `${label.toLowerCase()} of ${circuit.tag}`)} />)}
        {circuit.system !== "data" && section.equipmentGround === null && sharing.length > 0 && (
          <ChoiceField label="Shares the ground of" wide value={section.sharesGroundOf ?? ""} options={sharing} words={{ "": "none", ...Object.fromEntries(sharing.map((id) => [id, tagOf(graph, { collection: "circuits", id })])) }} readOnly={readOnly} onCommit={(value) => set(`${base}.sharesGroundOf`, value || null)} />
        )}
      </FieldGroup>
      <RouteList section={section} readOnly={readOnly} onRoute={(route) => { const edit = rerouteWith(graph, circuitId, section.id, route); return run(edit.commands, edit.title); }} />
    </>
  );
}

const NEW_CONDUCTOR: Conductor = { count: 1, size: null, metal: "Cu", insulation: "THWN-2", strands: null, outerDiameterIn: null, voltageRatingV: null, color: null };

function ConductorFields({ label, conductor, readOnly, mark, onSet }: { label: string; conductor: Conductor | null; readOnly: boolean; mark: ReturnType<ReturnType<typeof useEdit>["mark"]>; onSet: (conductor: Conductor | null) => string | null }) {
  const update = (part: Partial<Conductor>): string | null => onSet({ ...NEW_CONDUCTOR, ...conductor, ...part });
  return (
    <fieldset className="col-span-2 grid grid-cols-[44px_1fr_62px] gap-x-1.5 gap-y-1.5 border-t border-desk2 pt-1">
      <legend className="pt-1 text-small font-finding text-ink2">{label}</legend>
      <TextField label="No." value={conductor ? String(conductor.count) : ""} readOnly={readOnly} onCommit={(text) => { if (text.trim() === "" || text.trim() === "0") return onSet(null); const answer = readNumber(text, "", 1, 12, true); return answer.ok ? update({ count: answer.value as number }) : answer.reason; }} />
      <TextField label="Size" value={conductor?.size ?? ""} readOnly={readOnly} mark={mark} list={CONDUCTOR_SIZES} onCommit={(text) => (text.trim() === "" ? update({ size: null }) : update({ size: text.trim().replace(/^#/, "") }))} />
      <ChoiceField label="Metal" value={conductor?.metal ?? ""} options={["Cu", "Al"]} readOnly={readOnly} onCommit={(value) => update({ metal: (value || null) as Conductor["metal"] })} />
      {conductor && <div className="col-span-3 grid grid-cols-2 gap-1.5"><ChoiceField label="Insulation" value={conductor.insulation ?? ""} options={INSULATIONS} readOnly={readOnly} onCommit={(value) => update({ insulation: (value || null) as Conductor["insulation"] })} /><TextField label="Color" value={conductor.color ?? ""} readOnly={readOnly} onCommit={(text) => update({ color: text.trim() || null })} /></div>}
    </fieldset>
  );
}

/** Sizes the circuit by its quantities, shows every step, and takes the result over as one step of the history. */
function SizeCircuit({ id }: { id: string }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const readOnly = useEditor((editor) => editor.readOnly);
  const [sizing, setSizing] = useState<Sizing | null>(null);
  return (
    <section className="mt-4" aria-label="Size this circuit">
      <button type="button" className={`${PRIMARY} h-control w-full`} onClick={() => setSizing(sizeEdit(graph, id))}>Size this circuit</button>
      {sizing && "reason" in sizing && <p role="status" className="mt-2 text-label text-ink2">{sizing.reason}</p>}
      {sizing && "steps" in sizing && (
        <>
          <h3 className={HEADING}><span>Worksheet</span><span className="text-small font-normal text-ink2">as drawn now</span></h3>
          <Worksheet steps={sizing.steps} result={sizing.result} />
          {!readOnly && <button type="button" className={`${BUTTON} mt-2 w-full`} onClick={() => { if (store.getState().run(sizing.commands, sizing.title)) setSizing(null); }}>Take {sizing.result}</button>}
        </>
      )}
    </section>
  );
}
