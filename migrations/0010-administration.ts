import type { QueryInterface } from "sequelize";

const trigger = (columns: string) => `
drop trigger audit_log_append_only on audit_log;
create trigger audit_log_append_only before delete or update of ${columns} on audit_log for each row execute function audit_stays();`;

const UP = `
alter table audit_log
  -- From where: address and program of who asked; null for the worker and where it is not known.
  add column from_address inet,
  add column user_agent text check (length(user_agent) <= 200),
  -- Words an entry is found by, in lower case: who, which job, what and its details as they were that day.
  add column search text not null default '' check (length(search) <= 4000);
update audit_log a set company_id = j.company_id from jobs j where j.id = a.job_id and a.company_id is null;
update audit_log a set search = left(lower(concat_ws(' ', a.action, u.name, u.email, j.number, j.name,
  (select string_agg(each.value, ' ') from jsonb_each_text(a.detail) each))), 4000)
  from audit_log b left join users u on u.id = b.actor_id left join jobs j on j.id = b.job_id where b.id = a.id;
create index audit_log_company on audit_log (company_id, at desc, id desc);
create index audit_log_company_action on audit_log (company_id, action, at desc, id desc);
create index audit_log_company_actor on audit_log (company_id, actor_id, at desc, id desc);
${trigger("at, actor_id, company_id, action, subject, detail, request_id, from_address, user_agent, search")}
create trigger audit_log_stays_whole before truncate on audit_log for each statement execute function audit_stays();
`;

const DOWN = `
drop trigger audit_log_stays_whole on audit_log;
${trigger("at, actor_id, action, subject, detail")}
drop index audit_log_company, audit_log_company_action, audit_log_company_actor;
alter table audit_log drop column from_address, drop column user_agent, drop column search;
`;

export const up = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(UP, { transaction }));
export const down = ({ context }: { context: QueryInterface }) =>
  context.sequelize.transaction((transaction) => context.sequelize.query(DOWN, { transaction }));
