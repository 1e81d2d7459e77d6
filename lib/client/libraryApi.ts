import { keepPreviousData, useInfiniteQuery, useQuery, useQueryClient } from "@tanstack/react-query";
import type { ImportAnswer, ImportPreview, LibraryEntryAnswer, LibraryEntryChange, LibraryEntryInput, LibraryListAnswer, LibraryVersionAnswer } from "@/lib/api";
import { request } from "./api";
import { useChange } from "./queries";

const at = encodeURIComponent;
const company = (companyId: string) => `/api/companies/${at(companyId)}/library`;

/** What the list is asked for; an empty kind is every kind. */
export interface LibraryChoice { q: string; kind: string; archived: boolean }

const PAGE = 100;
function listPath(companyId: string, choice: LibraryChoice, offset: number): string {
  const search = new URLSearchParams({ archived: choice.archived ? "yes" : "no", limit: String(PAGE), offset: String(offset) });
  if (choice.q.trim()) search.set("q", choice.q.trim().slice(0, 120));
  if (choice.kind) search.set("kind", choice.kind);
  return `${company(companyId)}?${search.toString()}`;
}

/** Address of a kind's table, empty or with the entries there are. */
export const tableUrl = (companyId: string, kind: string, fill: boolean): string => `${company(companyId)}/template.csv?kind=${at(kind)}&fill=${fill ? "yes" : "no"}`;
const importPath = (companyId: string, kind: string) => `${company(companyId)}/import?kind=${at(kind)}`;
// The type is set here: some systems call a table something else, or nothing.
const asTable = (file: Blob) => new Blob([file], { type: "text/csv" });

export const libraryApi = {
  entry: (id: string, signal?: AbortSignal) => request<LibraryEntryAnswer>("GET", `/api/library/${at(id)}`, undefined, signal),
  version: (id: string, version: number) => request<LibraryVersionAnswer>("GET", `/api/library/${at(id)}/versions/${version}`),
  add: (companyId: string, input: LibraryEntryInput) => request<{ id: string }>("POST", company(companyId), input),
  change: (id: string, change: LibraryEntryChange) => request<LibraryEntryAnswer>("PATCH", `/api/library/${at(id)}`, change),
  previewImport: (companyId: string, kind: string, file: Blob) => request<ImportPreview>("POST", importPath(companyId, kind), asTable(file)),
  confirmImport: (companyId: string, kind: string, file: Blob, digest: string) => request<ImportAnswer>("POST", `${importPath(companyId, kind)}&confirm=${at(digest)}`, asTable(file)),
};

export const libraryKeys = {
  list: ["library"] as const,
  entry: (id: string) => ["library entry", id] as const,
};

/** The list, page after page. What was found before stays in sight while other words are looked for. */
export const useLibrary = (companyId: string, choice: LibraryChoice) => useInfiniteQuery({
  queryKey: [...libraryKeys.list, companyId, choice],
  queryFn: ({ pageParam, signal }) => request<LibraryListAnswer>("GET", listPath(companyId, choice, pageParam), undefined, signal),
  initialPageParam: 0,
  getNextPageParam: (last, pages) => {
    const read = pages.reduce((sum, page) => sum + page.entries.length, 0);
    return last.entries.length > 0 && read < last.total ? read : undefined;
  },
  placeholderData: keepPreviousData,
});

export const useLibraryEntry = (id: string) => useQuery({ queryKey: libraryKeys.entry(id), queryFn: ({ signal }) => libraryApi.entry(id, signal) });
/** A version as it was written; it never changes. */
export const useLibraryVersion = (id: string, version: number | null) =>
  useQuery({ queryKey: [...libraryKeys.entry(id), "version", version], queryFn: () => libraryApi.version(id, version ?? 1), enabled: version !== null, staleTime: Infinity });

export const useAddEntry = (companyId: string) => useChange((input: LibraryEntryInput) => libraryApi.add(companyId, input), [libraryKeys.list]);

/** A change of an entry; its answer is the entry as it is then. */
export function useChangeEntry(id: string) {
  const client = useQueryClient();
  return useChange(async (change: LibraryEntryChange) => {
    const answer = await libraryApi.change(id, change);
    client.setQueryData(libraryKeys.entry(id), answer);
    return answer;
  }, [libraryKeys.list]);
}
