import "server-only";
import { QueryTypes } from "sequelize";
import type { z } from "zod";
import { ALL_BUT_DRAWING, BY_ITSELF, RECORD_KINDS, type RecordLine, type RecordsAnswer, type RecordsFilter, type recordsQuery } from "@/lib/api";
import { unprocessable } from "@/lib/server/http/problem";
import { companyAccess, type Actor } from "./actor";
import { database } from "./database";
import { historyWords } from "./historyWords";
import { recordParts } from "./recordWords";

interface Row {
  id: string; moment: Date; action: string; subject: string; detail: Record<string, unknown>; requestId: string | null; address: string | null; userAgent: string | null;
  actorId: string | null; actorName: string | null; actorEmail: string | null; jobId: string | null; jobNumber: string | null; jobName: string | null;
}
/** Place in the order of the log, newest first: moment and id of the last entry that was read. */
export interface RecordPlace { moment: string; id: string }

const MOST_WORDS = 8;
const pattern = (word: string): string => `%${word.replace(/[\\%_]/g, (sign) => `\\${sign}`)}%`;
const isDay = (moment: string): boolean => /^\d{4}-\d\d-\d\d$/.test(moment);

/** Conditions of a filter over `audit_log a`, with what stands in them. */
function conditions(companyId: string, filter: RecordsFilter): { where: string[]; replacements: Record<string, unknown> } {
  const where = ["a.company_id = :companyId"];
  const replacements: Record<string, unknown> = { companyId };
  const kind = RECORD_KINDS.find((each) => each.id === filter.action);
  if (kind) {
    where.push("split_part(a.action, '.', 1) in (:prefixes)");
    replacements["prefixes"] = kind.prefixes;
  } else if (filter.action === ALL_BUT_DRAWING) where.push("a.action <> 'drawing.save'");
  else if (filter.action !== undefined) {
    where.push("a.action = :action");
    replacements["action"] = filter.action;
  }
  if (filter.person === BY_ITSELF) where.push("a.actor_id is null");
  else if (filter.person !== undefined) {
    where.push("a.actor_id = :person");
    replacements["person"] = filter.person;
  }
  if (filter.from !== undefined) {
    where.push(`a.at >= ${isDay(filter.from) ? "(:from)::date::timestamp at time zone 'UTC'" : "(:from)::timestamptz"}`);
    replacements["from"] = filter.from;
  }
  if (filter.to !== undefined) {
    where.push(`a.at < ${isDay(filter.to) ? "((:to)::date + 1)::timestamp at time zone 'UTC'" : "(:to)::timestamptz"}`);
    replacements["to"] = filter.to;
  }
  filter.q.toLowerCase().split(/\s+/).filter(Boolean).slice(0, MOST_WORDS).forEach((word, index) => {
    where.push(`a.search like :word${index}`);
    replacements[`word${index}`] = pattern(word);
  });
  return { where, replacements };
}

/** Entries of a company's log that fit, newest first, from after `place` on; with the place of the last one. Permission is the caller's business. */
export async function readRecords(companyId: string, filter: RecordsFilter, limit: number, place: RecordPlace | null): Promise<{ records: RecordLine[]; last: RecordPlace | null }> {
  const { where, replacements } = conditions(companyId, filter);
  if (place) {
    where.push("(a.at, a.id) < ((:placeMoment)::timestamptz, (:placeId)::bigint)");
    Object.assign(replacements, { placeMoment: place.moment, placeId: place.id });
  }
  // Found first, opened after: names are needed for the lines that are shown alone. The moment goes round as text, to the microsecond.
  const rows = await database().sequelize.query<Row & { momentText: string }>(
    `select a.id::text as id, a.at as moment, a.at::text as "momentText", a.action, a.subject, a.detail, a.request_id as "requestId", host(a.from_address) as address, a.user_agent as "userAgent",
       a.actor_id as "actorId", u.name as "actorName", u.email as "actorEmail", j.id as "jobId", j.number as "jobNumber", j.name as "jobName"
     from (select * from audit_log a where ${where.join(" and ")} order by a.at desc, a.id desc limit :limit) a
     left join users u on u.id = a.actor_id left join jobs j on j.id = a.job_id order by a.at desc, a.id desc`,
    { replacements: { ...replacements, limit }, type: QueryTypes.SELECT },
  );
  const end = rows.at(-1);
  return { records: rows.map(lineOf), last: end ? { moment: end.momentText, id: end.id } : null };
}

function lineOf(row: Row): RecordLine {
  const { what, detail } = historyWords(row.action, row.detail);
  return {
    id: row.id, at: row.moment.toISOString(), action: row.action, words: what, note: detail, subject: row.subject, ...recordParts(row.detail),
    person: row.actorId === null ? null : { id: row.actorId, name: row.actorName ?? "", email: row.actorEmail ?? "" },
    job: row.jobId === null ? null : { id: row.jobId, number: row.jobNumber ?? "", name: row.jobName ?? "" },
    requestId: row.requestId, address: row.address, userAgent: row.userAgent,
  };
}

/**
 * A page of a company's log.
 * @throws Problem 422 when the cursor is no entry of it
 */
export async function listRecords(actor: Actor, companyId: string, { cursor, limit, ...filter }: z.output<typeof recordsQuery>): Promise<RecordsAnswer> {
  await companyAccess(actor, companyId, "audit.view");
  const [{ records, last }, people] = await Promise.all([
    readRecords(companyId, filter, limit, cursor === undefined ? null : await placeOf(companyId, cursor)),
    cursor === undefined ? peopleOf(companyId) : null,
  ]);
  return { records, next: last && records.length === limit ? last.id : null, ...(people ? { people } : {}) };
}

async function placeOf(companyId: string, id: string): Promise<RecordPlace> {
  const [row] = await database().sequelize.query<{ moment: string }>(
    "select at::text as moment from audit_log where id = (:id)::numeric and company_id = :companyId", { replacements: { id, companyId }, type: QueryTypes.SELECT },
  );
  if (!row) throw unprocessable("cursor", "is no entry of these records");
  return { moment: row.moment, id };
}

/** Whoever belongs to the company or to one of its jobs. */
const peopleOf = (companyId: string) => database().sequelize.query<{ id: string; name: string }>(
  `select u.id, u.name from users u where u.id in (
     select user_id from memberships where company_id = :companyId
     union select m.user_id from job_members m join jobs j on j.id = m.job_id where j.company_id = :companyId
   ) order by lower(u.name), u.id`, { replacements: { companyId }, type: QueryTypes.SELECT },
);
