"use client";

import { useState } from "react";
import { kindDefinition } from "@/lib/equipment/registry";
import { wholeEquipmentData } from "@/lib/equipment/libraryData";
import { PortFields, PropertyField, propertyGroups, unknownWords, type PropertyGroup } from "@/components/fields/equipmentFields";
import { FieldGroup } from "@/components/fields/fields";
import { Button } from "@/components/ui/Button";
import { TextField } from "@/components/ui/Field";
import { RatedTable, type SourceEditing } from "./RatedTable";
import { sourceForAll, unsourced, withPort, withProperty, withSource, type EntryDraft } from "./entryDraft";

interface EntryFieldsProps extends Pick<SourceEditing, "readOnly" | "datasheets" | "onUpload"> {
  kind: string;
  draft: EntryDraft;
  onDraft: (change: (now: EntryDraft) => EntryDraft) => void;
  nameError?: string | undefined;
}

const ORDER: readonly PropertyGroup["id"][] = ["identity", "rating", "settings", "construction", "place"];

/** Everything an entry says, built from its kind's description. */
export function EntryFields({ kind, draft, onDraft, nameError, ...sources }: EntryFieldsProps) {
  const definition = kindDefinition(kind);
  const { props } = draft.data;
  const groups = propertyGroups(definition.properties, props).sort((a, b) => ORDER.indexOf(a.id) - ORDER.indexOf(b.id));
  const ports = definition.ports(wholeEquipmentData(definition, draft.data).props as never).filter((port) => port.system !== "data");
  const editing: SourceEditing = {
    ...sources,
    onProperty: (name, value) => onDraft((now) => withProperty(now, name, value)),
    onSource: (name, source) => onDraft((now) => withSource(now, name, source)),
  };
  const place = groups.find((group) => group.id === "place");
  return (
    <div className="px-6 pt-5 pb-6 phone:px-4">
      <TextField label="Name" name="name" className="max-w-[520px]" value={draft.name} maxLength={120} error={nameError} readOnly={sources.readOnly} placeholder="As your company calls it" onChange={(event) => onDraft((now) => ({ ...now, name: event.target.value }))} />
      {!sources.readOnly && <SourceAll kind={kind} draft={draft} onDraft={onDraft} datasheets={sources.datasheets} />}
      {groups.filter((group) => group !== place).map((group) => <Group key={group.id} group={group} draft={draft} editing={editing} />)}
      {ports.length > 0 && <p className="mt-5 text-body text-ink2">Ports: ratings and terminals as marked. A drawing asks for them where a conductor lands.</p>}
      {ports.map((port) => (
        <PortFields key={port.id} port={port} data={draft.data.ports[port.id] ?? {}} readOnly={sources.readOnly} columns={4} onCommit={(data) => { onDraft((now) => withPort(now, port.id, data)); return null; }} />
      ))}
      {place && <Group group={place} draft={draft} editing={editing} open={false} />}
    </div>
  );
}

function Group({ group, draft, editing, open = true }: { group: PropertyGroup; draft: EntryDraft; editing: SourceEditing; open?: boolean }) {
  const rated = group.entries.filter(([, property]) => property.rated);
  const others = group.entries.filter(([, property]) => !property.rated);
  const title = group.id === "place" ? `${group.title}, usually filled in for the job` : group.title;
  return (
    <div className="mt-2">
      {rated.length > 0 && (
        <>
          <h2 className="mt-5 flex items-baseline justify-between border-b border-ink pb-1 text-finding font-heading"><span>{title}</span><span className="text-small font-normal text-ink2">{unknownWords(group.unknown)}</span></h2>
          <RatedTable caption={group.title} entries={rated} draft={draft} {...editing} />
        </>
      )}
      {others.length > 0 && (
        <FieldGroup title={rated.length > 0 ? `${group.title}, not from a datasheet` : title} {...(rated.length > 0 ? {} : { note: unknownWords(group.unknown) })} columns={4} open={open}>
          {others.map(([name, property]) => (
            <PropertyField key={name} property={property} value={draft.data.props[name]} readOnly={editing.readOnly} onCommit={(value) => { editing.onProperty(name, value); return null; }} />
          ))}
        </FieldGroup>
      )}
    </div>
  );
}

/** Names one document for all values that have none: most products have one datasheet. */
function SourceAll({ kind, draft, onDraft, datasheets }: Pick<EntryFieldsProps, "kind" | "draft" | "onDraft" | "datasheets">) {
  const definition = kindDefinition(kind);
  const open = unsourced(definition, draft.data).length;
  const [document, setDocument] = useState("");
  const file = datasheets.find((each) => each.name.replace(/\.pdf$/i, "") === document.trim());
  if (open === 0) return null;
  const apply = () => document.trim() !== "" && onDraft((now) => sourceForAll(definition, now, document.trim(), file?.id));
  return (
    <div onInput={(event) => event.stopPropagation()} className="mt-4 flex flex-wrap items-end gap-3 border-l-[3px] border-ochre bg-vellum px-4 py-3">
      <p className="min-w-[220px] flex-1 self-center text-text">{open === 1 ? "One rated value does" : `${open} rated values do`} not say where {open === 1 ? "it was" : "they were"} read. A checker can follow only what names its document and page.</p>
      <TextField label="Document for all of them" className="w-[260px]" list="library-datasheets" value={document} maxLength={120} onChange={(event) => setDocument(event.target.value)} onKeyDown={(event) => { if (event.key === "Enter") { event.preventDefault(); apply(); } }} />
      <datalist id="library-datasheets">{datasheets.map((each) => <option key={each.id} value={each.name.replace(/\.pdf$/i, "")} />)}</datalist>
      <Button disabled={document.trim() === ""} onClick={apply}>Name it</Button>
    </div>
  );
}
