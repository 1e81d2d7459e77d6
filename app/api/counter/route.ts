import { listCounter } from "@/lib/server/data/counter";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ run: async ({ actor }) => ({ jobs: await listCounter(actor) }) });
