import { useQuery } from "@tanstack/react-query";
import type { JurisdictionChange, JurisdictionDetail, JurisdictionMake, JurisdictionUpdate, UpdateInput } from "@/lib/api";
import { request } from "./api";
import { keys } from "./queries";

const at = encodeURIComponent;
/** Calls about jurisdictions. */
export const jurisdictionsApi = {
  get: (id: string) => request<JurisdictionDetail>("GET", `/api/jurisdictions/${at(id)}`),
  make: (input: JurisdictionMake) => request<JurisdictionDetail>("POST", "/api/jurisdictions", input),
  change: (id: string, change: JurisdictionChange) => request<JurisdictionDetail>("PATCH", `/api/jurisdictions/${at(id)}`, change),
  remove: (id: string) => request<undefined>("DELETE", `/api/jurisdictions/${at(id)}`),
  update: (jobId: string, edition: "take" | "keep") => request<JurisdictionUpdate>("GET", `/api/jobs/${at(jobId)}/jurisdiction-update?edition=${edition}`),
  take: (jobId: string, input: UpdateInput) => request<JurisdictionUpdate>("POST", `/api/jobs/${at(jobId)}/jurisdiction-update`, input),
};

export const jurisdictionKeys = {
  one: (id: string) => [...keys.jurisdictions, id] as const,
  update: (jobId: string) => ["job", jobId, "jurisdiction-update"] as const,
};
export const useJurisdiction = (id: string) => useQuery({ queryKey: jurisdictionKeys.one(id), queryFn: () => jurisdictionsApi.get(id) });
/** Whether a job differs from its jurisdiction. `changedAt` of the job is part of the question: an edit may have changed the answer. */
export const useJurisdictionUpdate = (jobId: string, edition: "take" | "keep", changedAt: string, enabled: boolean) =>
  useQuery({ queryKey: [...jurisdictionKeys.update(jobId), edition, changedAt], queryFn: () => jurisdictionsApi.update(jobId, edition), enabled, staleTime: 30_000 });
