"use client";
import { useEditor } from "@/components/diagram/editorContext";
import { HEADING } from "@/components/diagram/chrome/controls";
import { circuitEnd, tagOf } from "@/lib/client/describe";
import { readNumber, showValue } from "@/lib/client/readField";
import { SENSOR_PURPOSES, type Bond, type Drawing, type Sensor } from "@/lib/diagram/schema";
import { CONDUCTOR_SIZES } from "@/lib/units";
import { ChoiceField, FieldGroup, TextField } from "@/components/fields/fields";
import { useEdit } from "./useEdit";

const BOND_KINDS = ["main bonding jumper", "system bonding jumper", "supply-side bonding jumper", "neutral strap", "bonding screw", "neutral relay"] as const;
const INTERLOCK_KINDS = ["mechanical slide", "key", "listed transfer mechanism", "electrical"] as const;
const yes = (value: boolean | null): string => (value === null ? "" : value ? "yes" : "no");
const fromYes = (value: string): boolean | null => (value === "" ? null : value === "yes");
const byTag = (tags: Readonly<Record<string, string>>) => Object.keys(tags).sort((a, b) => (tags[a] ?? "").localeCompare(tags[b] ?? "", "en", { numeric: true }));

/** Current sensor: where it sits, which way it points, who reads it. */
export function SensorForm({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const sensor = graph.drawing.sensors[id] as Sensor;
  const { readOnly, set, take, mark } = useEdit({ collection: "sensors", id });
  const circuits = Object.fromEntries(Object.keys(graph.drawing.circuits).map((each) => [each, `${tagOf(graph, { collection: "circuits", id: each })}, ${circuitEnd(graph, each, "from")} to ${circuitEnd(graph, each, "to")}`]));
  const leads = Object.fromEntries(Object.entries(circuits).filter(([each]) => graph.drawing.circuits[each]?.system === "data"));
  const readers = Object.fromEntries(Object.keys(graph.drawing.equipment).filter((each) => graph.ports(each).some((port) => port.system === "data")).map((each) => [each, tagOf(graph, { collection: "equipment", id: each })]));
  return (
    <FieldGroup title="Sensor">
      <ChoiceField label="On circuit" wide value={sensor.circuit} options={byTag(circuits)} words={circuits} unknown={false} readOnly={readOnly} onCommit={(value) => set("circuit", value)} />
      <ChoiceField label="Measures" wide value={sensor.purpose ?? ""} options={SENSOR_PURPOSES} readOnly={readOnly} mark={mark("purpose")} onCommit={(value) => set("purpose", value || null)} />
      <ChoiceField label="Arrow toward" wide value={sensor.arrow ?? ""} options={["from", "to"]} words={{ from: circuitEnd(graph, sensor.circuit, "from"), to: circuitEnd(graph, sensor.circuit, "to") }} readOnly={readOnly} mark={mark("arrow")} onCommit={(value) => set("arrow", value || null)} />
      <ChoiceField label="Conductor" value={sensor.pole ?? ""} options={["L1", "L2", "L3"]} readOnly={readOnly} mark={mark("pole")} onCommit={(value) => set("pole", value || null)} />
      <TextField label="Ratio" value={sensor.ratio ?? ""} readOnly={readOnly} mark={mark("ratio")} onCommit={(text) => set("ratio", text.trim() || null)} />
      <TextField label="Rating" unit="A" value={showValue(sensor.ratingA)} readOnly={readOnly} mark={mark("ratingA")} onCommit={(text) => take("ratingA", readNumber(text, "A", 0, 10000))} />
      <TextField label="Rating as set in the reader" unit="A" value={showValue(sensor.settingA ?? null)} readOnly={readOnly} mark={mark("settingA")} onCommit={(text) => take("settingA", readNumber(text, "A", 0, 10000))} />
      <ChoiceField label="One sensor measures" wide value={sensor.covers ?? ""} options={["its conductor", "all conductors"]} readOnly={readOnly} mark={mark("covers")} onCommit={(value) => set("covers", value || null)} />
      <ChoiceField label="Lead" wide value={sensor.lead ?? ""} options={byTag(leads)} words={leads} readOnly={readOnly} mark={mark("lead")} onCommit={(value) => set("lead", value || null)} />
      {!sensor.lead && <TextField label="Lead inside the enclosure" unit="ft" value={showValue(sensor.leadLengthFt ?? null)} readOnly={readOnly} mark={mark("leadLengthFt")} onCommit={(text) => take("leadLengthFt", readNumber(text, "ft", 0, 2000))} />}
      <TextField label="Leads at most" unit="ft" value={showValue(sensor.leadLimitFt)} readOnly={readOnly} mark={mark("leadLimitFt")} onCommit={(text) => take("leadLimitFt", readNumber(text, "ft", 0, 2000))} />
      <ChoiceField label="Read by" wide value={sensor.reads ?? ""} options={byTag(readers)} words={readers} readOnly={readOnly} mark={mark("reads")} onCommit={(value) => set("reads", value || null)} />
      <TextField label="Instruction, page" wide value={sensor.instruction ? `${sensor.instruction.document}, p. ${sensor.instruction.page}` : ""} readOnly={readOnly} mark={mark("instruction")} onCommit={(text) => {
        const [document = "", page = ""] = text.split(/,?\s*p\.\s*/);
        return set("instruction", text.trim() === "" ? null : { document: document.trim().slice(0, 120), page: page.trim().slice(0, 40) });
      }} />
    </FieldGroup>
  );
}

/** Joint between neutral and ground: which part it is, where, and whether it is fitted. */
export function BondForm({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const bond = graph.drawing.bonds[id] as Bond;
  const { readOnly, set, mark } = useEdit({ collection: "bonds", id });
  const owners = Object.fromEntries(Object.keys(graph.drawing.equipment).filter((each) => !graph.drawing.equipment[each]?.integral).map((each) => [each, tagOf(graph, { collection: "equipment", id: each })]));
  return (
    <FieldGroup title="Bond">
      <ChoiceField label="Part" wide value={bond.kind} options={BOND_KINDS} unknown={false} readOnly={readOnly} onCommit={(value) => set("kind", value)} />
      <ChoiceField label="In" wide value={bond.equipment} options={byTag(owners)} words={owners} unknown={false} readOnly={readOnly} onCommit={(value) => set("equipment", value)} />
      <ChoiceField label="Fitted" value={yes(bond.fitted)} options={["yes", "no"]} words={{ yes: "yes, in place", no: "no, removed" }} readOnly={readOnly} mark={mark("fitted")} onCommit={(value) => set("fitted", fromYes(value))} />
      <TextField label="Size" value={bond.size ?? ""} list={CONDUCTOR_SIZES} readOnly={readOnly} mark={mark("size")} onCommit={(text) => set("size", text.trim() || null)} />
      {bond.kind === "neutral relay" && <ChoiceField label="Closes" wide value={bond.closes} options={["always", "island"]} words={{ always: "always", island: "in island operation" }} unknown={false} readOnly={readOnly} onCommit={(value) => set("closes", value)} />}
    </FieldGroup>
  );
}

/** Exclusion of switches: of those ticked, at most one can be closed. */
export function InterlockForm({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const interlock = graph.drawing.interlocks[id] as Drawing["interlocks"][string];
  const { readOnly, set, mark } = useEdit({ collection: "interlocks", id });
  const tags = Object.fromEntries(Object.keys(graph.drawing.equipment).filter((each) => graph.kind(each).capabilities.switching).map((each) => [each, tagOf(graph, { collection: "equipment", id: each })]));
  const toggle = (equipment: string, on: boolean): void => {
    const switches = { ...interlock.switches };
    if (on) switches[equipment] = true;
    else delete switches[equipment];
    set("switches", switches, `interlock ${interlock.tag}`);
  };
  return (
    <>
      <FieldGroup title="Interlock">
        <ChoiceField label="Means" wide value={interlock.kind} options={INTERLOCK_KINDS} unknown={false} readOnly={readOnly} onCommit={(value) => set("kind", value)} />
        <ChoiceField label="Listed" value={yes(interlock.listed)} options={["yes", "no"]} readOnly={readOnly} mark={mark("listed")} onCommit={(value) => set("listed", fromYes(value))} />
        <TextField label="Note" empty="none" wide value={interlock.note} readOnly={readOnly} onCommit={(text) => set("note", text)} />
      </FieldGroup>
      <fieldset>
        <legend className={`${HEADING} w-full`}>At most one closed</legend>
        <ul className="list-none">
          {byTag(tags).map((each) => (
            <li key={each} className="border-b border-desk2"><label className="flex items-center gap-2 py-1 text-body"><input type="checkbox" className="size-4 accent-ink" disabled={readOnly} checked={interlock.switches[each] === true} onChange={(event) => toggle(each, event.target.checked)} />{tags[each]}</label></li>
          ))}
          {Object.keys(tags).length === 0 && <li className="py-1 text-label text-ink2">No switch or breaker is drawn yet.</li>}
        </ul>
      </fieldset>
    </>
  );
}

/** A note on the sheet. */
export function TextForm({ id }: { id: string }) {
  const text = useEditor((editor) => editor.graph.drawing.texts[id]);
  const { readOnly, set } = useEdit({ collection: "texts", id });
  if (!text) return null;
  return (
    <FieldGroup title="Note">
      <TextField label="Words (a bar starts a new line)" wide value={text.lines.replace(/\n/g, " | ")} readOnly={readOnly} onCommit={(typed) => set("lines", typed.replace(/\s*\|\s*/g, "\n"), "note")} />
      <ChoiceField label="Lettering" value={text.style} options={["note", "heading", "compartment"]} unknown={false} readOnly={readOnly} onCommit={(value) => set("style", value)} />
      <TextField label="Keynote number" value={text.keynote ?? ""} readOnly={readOnly} onCommit={(typed) => set("keynote", typed.trim() || null)} />
    </FieldGroup>
  );
}
