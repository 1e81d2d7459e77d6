"use client";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { circuitEnd, tagOf } from "@/lib/client/describe";
import { readNumber, readProperty, showValue } from "@/lib/client/readField";
import { TERMINAL_METALS, type Equipment, type PortData } from "@/lib/diagram/schema";
import type { PortInfo } from "@/lib/diagram/graph";
import type { Property } from "@/lib/equipment/define";
import { ChoiceField, FieldGroup, SourceLine, TextField } from "./fields";
import { useEdit } from "./useEdit";

const GROUPS = [["rating", "Ratings"], ["settings", "Settings"], ["construction", "Construction"], ["place", "Place and working space"], ["identity", "Make and listing"]] as const;
const STATUSES = ["new", "existing", "relocated", "removed"] as const;
const EXPOSURES = ["indoor dry", "indoor damp", "outdoor", "roof", "underground"] as const;

/** Everything known about one piece of equipment, built from its kind's description. */
export function EquipmentForm({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const equipment = graph.drawing.equipment[id] as Equipment;
  const { properties } = graph.kind(id);
  const ref = { collection: "equipment", id } as const;
  const { readOnly, set, take } = useEdit(ref);
  return (
    <>
      {GROUPS.map(([group, title]) => {
        const entries = Object.entries(properties).filter(([, property]) => property.group === group);
        if (entries.length === 0) return null;
        const unknown = entries.filter(([name]) => equipment.props[name] === null || equipment.props[name] === undefined).length;
        return (
          <FieldGroup key={group} title={title} note={unknown > 0 ? `${unknown} not known` : "all known"} open={group === "rating" || group === "settings" || group === "construction"}>
            {entries.map(([name, property]) => <PropertyField key={name} id={id} name={name} property={property} />)}
          </FieldGroup>
        );
      })}
      <Ports id={id} />
      <Landed id={id} />
      <FieldGroup title="On the sheet" open={false}>
        <ChoiceField label="Status" value={equipment.status} options={STATUSES} unknown={false} readOnly={readOnly} onCommit={(value) => set("status", value)} />
        {equipment.spaces !== null && <TextField label="Panel spaces" value={equipment.spaces.join(", ")} readOnly={readOnly} onCommit={(text) => {
          const spaces = text.split(/[\s,]+/).filter(Boolean).map(Number);
          return spaces.every((space) => Number.isInteger(space) && space > 0) ? set("spaces", spaces) : "write space numbers, for example 1, 3";
        }} />}
        <TextField label="Building" value={equipment.location.building ?? ""} readOnly={readOnly} onCommit={(text) => set("location.building", text.trim() || null)} />
        <TextField label="Place" value={equipment.location.place ?? ""} readOnly={readOnly} onCommit={(text) => set("location.place", text.trim() || null)} />
        <ChoiceField label="Exposure" value={equipment.location.exposure ?? ""} options={EXPOSURES} readOnly={readOnly} onCommit={(value) => set("location.exposure", value || null)} />
        <TextField label="Ambient" unit="°C" value={showValue(equipment.location.ambientC)} readOnly={readOnly} onCommit={(text) => take("location.ambientC", readNumber(text, "°C", -60, 120))} />
        <TextField label="Note" empty="none" value={equipment.note} wide readOnly={readOnly} onCommit={(text) => set("note", text)} />
      </FieldGroup>
    </>
  );
}

function PropertyField({ id, name, property }: { id: string; name: string; property: Property }) {
  const equipment = useEditor((editor) => editor.graph.drawing.equipment[id]) as Equipment;
  const { readOnly, set, take, mark } = useEdit({ collection: "equipment", id });
  const field = `props.${name}`;
  const value = showValue(equipment.props[name]);
  const source = equipment.sources[name];
  const common = { label: property.label, value, readOnly, mark: mark(field), onCommit: (text: string) => take(field, readProperty(text, property), `${property.label.toLowerCase()} of ${equipment.tag}`) };
  const main = property.type === "choice" ? <ChoiceField {...common} options={property.options} />
    : property.type === "flag" ? <ChoiceField {...common} options={["yes", "no"]} />
    : <TextField {...common} {...(property.type === "number" && property.unit ? { unit: property.unit } : {})} {...(property.help ? { hint: property.help } : {})} />;
  if (!property.rated || value === "") return main;
  return (
    <div className="flex min-w-0 flex-col justify-end">
      {main}
      <SourceLine label={`Source and page of ${property.label.toLowerCase()}`} value={source ? [source.document, source.page].filter(Boolean).join(", p. ") : ""} readOnly={readOnly} onCommit={(text) => {
        const [document = "", page = ""] = text.split(/,?\s*(?:p\.|page)\s*/i);
        return set(`sources.${name}`, text.trim() === "" ? null : { document: document.trim().slice(0, 120), page: page.trim().slice(0, 40) }, `source of ${property.label.toLowerCase()}`);
      }} />
    </div>
  );
}

const PORT_NUMBERS = [["continuousA", "Continuous", "A", 10000], ["maximumA", "Largest", "A", 10000], ["maximumOvercurrentA", "Largest device", "A", 10000], ["nominalV", "Nominal", "V", 40000], ["maximumV", "Largest", "V", 40000]] as const;

function Ports({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const ports = graph.ports(id).filter((port) => port.system !== "data");
  if (ports.length === 0) return null;
  return <>{ports.map((port) => <PortFields key={port.id} id={id} port={port} />)}</>;
}

function PortFields({ id, port }: { id: string; port: PortInfo }) {
  const { readOnly, set, mark } = useEdit({ collection: "equipment", id });
  const data: PortData = port.data;
  const terminal = data.terminal;
  const base = `ports.${port.id}`;
  // A port holds no values until the first is entered; the whole entry is written then.
  const setPort = (name: keyof PortData, value: unknown): string | null => set(base, { ...data, [name]: value }, `${port.label.toLowerCase()} port`);
  const setTerminal = (name: string, value: unknown): string | null => setPort("terminal", { ...(terminal ?? { temperatureC: null, metals: null, smallest: null, largest: null, torqueLbfIn: null, torqueSource: null }), [name]: value });
  const text = (name: string, label: string, value: string | null | undefined) => <TextField label={label} value={value ?? ""} readOnly={readOnly} mark={mark(`${base}.terminal.${name}`)} onCommit={(typed) => setTerminal(name, typed.trim() || null)} />;
  return (
    <FieldGroup title={`${port.label} port`} note={port.poles.join(" ")} open={false}>
      {port.system !== "ground" && PORT_NUMBERS.map(([name, label, unit, most]) => (
        <TextField key={name} label={label} unit={unit} value={showValue(data[name])} readOnly={readOnly} mark={mark(`${base}.${name}`)} onCommit={(typed) => {
          const answer = readNumber(typed, unit, 0, most);
          return answer.ok ? setPort(name, answer.value) : answer.reason;
        }} />
      ))}
      <ChoiceField label="Terminal marked" value={terminal?.temperatureC?.toString() ?? ""} options={["60", "75", "90"]} words={{ 60: "60 °C", 75: "75 °C", 90: "90 °C" }} readOnly={readOnly} mark={mark(`${base}.terminal.temperatureC`)} onCommit={(value) => setTerminal("temperatureC", value ? Number(value) : null)} />
      <ChoiceField label="Metals" value={terminal?.metals ?? ""} options={TERMINAL_METALS} readOnly={readOnly} mark={mark(`${base}.terminal.metals`)} onCommit={(value) => setTerminal("metals", value || null)} />
      {text("smallest", "Smallest wire", terminal?.smallest)}
      {text("largest", "Largest wire", terminal?.largest)}
      <TextField label="Torque" unit="lbf·in" value={showValue(terminal?.torqueLbfIn)} readOnly={readOnly} mark={mark(`${base}.terminal.torqueLbfIn`)} onCommit={(typed) => { const answer = readNumber(typed, "lbf·in", 0.5, 5000); return answer.ok ? setTerminal("torqueLbfIn", answer.value) : answer.reason; }} />
      {text("torqueSource", "Torque from", terminal?.torqueSource)}
      <TextField label="Conductors in one" value={showValue(terminal?.conductorsMost)} readOnly={readOnly} mark={mark(`${base}.terminal.conductorsMost`)} onCommit={(typed) => { const answer = readNumber(typed, "", 1, 12); return answer.ok ? setTerminal("conductorsMost", answer.value) : answer.reason; }} />
      <YesNo label="For fine strands" value={terminal?.fineStrand} readOnly={readOnly} mark={mark(`${base}.terminal.fineStrand`)} onCommit={(value) => setTerminal("fineStrand", value)} />
      {(terminal?.temperatureC ?? null) === null && <YesNo label="No °C mark found" value={terminal?.noTemperatureMark} readOnly={readOnly} mark={mark(`${base}.terminal.noTemperatureMark`)} onCommit={(value) => setTerminal("noTemperatureMark", value)} />}
    </FieldGroup>
  );
}

type Choice = Parameters<typeof ChoiceField>[0];
/** A fact that is yes, no or not known. */
function YesNo({ value, onCommit, ...rest }: Pick<Choice, "label" | "readOnly" | "mark"> & { value: boolean | null | undefined; onCommit: (value: boolean | null) => string | null }) {
  return <ChoiceField {...rest} value={value === true ? "yes" : value === false ? "no" : ""} options={["yes", "no"]} onCommit={(chosen) => onCommit(chosen === "" ? null : chosen === "yes")} />;
}

function Landed({ id }: { id: string }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const circuits = graph.circuitsAt(id);
  return (
    <FieldGroup title="Circuits landed" note={String(circuits.length)}>
      <ul className="col-span-2 list-none">
        {circuits.map((circuit) => {
          const here = graph.drawing.circuits[circuit]?.from.equipment === id ? "from" : "to";
          return (
            <li key={circuit}>
              <button type="button" className="flex w-full justify-between gap-2 border-b border-desk2 py-1 text-left text-label hover:bg-panel" onClick={() => store.getState().select([{ collection: "circuits", id: circuit }])}>
                <span className="font-finding">{tagOf(graph, { collection: "circuits", id: circuit })}</span><span className="text-ink2 stretch-label">{circuitEnd(graph, circuit, here === "from" ? "to" : "from")}</span>
              </button>
            </li>
          );
        })}
        {circuits.length === 0 && <li className="py-1 text-label text-ink2">None yet. Drag from a port, or select a port and press J.</li>}
      </ul>
    </FieldGroup>
  );
}
