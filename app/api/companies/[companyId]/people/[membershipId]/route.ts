import { personChange } from "@/lib/api";
import { changePerson, removePerson } from "@/lib/server/data/people";
import { handle } from "@/lib/server/http/handle";
import { personParams as params } from "@/lib/server/http/params";

export const PATCH = handle({
  params, body: personChange, run: ({ actor, params: { companyId, membershipId }, body }) => changePerson(actor, companyId, membershipId, body),
});
export const DELETE = handle({ params, run: ({ actor, params: { companyId, membershipId } }) => removePerson(actor, companyId, membershipId) });
