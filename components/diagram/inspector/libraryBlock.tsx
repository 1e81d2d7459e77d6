"use client";
import { useQuery } from "@tanstack/react-query";
import { useParams } from "next/navigation";
import { useState } from "react";
import type { JobLibraryAnswer } from "@/lib/api";
import { request } from "@/lib/client/api";
import { useEditor } from "@/components/diagram/editorContext";
import { Button } from "@/components/ui/Button";
import { FieldGroup } from "@/components/fields/fields";
import type { Equipment } from "@/lib/diagram/schema";
import { kindDefinition } from "@/lib/equipment/registry";
import { useEdit } from "./useEdit";

type Entry = JobLibraryAnswer["entries"][number];
/** A value as it is read: with its unit, yes and no in words. */
const shown = (value: unknown, unit: string): string => (value === null || value === undefined ? "not known" : typeof value === "boolean" ? (value ? "yes" : "no") : [String(value), unit].filter(Boolean).join(" "));

/** Values of an entry that the drawing holds otherwise. */
function differences(equipment: Equipment, entry: Entry) {
  const { properties } = kindDefinition(equipment.kind);
  return Object.entries(entry.data.props).flatMap(([name, value]) => {
    const property = properties[name];
    if (value === null || !property || equipment.props[name] === value) return [];
    const unit = property.type === "number" ? property.unit : "";
    return [{ name, label: property.label, drawn: shown(equipment.props[name], unit), now: shown(value, unit) }];
  });
}

/** Which entry of the company's library the ratings came from, and what has changed there since. */
export function LibraryBlock({ id }: { id: string }) {
  const { jobId } = useParams<{ jobId: string }>();
  const equipment = useEditor((editor) => editor.graph.drawing.equipment[id]) as Equipment;
  const { readOnly, run } = useEdit({ collection: "equipment", id });
  const [chosen, setChosen] = useState("");
  const [refused, setRefused] = useState<string | null>(null);
  const library = useQuery({
    queryKey: ["job", jobId, "library", equipment.kind], staleTime: 30_000, enabled: Boolean(jobId),
    queryFn: ({ signal }) => request<JobLibraryAnswer>("GET", `/api/jobs/${encodeURIComponent(jobId)}/library?kind=${encodeURIComponent(equipment.kind)}`, undefined, signal),
  });
  const entries = library.data?.entries ?? [];
  const own = equipment.library ? entries.find((each) => each.id === equipment.library?.entry) : undefined;
  const picked = entries.find((each) => each.id === chosen);
  const take = (entry: Entry): void => setRefused(run([{ type: "takeFromLibrary", id, from: { ref: { entry: entry.id, version: entry.version }, name: entry.name, data: entry.data } }]));
  if (!equipment.library && (readOnly || entries.length === 0)) return null;
  const later = own && equipment.library && own.version > equipment.library.version ? own : null;
  const changed = own ? differences(equipment, own) : [];
  return (
    <FieldGroup title="Library" note={equipment.library ? (later ? `version ${later.version} is there` : own ? own.name : "entry not in the library") : "not chosen"} open={equipment.library !== undefined}>
      <div className="col-span-full grid gap-2 text-body">
        {equipment.library && own && <p>{own.name}, version {equipment.library.version}{own.starter ? ". Its values are invented examples: replace them from the datasheet." : "."}</p>}
        {equipment.library && !own && library.data && <p>The entry is archived or belongs to another company. The values stay as drawn.</p>}
        {changed.length > 0 && (
          <>
            <p className="text-ink2">{later ? `Version ${later.version} differs from what is drawn:` : "Differs from the library:"}</p>
            <ul className="grid gap-1">{changed.map((each) => <li key={each.name}>{each.label}: {each.drawn} → {each.now}</li>)}</ul>
          </>
        )}
        {!readOnly && later && <Button size="bar" onClick={() => take(later)}>Take over version {later.version}</Button>}
        {!readOnly && (
          <div className="flex flex-wrap items-end gap-2">
            <div className="grid min-w-0 flex-1 gap-1 text-label text-ink2">
              {/* The list stands beside its label, not in it: a label is read with everything inside. */}
              <span aria-hidden="true">{equipment.library ? "Another entry" : "Choose from the library"}</span>
              <select aria-label={equipment.library ? "Another entry" : "Choose from the library"} value={chosen} onChange={(event) => setChosen(event.target.value)} className="h-bar-control w-full min-w-0 border border-rule bg-paper px-2 text-body text-ink">
                <option value="">choose</option>
                {entries.map((each) => <option key={each.id} value={each.id}>{each.name}</option>)}
              </select>
            </div>
            <Button size="bar" disabled={!picked} onClick={() => { if (picked) take(picked); setChosen(""); }}>Take its ratings</Button>
          </div>
        )}
        {refused && <p role="alert" className="font-strong text-red">{refused}</p>}
      </div>
    </FieldGroup>
  );
}
