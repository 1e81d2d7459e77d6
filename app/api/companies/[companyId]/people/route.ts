import { personInput } from "@/lib/api";
import { addPerson, listPeople } from "@/lib/server/data/people";
import { handle } from "@/lib/server/http/handle";
import { companyParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: async ({ actor, params: { companyId } }) => ({ people: await listPeople(actor, companyId) }) });
export const POST = handle({ params, body: personInput, perMinute: 60, status: 201, run: ({ actor, params: { companyId }, body }) => addPerson(actor, companyId, body) });
