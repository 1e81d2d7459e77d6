import { useSearchParams } from "next/navigation";
import { useEffect, useState } from "react";
import { JOB_SORTS, JOB_TABS, OFFICE_STATUSES } from "@/lib/api";
import { localDay } from "@/lib/client/dates";
import type { JobsAsked } from "@/lib/client/jobsApi";
import { paths } from "./paths";

/** What of the register is shown, and in which order. */
export interface JobsChoice {
  q: string; tab: (typeof JOB_TABS)[number]; due: "any" | "late" | "soon"; status: "any" | (typeof OFFICE_STATUSES)[number]; jurisdiction: string; archived: "yes" | "no"; sort: (typeof JOB_SORTS)[number];
}
export const EVERYTHING: JobsChoice = { q: "", tab: "all", due: "any", status: "any", jurisdiction: "", archived: "no", sort: "changed" };

type Given = { get: (name: string) => string | null };
const oneOf = <Value extends string>(given: string | null, values: readonly Value[], usual: Value): Value => values.find((each) => each === given) ?? usual;

/** A choice as it stands in an address; what an address cannot mean is the usual. */
export function choiceOf(search: Given): JobsChoice {
  const jurisdiction = search.get("jurisdiction") ?? "";
  return {
    q: (search.get("q") ?? "").slice(0, 120), tab: oneOf(search.get("tab"), JOB_TABS, "all"), due: oneOf(search.get("due"), ["any", "late", "soon"], "any"),
    status: oneOf(search.get("status"), ["any", ...OFFICE_STATUSES], "any"), jurisdiction: /^[0-9a-f-]{36}$/.test(jurisdiction) ? jurisdiction : "",
    archived: oneOf(search.get("archived"), ["yes", "no"], "no"), sort: oneOf(search.get("sort"), JOB_SORTS, "changed"),
  };
}

/** The part of a choice that is not the usual. */
export const unusual = (choice: JobsChoice): JobsAsked =>
  Object.fromEntries(Object.entries(choice).filter(([name, value]) => value !== EVERYTHING[name as keyof JobsChoice]));

/** The same as the server is asked for it: what is late depends on the day where the person is. */
export const askedBy = (choice: JobsChoice): JobsAsked => ({ ...unusual({ ...choice, q: choice.q.trim() }), ...(choice.due === "any" ? {} : { today: localDay() }) });

/** The choice, kept in the address so that coming back from a job finds it again. */
export function useJobsChoice() {
  const search = useSearchParams();
  const [choice, setChoice] = useState(() => choiceOf(search));
  useEffect(() => {
    const given = new URLSearchParams(unusual(choice) as Record<string, string>).toString();
    const address = given ? `${paths.jobs}?${given}` : paths.jobs;
    if (address !== window.location.pathname + window.location.search) window.history.replaceState(null, "", address);
  }, [choice]);
  return [choice, setChoice] as const;
}
