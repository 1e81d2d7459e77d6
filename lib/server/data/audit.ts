import "server-only";
import { QueryTypes, type Transaction } from "sequelize";
import type { Actor } from "./actor";
import { database } from "./database";

/**
 * `detail` of a change holds `before` and `after` with the fields that differ, by name. What a person does with their own account names
 * neither company nor job; it is kept for each company they belong to.
 */
interface AuditFacts { action: string; subject: string; companyId?: string; jobId?: string; detail?: Record<string, unknown> }

type Facts = Readonly<Record<string, unknown>>;

/** Most characters of the words an entry is found by. */
const SEARCH_LENGTH = 3500;

const INSERT = `
insert into audit_log (at, actor_id, company_id, job_id, action, subject, detail, request_id, from_address, user_agent, search)
select clock_timestamp(), $1::uuid, company.id, $3::uuid, $4, $5, $6::jsonb, $7, $8::inet, $9, lower(concat_ws(' ', $10::text, job.number, job.name))
from (select 1) as one
left join jobs job on job.id = $3::uuid
left join lateral (
  select coalesce($2::uuid, job.company_id) as id where $2::uuid is not null or job.id is not null
  union all
  select company_id from memberships where user_id = $1::uuid and $2::uuid is null and job.id is null
) company on true`;

/** Writes who did what, from where, in the transaction that does it. `actor` is null for the worker process. */
export async function audit(transaction: Transaction, actor: Actor | null, facts: AuditFacts): Promise<void> {
  const words = [facts.action, actor?.name ?? "", actor?.email ?? "", actor?.from?.address ?? "", ...leaves(facts.detail ?? {})].filter(Boolean).join(" ");
  await database().sequelize.query(INSERT, {
    bind: [
      actor?.id ?? null, facts.companyId ?? null, facts.jobId ?? null, facts.action, facts.subject, JSON.stringify(facts.detail ?? {}),
      actor?.requestId ?? null, actor?.from?.address ?? null, actor?.from?.userAgent ?? null, words.slice(0, SEARCH_LENGTH),
    ],
    type: QueryTypes.INSERT, transaction,
  });
}

/** Texts and numbers anywhere in a value, but for ids and digests, by which nobody searches. */
function leaves(value: unknown): string[] {
  if (typeof value === "number") return [String(value)];
  if (typeof value === "string") return /^[0-9a-f-]{32,}$/i.test(value) ? [] : [value];
  return value !== null && typeof value === "object" ? Object.values(value).flatMap(leaves) : [];
}

/**
 * What differs between two states of the same thing, for the detail of an audit entry: `{ before, after }` with the fields of `after` that
 * changed. Long texts are cut.
 */
export function changes(before: Facts | null, after: Facts): { before: Facts; after: Facts } {
  const fields = Object.keys(after).filter((field) => JSON.stringify(before?.[field] ?? null) !== JSON.stringify(after[field] ?? null));
  const pick = (from: Facts | null): Facts => Object.fromEntries(fields.map((field) => [field, short(from?.[field] ?? null)]));
  return { before: pick(before), after: pick(after) };
}

const LONGEST_TEXT = 500;
const short = (value: unknown) => (typeof value === "string" && value.length > LONGEST_TEXT ? `${value.slice(0, LONGEST_TEXT)} …` : value);
