import { keepPreviousData, useInfiniteQuery } from "@tanstack/react-query";
import type { RecordsAnswer } from "@/lib/api";
import { request } from "./api";

/** What a list of records is narrowed by; days are the reader's own, YYYY-MM-DD, and "" leaves a field open. */
export interface RecordsChoice { q: string; action: string; person: string; from: string; to: string }
export const EVERYTHING: RecordsChoice = { q: "", action: "", person: "", from: "", to: "" };

/** Start of a calendar day in the reader's zone, `days` later. */
function dayStart(day: string, days = 0): string | undefined {
  const [year = 0, month = 1, date = 1] = day.split("-").map(Number);
  const moment = new Date(year, month - 1, date + days);
  return Number.isNaN(moment.getTime()) ? undefined : moment.toISOString();
}

/** The choice as the routes take it. */
export function recordsSearch(choice: RecordsChoice, cursor?: string): string {
  const given = {
    q: choice.q.trim(), action: choice.action, person: choice.person, from: choice.from && dayStart(choice.from), to: choice.to && dayStart(choice.to, 1), cursor,
  };
  return new URLSearchParams(Object.entries(given).flatMap(([name, value]) => (value ? [[name, value]] : []))).toString();
}

const path = (companyId: string, part: "audit" | "audit.csv", search: string) => `/api/companies/${encodeURIComponent(companyId)}/${part}${search ? `?${search}` : ""}`;
export const recordsTableUrl = (companyId: string, choice: RecordsChoice): string => path(companyId, "audit.csv", recordsSearch(choice));

/** A company's records, page after page. */
export const useRecords = (companyId: string, choice: RecordsChoice) => useInfiniteQuery({
  queryKey: ["records", companyId, choice],
  queryFn: ({ pageParam, signal }) => request<RecordsAnswer>("GET", path(companyId, "audit", recordsSearch(choice, pageParam)), undefined, signal),
  initialPageParam: undefined as string | undefined,
  getNextPageParam: (last) => last.next ?? undefined,
  placeholderData: keepPreviousData,
});
