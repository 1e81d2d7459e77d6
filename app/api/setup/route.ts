import { setupInput } from "@/lib/api";
import { isEmpty, setUp } from "@/lib/server/data/users";
import { handleOpen } from "@/lib/server/http/handle";

export const GET = handleOpen({ run: async () => ({ needed: await isEmpty() }) });
export const POST = handleOpen({ body: setupInput, perMinute: 10, status: 201, run: async ({ body, requestId, from }) => {
  await setUp(body, { requestId, from });
  return { email: body.email };
} });
