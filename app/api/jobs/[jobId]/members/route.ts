import { personInput } from "@/lib/api";
import { addMember, listMembers } from "@/lib/server/data/members";
import { handle } from "@/lib/server/http/handle";
import { jobParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: async ({ actor, params: { jobId } }) => ({ members: await listMembers(actor, jobId) }) });
export const POST = handle({ params, body: personInput, perMinute: 60, status: 201, run: ({ actor, params: { jobId }, body }) => addMember(actor, jobId, body) });
