import "server-only";
import { QueryTypes } from "sequelize";
import type { LibraryData } from "@/lib/api";
import { KIND_IDS, kindDefinition } from "@/lib/equipment/registry";
import type { LibraryEntry } from "@/models";
import { database } from "./database";
import { readData } from "./libraryRows";

export interface EntryQuery { q: string; kind?: string | undefined; archived: "yes" | "no"; limit: number; offset: number }

const MOST_WORDS = 8;
const pattern = (word: string): string => `%${word.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;

/** Entries in whose name, maker, model or kind every word of the search stands, by name, with the values they have now. */
export async function findEntries(companyId: string, query: EntryQuery): Promise<{ rows: { row: LibraryEntry; data: LibraryData }[]; total: number }> {
  const { LibraryEntry, sequelize } = database();
  const words = query.q.toLowerCase().split(/\s+/).filter(Boolean).slice(0, MOST_WORDS);
  const replacements: Record<string, unknown> = { companyId, kind: query.kind ?? "", limit: query.limit, offset: query.offset };
  const conditions = words.map((word, index) => {
    const kinds = KIND_IDS.filter((kind) => kindDefinition(kind).title.toLowerCase().includes(word));
    replacements[`word${index}`] = pattern(word);
    if (kinds.length === 0) return `e.search like :word${index}`;
    replacements[`kinds${index}`] = kinds;
    return `(e.search like :word${index} or e.kind in (:kinds${index}))`;
  });
  const where = ["e.company_id = :companyId", `e.archived_at is ${query.archived === "yes" ? "not null" : "null"}`, ...(query.kind === undefined ? [] : ["e.kind = :kind"]), ...conditions];
  // Found first, opened after: only the lines that are shown need their values.
  const found = await sequelize.query(
    `select page.*, v.data from (
       select e.*, (count(*) over ())::int as total from library_entries e where ${where.join(" and ")} order by lower(e.name), e.id limit :limit offset :offset
     ) page join library_versions v on v.entry_id = page.id and v.version = page.current_version order by lower(page.name), page.id`,
    { replacements, model: LibraryEntry, mapToModel: true },
  );
  const rows = found.map((row) => ({ row, data: readData(row.kind, row.get("data" as keyof LibraryEntry) as unknown as LibraryData) }));
  const total = found[0]?.get("total" as keyof LibraryEntry) as unknown as number | undefined;
  return { rows, total: total ?? (query.offset === 0 ? 0 : await count(where, replacements)) };
}

/** Beyond the last page no line tells how many there are. */
async function count(where: readonly string[], replacements: Record<string, unknown>): Promise<number> {
  const [row] = await database().sequelize.query<{ total: number }>(
    `select count(*)::int as total from library_entries e where ${where.join(" and ")}`, { replacements, type: QueryTypes.SELECT },
  );
  return row?.total ?? 0;
}
