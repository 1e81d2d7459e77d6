import { openDB, type IDBPDatabase } from "idb";
import type { VisitContent } from "@/lib/api";

/** A visit as this device keeps it until the server has confirmed it. */
export interface KeptVisit {
  readonly visitId: string;
  readonly jobId: string;
  /** Version of the server that `base` is; 0 while the visit has not been stored there. */
  readonly version: number;
  readonly base: VisitContent | null;
  readonly content: VisitContent;
  /** Entries that cannot be read as what their field wants, by field; kept as typed. */
  readonly typed: Readonly<Record<string, string>>;
  readonly keptAt: number;
}
/** Where a photo belongs in its visit: to the label of a panel, or to the photos of the site. */
export type PhotoTarget = { readonly panel: string } | { readonly panel: null };
/** A photo that waits to be sent. */
export interface KeptPhoto { readonly key: string; readonly jobId: string; readonly visitId: string; readonly target: PhotoTarget; readonly file: File; readonly addedAt: number }

let database: Promise<IDBPDatabase> | null = null;
const open = (): Promise<IDBPDatabase> => database ??= openDB("ferrule-visits", 1, {
  upgrade: (db) => {
    db.createObjectStore("visits", { keyPath: "visitId" }).createIndex("jobId", "jobId");
    db.createObjectStore("photos", { keyPath: "key" }).createIndex("visitId", "visitId");
  },
});

/** Visits of a job that this device keeps. A device without a store keeps none. */
export async function keptVisits(jobId: string): Promise<KeptVisit[]> {
  try {
    return (await (await open()).getAllFromIndex("visits", "jobId", jobId)) as KeptVisit[];
  } catch {
    return [];
  }
}
/** Keeps a visit, or forgets it with null. @throws where the device has no store or no room */
export async function keepVisit(visitId: string, visit: KeptVisit | null): Promise<void> {
  const db = await open();
  if (visit) await db.put("visits", visit);
  else await db.delete("visits", visitId);
}
/** Photos of a visit that this device still has to send, oldest first. */
export async function keptPhotos(visitId: string): Promise<KeptPhoto[]> {
  try {
    return ((await (await open()).getAllFromIndex("photos", "visitId", visitId)) as KeptPhoto[]).sort((a, b) => a.addedAt - b.addedAt);
  } catch {
    return [];
  }
}
/** @throws where the device has no store or no room */
export async function keepPhoto(key: string, photo: KeptPhoto | null): Promise<void> {
  const db = await open();
  if (photo) await db.put("photos", photo);
  else await db.delete("photos", key);
}
