import { whoAmI } from "@/lib/server/data/users";
import { handle } from "@/lib/server/http/handle";

export const GET = handle({ run: ({ actor }) => whoAmI(actor) });
