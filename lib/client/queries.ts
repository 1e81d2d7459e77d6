import { useMutation, useQuery, useQueryClient } from "@tanstack/react-query";
import type { RevisionAnswer } from "@/lib/api";
import { api } from "./api";

/** Names of what is fetched, so that a change can say what it made stale. */
export const keys = {
  me: ["me"] as const,
  license: ["license"] as const,
  people: (companyId: string) => ["people", companyId] as const,
  jurisdictions: ["jurisdictions"] as const,
  jobs: ["jobs"] as const,
  job: (jobId: string) => ["job", jobId] as const,
  members: (jobId: string) => ["job", jobId, "members"] as const,
  revisions: (jobId: string) => ["job", jobId, "revisions"] as const,
  revision: (id: string) => ["revision", id] as const,
  counter: ["counter"] as const,
  counterJob: (jobId: string) => ["counter", jobId] as const,
};

export const useMe = () => useQuery({ queryKey: keys.me, queryFn: api.me, staleTime: 60_000 });
export const useLicense = () => useQuery({ queryKey: keys.license, queryFn: api.license });
export const useJob = (jobId: string) => useQuery({ queryKey: keys.job(jobId), queryFn: () => api.job(jobId) });
export const useMembers = (jobId: string, enabled = true) => useQuery({ queryKey: keys.members(jobId), queryFn: () => api.members(jobId), enabled });
export const useRevisions = (jobId: string) => useQuery({ queryKey: keys.revisions(jobId), queryFn: () => api.revisions(jobId) });
/** `poll` says how soon to ask again, in ms, while something is under way; false to leave it. */
export const useRevision = (id: string, poll: (data: RevisionAnswer | undefined) => number | false = () => false) =>
  useQuery({ queryKey: keys.revision(id), queryFn: () => api.revision(id), refetchInterval: (query) => poll(query.state.data) });
export const useJurisdictions = () => useQuery({ queryKey: keys.jurisdictions, queryFn: api.jurisdictions });
export const usePeople = (companyId: string | undefined) =>
  useQuery({ queryKey: keys.people(companyId ?? ""), queryFn: () => api.people(companyId ?? ""), enabled: companyId !== undefined });
export const useCounter = () => useQuery({ queryKey: keys.counter, queryFn: api.counter, refetchInterval: 30_000 });
export const useCounterJob = (jobId: string) => useQuery({ queryKey: keys.counterJob(jobId), queryFn: () => api.counterJob(jobId), refetchInterval: 30_000 });

/** A change on the server, after which the named answers are fetched again. */
export function useChange<Input, Answer>(work: (input: Input) => Promise<Answer>, stale: readonly (readonly string[])[]) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: work,
    onSuccess: async () => {
      await Promise.all(stale.map((queryKey) => client.invalidateQueries({ queryKey: [...queryKey] })));
    },
  });
}
