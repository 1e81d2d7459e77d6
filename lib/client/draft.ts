import { openDB, type IDBPDatabase } from "idb";
import type { Draft } from "./autosave";

const STORE = "drafts";
let database: Promise<IDBPDatabase> | null = null;
const open = (): Promise<IDBPDatabase> => database ??= openDB("ferrule-drafts", 1, {
  upgrade: (db) => { db.createObjectStore(STORE, { keyPath: "drawingId" }); },
});

/** Unconfirmed changes of one drawing kept on this device, or null. A device without a store has none. */
export async function readDraft(drawingId: string): Promise<Draft | null> {
  try {
    return ((await (await open()).get(STORE, drawingId)) as Draft | undefined) ?? null;
  } catch {
    return null;
  }
}

export async function writeDraft(drawingId: string, draft: Draft | null): Promise<void> {
  const db = await open();
  if (draft) await db.put(STORE, draft);
  else await db.delete(STORE, drawingId);
}
