import { passwordInput } from "@/lib/api";
import { changePassword } from "@/lib/server/data/users";
import { handle } from "@/lib/server/http/handle";

export const POST = handle({ body: passwordInput, perMinute: 20, run: ({ actor, body }) => changePassword(actor, body.current, body.next) });
