import { OFFICE_STATUSES } from "@/lib/api";
import type { JobsAsked } from "@/lib/client/jobsApi";
import { Button } from "@/components/ui/Button";

export interface JobFilters { due: NonNullable<JobsAsked["due"]>; status: NonNullable<JobsAsked["status"]>; jurisdiction: string; archived: boolean; sort: NonNullable<JobsAsked["sort"]> }
export const NO_FILTERS: JobFilters = { due: "any", status: "any", jurisdiction: "", archived: false, sort: "changed" };

/** Filters as the server is asked for them; what is at its usual value is not asked for. */
export const askedBy = ({ due, status, jurisdiction, archived, sort }: JobFilters): JobsAsked => ({
  ...(due === "any" ? {} : { due }), ...(status === "any" ? {} : { status }), ...(jurisdiction ? { jurisdiction } : {}), ...(archived ? { archived: "yes" as const } : {}), ...(sort === "changed" ? {} : { sort }),
});

interface JobFiltersRowProps { filters: JobFilters; onChange: (filters: JobFilters) => void; jurisdictions: readonly { id: string; name: string }[] }

const SELECT = "h-8 max-w-[220px] border border-rule bg-paper px-2 text-body text-ink";
const DUE: Readonly<Record<JobFilters["due"], string>> = { any: "any day", soon: "within two weeks", late: "late" };
const SORT: Readonly<Record<JobFilters["sort"], string>> = { changed: "last changed", due: "due", number: "number", name: "name" };

/** What of the register is shown, and in which order. */
export function JobFiltersRow({ filters, onChange, jurisdictions }: JobFiltersRowProps) {
  const set = (change: Partial<JobFilters>) => onChange({ ...filters, ...change });
  const dirty = Object.keys(askedBy(filters)).length > 0;
  return (
    <div className="flex shrink-0 flex-wrap items-center gap-x-5 gap-y-2 border-b border-g2 bg-vellum px-5 py-2 text-body text-ink2">
      <Choice label="Due" value={filters.due} options={DUE} onChange={(due) => set({ due })} />
      <Choice label="Office status" value={filters.status} options={{ any: "any", ...Object.fromEntries(OFFICE_STATUSES.map((each) => [each, each])) } as Record<JobFilters["status"], string>} onChange={(status) => set({ status })} />
      {jurisdictions.length > 1 && (
        <Choice label="Jurisdiction" value={filters.jurisdiction} options={{ "": "any", ...Object.fromEntries(jurisdictions.map((each) => [each.id, each.name])) }} onChange={(jurisdiction) => set({ jurisdiction })} />
      )}
      <Choice label="In order of" value={filters.sort} options={SORT} onChange={(sort) => set({ sort })} />
      <label className="flex items-center gap-2"><input type="checkbox" checked={filters.archived} onChange={(event) => set({ archived: event.target.checked })} className="size-4 accent-[var(--ink)]" />Archive</label>
      {dirty && <Button size="bar" look="quiet" onClick={() => onChange(NO_FILTERS)}>Clear filters</Button>}
    </div>
  );
}

function Choice<Value extends string>({ label, value, options, onChange }: { label: string; value: Value; options: Readonly<Record<Value, string>>; onChange: (value: Value) => void }) {
  return (
    <label className="flex items-center gap-2">
      {label}
      <select value={value} onChange={(event) => onChange(event.target.value as Value)} className={`${SELECT} ${value === Object.keys(options)[0] ? "" : "border-ink font-strong"}`}>
        {(Object.entries(options) as [Value, string][]).map(([id, words]) => <option key={id} value={id}>{words}</option>)}
      </select>
    </label>
  );
}
