import { rolesInput } from "@/lib/api";
import { changeMember, removeMember } from "@/lib/server/data/members";
import { handle } from "@/lib/server/http/handle";
import { memberParams as params } from "@/lib/server/http/params";

export const PATCH = handle({
  params, body: rolesInput, run: ({ actor, params: { jobId, memberId }, body }) => changeMember(actor, jobId, memberId, body.roles),
});
export const DELETE = handle({ params, run: ({ actor, params: { jobId, memberId } }) => removeMember(actor, jobId, memberId) });
