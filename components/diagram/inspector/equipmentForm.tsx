"use client";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { circuitEnd, tagOf } from "@/lib/client/describe";
import { readNumber, showValue } from "@/lib/client/readField";
import type { Equipment } from "@/lib/diagram/schema";
import type { PortInfo } from "@/lib/diagram/graph";
import type { Property } from "@/lib/equipment/define";
import { PortFields, PropertyField, propertyGroups, unknownWords } from "@/components/fields/equipmentFields";
import { ChoiceField, FieldGroup, SourceLine, TextField } from "@/components/fields/fields";
import { LibraryBlock } from "./libraryBlock";
import { useEdit } from "./useEdit";

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
      <LibraryBlock id={id} />
      {propertyGroups(properties, equipment.props).map((group) => (
        <FieldGroup key={group.id} title={group.title} note={unknownWords(group.unknown)} open={group.id === "rating" || group.id === "settings" || group.id === "construction"}>
          {group.entries.map(([name, property]) => <SourcedField key={name} id={id} name={name} property={property} />)}
        </FieldGroup>
      ))}
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

function SourcedField({ id, name, property }: { id: string; name: string; property: Property }) {
  const equipment = useEditor((editor) => editor.graph.drawing.equipment[id]) as Equipment;
  const { readOnly, set, mark } = useEdit({ collection: "equipment", id });
  const field = `props.${name}`;
  const value = equipment.props[name];
  const source = equipment.sources[name];
  const main = <PropertyField property={property} value={value} readOnly={readOnly} mark={mark(field)} onCommit={(typed) => set(field, typed, `${property.label.toLowerCase()} of ${equipment.tag}`)} />;
  if (!property.rated || value === null || value === undefined || value === "") return main;
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

function Ports({ id }: { id: string }) {
  const graph = useEditor((editor) => editor.graph);
  const ports = graph.ports(id).filter((port) => port.system !== "data");
  if (ports.length === 0) return null;
  return <>{ports.map((port) => <EditedPort key={port.id} id={id} port={port} />)}</>;
}

function EditedPort({ id, port }: { id: string; port: PortInfo }) {
  const { readOnly, set, mark } = useEdit({ collection: "equipment", id });
  const base = `ports.${port.id}`;
  return <PortFields port={port} data={port.data} readOnly={readOnly} mark={(field) => mark(`${base}.${field}`)} onCommit={(data) => set(base, data, `${port.label.toLowerCase()} port`)} />;
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
