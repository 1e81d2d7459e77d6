import { licenseInput } from "@/lib/api";
import { getLicense, putLicense } from "@/lib/server/data/licenses";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ run: async ({ actor }) => ({ license: await getLicense(actor) }) });
export const PUT = handle({ body: licenseInput, run: async ({ actor, body }) => ({ license: await putLicense(actor, body) }) });
