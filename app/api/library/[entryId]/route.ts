import { libraryEntryChange } from "@/lib/api";
import { changeEntry, getEntry } from "@/lib/server/data/library";
import { handle } from "@/lib/server/http/handle";
import { entryParams as params } from "@/lib/server/http/params";

export const GET = handle({ params, run: ({ actor, params: { entryId } }) => getEntry(actor, entryId) });
export const PATCH = handle({ params, body: libraryEntryChange, perMinute: 120, run: ({ actor, params: { entryId }, body }) => changeEntry(actor, entryId, body) });
