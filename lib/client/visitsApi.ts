import { useQuery } from "@tanstack/react-query";
import type { VisitAnswer, VisitChange, VisitInput, VisitsAnswer } from "@/lib/api";
import { request } from "./api";

const at = encodeURIComponent;

export const visitsApi = {
  list: (jobId: string) => request<VisitsAnswer>("GET", `/api/jobs/${at(jobId)}/visits`),
  create: (jobId: string, input: VisitInput) => request<VisitAnswer>("POST", `/api/jobs/${at(jobId)}/visits`, input),
  change: (visitId: string, input: VisitChange) => request<VisitAnswer>("PATCH", `/api/visits/${at(visitId)}`, input),
};
export const visitsKey = (jobId: string) => ["job", jobId, "visits"] as const;
/** Visits of a job. Not read again by itself while one is open: what is open is kept by its keeper. */
export const useVisits = (jobId: string) =>
  useQuery({ queryKey: visitsKey(jobId), queryFn: () => visitsApi.list(jobId), refetchOnWindowFocus: false, refetchOnReconnect: true, staleTime: Infinity, gcTime: 0 });
