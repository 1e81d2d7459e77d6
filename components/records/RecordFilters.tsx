import { useEffect, useId, useRef, type ReactNode } from "react";
import { ALL_BUT_DRAWING, BY_ITSELF, RECORD_KINDS } from "@/lib/api";
import type { RecordsChoice } from "@/lib/client/recordsApi";

interface RecordFiltersProps { choice: RecordsChoice; onChange: (choice: RecordsChoice) => void; people: readonly { id: string; name: string }[] }

const CONTROL = "h-bar-control border border-rule bg-paper px-2 text-body text-ink placeholder:text-ink3";

/** What the register is narrowed by: words, kind, person, days. Ctrl F goes to the words. */
export function RecordFilters({ choice, onChange, people }: RecordFiltersProps) {
  const find = useRef<HTMLInputElement>(null);
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (!(event.ctrlKey || event.metaKey) || event.key.toLowerCase() !== "f") return;
      event.preventDefault();
      find.current?.focus();
    };
    window.addEventListener("keydown", onKey);
    return () => window.removeEventListener("keydown", onKey);
  }, []);
  const set = (part: Partial<RecordsChoice>) => onChange({ ...choice, ...part });
  const backwards = choice.from !== "" && choice.to !== "" && choice.from > choice.to;
  return (
    <div role="search" aria-label="Records" className="flex shrink-0 flex-wrap items-end gap-x-3 gap-y-2 border-b-[1.5px] border-ink px-5 pb-3">
      <Labeled label="Find" className="min-w-[180px] flex-1">
        {(id) => <input id={id} ref={find} type="search" value={choice.q} maxLength={120} placeholder="Name, job, action or detail" className={`${CONTROL} w-full`} onChange={(event) => set({ q: event.target.value })} />}
      </Labeled>
      <Labeled label="What">
        {(id) => <select id={id} value={choice.action} className={`${CONTROL} w-[176px]`} onChange={(event) => set({ action: event.target.value })}>
          <option value="">Everything</option>
          <option value={ALL_BUT_DRAWING}>All but drawing edits</option>
          {RECORD_KINDS.map((kind) => <option key={kind.id} value={kind.id}>{kind.label}</option>)}
        </select>}
      </Labeled>
      <Labeled label="Who">
        {(id) => <select id={id} value={choice.person} className={`${CONTROL} w-[150px]`} onChange={(event) => set({ person: event.target.value })}>
          <option value="">Everybody</option>
          {people.map((person) => <option key={person.id} value={person.id}>{person.name}</option>)}
          <option value={BY_ITSELF}>Ferrule itself</option>
        </select>}
      </Labeled>
      <Labeled label="From">{(id) => <input id={id} type="date" value={choice.from} max="9999-12-31" aria-invalid={backwards || undefined} className={`${CONTROL} w-[132px] aria-invalid:border-red`} onChange={(event) => set({ from: event.target.value })} />}</Labeled>
      <Labeled label="Through">{(id) => <input id={id} type="date" value={choice.to} max="9999-12-31" aria-invalid={backwards || undefined} aria-describedby={backwards ? "records-backwards" : undefined} className={`${CONTROL} w-[132px] aria-invalid:border-red`} onChange={(event) => set({ to: event.target.value })} />}</Labeled>
      {backwards && <p id="records-backwards" role="alert" className="w-full text-label font-strong text-red">The first day is after the last one.</p>}
    </div>
  );
}

function Labeled({ label, className = "", children }: { label: string; className?: string; children: (id: string) => ReactNode }) {
  const id = useId();
  return <div className={className}><label htmlFor={id} className="mb-0.5 block text-label font-medium text-ink2">{label}</label>{children(id)}</div>;
}
