import { QueryTypes } from "sequelize";
import { database } from "@/lib/server/data/database";
import type { Person } from "./people";
import { request } from "./server";

/** Sends a table to the import of a company's library. */
export const sendTable = (as: Person, companyId: string, kind: string, text: string | Buffer, confirm?: string) =>
  request("POST", `/api/companies/${companyId}/library/import?kind=${kind}${confirm === undefined ? "" : `&confirm=${confirm}`}`, {
    as, raw: text as BodyInit, headers: { "content-type": "text/csv" },
  });

/**
 * Fills a company's library with invented breakers, in SQL, for tests and measurements of size. Names are `Seeded breaker 00001` on, makers
 * `Maker 00` to `Maker 19`, models `M-1` on; every tenth entry has a second version.
 */
export async function seedEntries(companyId: string, count: number): Promise<void> {
  const { sequelize } = database();
  const data = `jsonb_build_object('props', jsonb_build_object('make', 'Maker ' || lpad((n % 20)::text, 2, '0'), 'model', 'M-' || n, 'listing', 'UL 489', 'current', 'ac',
      'ratingA', 15 + (n % 20) * 5, 'poles', 1 + n % 2, 'interruptingKA', 10, 'voltageV', 240, 'mount', 'plug-on', 'position', 'branch', 'family', null, 'lineLoadMarked', false,
      'listedHundredPercent', false, 'lockable', false, 'auxiliaryContact', false, 'trip', 'fixed'),
    'sources', jsonb_build_object('ratingA', jsonb_build_object('document', 'Sheet ' || n, 'page', '2')),
    'ports', jsonb_build_object('line', jsonb_build_object('continuousA', 15 + (n % 20) * 5)))`;
  await sequelize.transaction((transaction) => sequelize.query(
    `with made as (
       insert into library_entries (company_id, kind, name, make, model, current_version)
       select :companyId, 'breaker', 'Seeded breaker ' || lpad(n::text, 5, '0'), 'Maker ' || lpad((n % 20)::text, 2, '0'), 'M-' || n, case when n % 10 = 0 then 2 else 1 end
         from generate_series(1, :count) n returning id, current_version, substring(name from 16)::int as n
     ) insert into library_versions (entry_id, version, data)
       select id, version, ${data} from made, lateral generate_series(1, current_version) version`,
    { replacements: { companyId, count }, type: QueryTypes.INSERT, transaction },
  ));
  await sequelize.query("analyze library_entries");
  await sequelize.query("analyze library_versions");
}
