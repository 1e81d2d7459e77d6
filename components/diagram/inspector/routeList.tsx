"use client";
import { BUTTON, HEADING } from "@/components/diagram/chrome/controls";
import { useEditor, useEditorStore } from "@/components/diagram/editorContext";
import { kindOf, tagOf } from "@/lib/client/describe";
import type { RouteStep, Section } from "@/lib/diagram/schema";
import { ChoiceField } from "@/components/fields/fields";

/** Raceways a section passes, in order from the circuit's first end; each can be moved, put into a compartment or taken out. */
export function RouteList({ section, readOnly, onRoute }: { section: Section & { id: string }; readOnly: boolean; onRoute: (route: readonly RouteStep[]) => string | null }) {
  const store = useEditorStore();
  const graph = useEditor((editor) => editor.graph);
  const { raceways } = graph.drawing;
  const { route } = section;
  const used = new Set(route.map((step) => step.raceway));
  const free = Object.keys(raceways).filter((id) => !used.has(id)).sort((a, b) => tagOf(graph, { collection: "raceways", id: a }).localeCompare(tagOf(graph, { collection: "raceways", id: b }), "en", { numeric: true }));
  const moved = (index: number, by: number): RouteStep[] => {
    const next = [...route];
    const [step] = next.splice(index, 1);
    if (step) next.splice(index + by, 0, step);
    return next;
  };
  return (
    <section aria-label="Route">
      <h3 className={HEADING}><span>Route</span><span className="text-small font-normal text-ink2">{route.length === 0 ? "not routed" : `${route.length} ${route.length === 1 ? "raceway" : "raceways"}`}</span></h3>
      <ol className="list-none">
        {route.map((step, index) => {
          const raceway = raceways[step.raceway];
          const ref = { collection: "raceways", id: step.raceway } as const;
          const tag = raceway ? tagOf(graph, ref) : "missing raceway";
          const compartments = Object.entries(raceway?.compartments ?? {}).sort(([, a], [, b]) => a.order - b.order);
          return (
            <li key={`${step.raceway}-${index}`} className="border-b border-desk2 py-1">
              <div className="flex items-center gap-1.5">
                <button type="button" className="font-finding" onClick={() => store.getState().select([ref])}>{tag}</button>
                <span className="text-label text-ink2 stretch-label">{raceway ? [raceway.tradeSize && `${raceway.tradeSize} in`, kindOf(graph, ref).toLowerCase()].filter(Boolean).join(" ") : ""}</span>
                {!readOnly && (
                  <span className="ml-auto flex">
                    <button type="button" className="px-1.5 disabled:opacity-30" aria-label={`Move ${tag} earlier`} disabled={index === 0} onClick={() => onRoute(moved(index, -1))}>↑</button>
                    <button type="button" className="px-1.5 disabled:opacity-30" aria-label={`Move ${tag} later`} disabled={index === route.length - 1} onClick={() => onRoute(moved(index, 1))}>↓</button>
                    <button type="button" className="px-1.5" aria-label={`Take out of ${tag}`} onClick={() => onRoute(route.filter((_, at) => at !== index))}>×</button>
                  </span>
                )}
              </div>
              {compartments.length > 1 && (
                <ChoiceField label={`Compartment of ${tag}`} value={step.compartment ?? ""} options={compartments.map(([id]) => id)} words={Object.fromEntries(compartments.map(([id, each]) => [id, each.name]))} readOnly={readOnly}
                  onCommit={(value) => onRoute(route.map((each, at) => (at === index ? { ...each, compartment: value || null } : each)))} />
              )}
            </li>
          );
        })}
      </ol>
      {!readOnly && (free.length > 0
        ? <AddStep options={free.map((id) => ({ id, label: `${tagOf(graph, { collection: "raceways", id })}, ${kindOf(graph, { collection: "raceways", id }).toLowerCase()}` }))} onAdd={(id) => onRoute([...route, { raceway: id, compartment: onlyCompartment(raceways[id]?.compartments) }])} />
        : <p className="py-1 text-label text-ink2">{Object.keys(raceways).length === 0 ? "No raceway is drawn yet. Place a conduit, nipple or wireway first." : "It passes every raceway of the drawing."}</p>)}
    </section>
  );
}

const onlyCompartment = (compartments: Readonly<Record<string, unknown>> | undefined): string | null => {
  const ids = Object.keys(compartments ?? {});
  return ids.length === 1 ? ids[0] ?? null : null;
};

function AddStep({ options, onAdd }: { options: readonly { id: string; label: string }[]; onAdd: (id: string) => void }) {
  return (
    <label className="mt-1.5 block">
      <span className="sr-only">Add a raceway to the route</span>
      <select className={`${BUTTON} w-full justify-start font-normal`} value="" onChange={(event) => { if (event.target.value) onAdd(event.target.value); }}>
        <option value="">Add a raceway…</option>
        {options.map((option) => <option key={option.id} value={option.id}>{option.label}</option>)}
      </select>
    </label>
  );
}
