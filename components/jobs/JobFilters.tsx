import { useId } from "react";
import { OFFICE_STATUSES } from "@/lib/api";
import { Button } from "@/components/ui/Button";
import { EVERYTHING, unusual, type JobsChoice } from "./useJobsChoice";

interface JobFiltersProps { choice: JobsChoice; onChange: (part: Partial<JobsChoice>) => void; jurisdictions: readonly { id: string; name: string }[] }

const DUE: Readonly<Record<JobsChoice["due"], string>> = { any: "any day", soon: "within two weeks", late: "late" };
const SORT: Readonly<Record<JobsChoice["sort"], string>> = { changed: "last change", due: "due date", number: "number", name: "name" };
const STATUS = { any: "any", ...Object.fromEntries(OFFICE_STATUSES.map((each) => [each, each])) } as Record<JobsChoice["status"], string>;

/** What of the register is shown, and in which order. */
export function JobFilters({ choice, onChange, jurisdictions }: JobFiltersProps) {
  const { q: _, tab: __, ...filters } = choice;
  const narrowed = Object.keys(unusual({ ...EVERYTHING, ...filters })).length > 0;
  return (
    <div className="flex min-h-[50px] shrink-0 flex-wrap items-center gap-x-4 gap-y-2 border-b border-g2 bg-vellum px-5 py-2 text-body text-ink2">
      <Choice label="Due" value={choice.due} options={DUE} onChange={(due) => onChange({ due })} />
      <Choice label="Status" value={choice.status} options={STATUS} onChange={(status) => onChange({ status })} />
      {jurisdictions.length > 1 && (
        <Choice label="Jurisdiction" value={choice.jurisdiction} options={{ "": "any", ...Object.fromEntries(jurisdictions.map((each) => [each.id, each.name])) }} onChange={(jurisdiction) => onChange({ jurisdiction })} />
      )}
      <label className="flex h-8 items-center gap-2">
        <input type="checkbox" checked={choice.archived === "yes"} onChange={(event) => onChange({ archived: event.target.checked ? "yes" : "no" })} className="size-4 accent-[var(--ink)]" />
        Archived
      </label>
      {narrowed && <Button size="bar" look="quiet" onClick={() => onChange({ ...EVERYTHING, q: choice.q, tab: choice.tab })}>Clear</Button>}
      <span className="ml-auto"><Choice label="Order" value={choice.sort} options={SORT} onChange={(sort) => onChange({ sort })} /></span>
    </div>
  );
}

interface ChoiceProps<Value extends string> { label: string; value: Value; options: Readonly<Record<Value, string>>; onChange: (value: Value) => void }

/** A small list to choose from; another than the usual, which comes first, stands out. */
function Choice<Value extends string>({ label, value, options, onChange }: ChoiceProps<Value>) {
  const entries = Object.entries(options) as [Value, string][];
  const id = useId();
  return (
    <span className="inline-flex items-center gap-2">
      <label htmlFor={id}>{label}</label>
      <select id={id} value={value} onChange={(event) => onChange(event.target.value as Value)} className={`h-8 max-w-[200px] border bg-paper px-2 text-body text-ink ${value === entries[0]?.[0] ? "border-rule" : "border-ink font-strong"}`}>
        {entries.map(([id, words]) => <option key={id} value={id}>{words}</option>)}
      </select>
    </span>
  );
}
