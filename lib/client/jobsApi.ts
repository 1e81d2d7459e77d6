import { keepPreviousData, useInfiniteQuery, useQuery, type InfiniteData } from "@tanstack/react-query";
import type { DuplicateInput, HistoryAnswer, JobAnswer, JobsAnswer, JobsQuery, NextNumberAnswer } from "@/lib/api";
import { request } from "./api";
import { keys, useChange } from "./queries";

const at = encodeURIComponent;
const place = (jobId: string) => `/api/jobs/${at(jobId)}`;

/** What the register asks for; what is left at its usual value is left out of the address. */
export type JobsAsked = Partial<Omit<JobsQuery, "offset" | "limit">>;

const PAGE = 60;
function listPath(asked: JobsAsked, offset: number): string {
  const filled = Object.entries(asked).filter(([, value]) => value !== undefined && value !== "").map(([name, value]) => [name, String(value)]);
  return `/api/jobs?${new URLSearchParams([...filled, ["limit", String(PAGE)], ["offset", String(offset)]]).toString()}`;
}

/** How soon the register is fetched again, in ms: soon while counts are worked out, seldom where much was read. */
function again(data: InfiniteData<JobsAnswer> | undefined): number {
  if (data?.pages.some((page) => page.jobs.some((job) => job.counts === null))) return 2_000 * data.pages.length;
  return (data?.pages.length ?? 1) > 4 ? 120_000 : 30_000;
}

/** The register, page after page. While other words are looked for, what was found before stays in sight. */
export const useJobs = (asked: JobsAsked) => useInfiniteQuery({
  queryKey: [...keys.jobs, asked],
  queryFn: ({ pageParam, signal }) => request<JobsAnswer>("GET", listPath(asked, pageParam), undefined, signal),
  initialPageParam: 0,
  getNextPageParam: (last, pages) => {
    const read = pages.reduce((sum, page) => sum + page.jobs.length, 0);
    return last.jobs.length > 0 && read < last.total ? read : undefined;
  },
  placeholderData: keepPreviousData,
  refetchInterval: (query) => again(query.state.data),
});

const LINES = 12;
/** What was done to a job, newest first; the name of the list begins with the job's, so that its changes refresh it. */
export const useHistory = (jobId: string) => useInfiniteQuery({
  queryKey: [...keys.job(jobId), "history"],
  queryFn: ({ pageParam, signal }) => request<HistoryAnswer>("GET", `${place(jobId)}/history?limit=${LINES}${pageParam === null ? "" : `&before=${pageParam}`}`, undefined, signal),
  initialPageParam: null as number | null,
  getNextPageParam: (last) => (last.more ? last.entries.at(-1)?.id : undefined),
});

/** The number that a new job of the company would get now. Nothing is reserved by asking. */
export const useNextNumber = (companyId: string, enabled = true) => useQuery({
  queryKey: ["next job number", companyId], enabled: enabled && companyId !== "", staleTime: 0, gcTime: 0,
  queryFn: ({ signal }) => request<NextNumberAnswer>("GET", `/api/companies/${at(companyId)}/next-job-number`, undefined, signal),
});

export const useDuplicate = (jobId: string) => useChange((input: DuplicateInput) => request<{ id: string }>("POST", `${place(jobId)}/duplicate`, input), [keys.jobs]);
export const useArchive = (jobId: string) =>
  useChange((archived: boolean) => request<JobAnswer>("POST", `${place(jobId)}/archive`, { archived }), [keys.jobs, keys.job(jobId), ["drawing"]]);
