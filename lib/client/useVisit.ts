import { useQueryClient } from "@tanstack/react-query";
import { useEffect, useState, useSyncExternalStore } from "react";
import type { FileAnswer, VisitAnswer, VisitContent } from "@/lib/api";
import { uploadFile } from "./filesApi";
import { newId } from "./newId";
import { PhotoQueue } from "./photoQueue";
import { VisitKeeper } from "./visitKeeper";
import { keepPhoto, keepVisit, keptPhotos, type KeptPhoto, type KeptVisit, type PhotoTarget } from "./visitStore";
import { visitsApi } from "./visitsApi";

/** Puts a stored photo where it was taken for. A panel that was removed meanwhile leaves it with the photos of the site. */
function withPhoto(content: VisitContent, { target, key }: KeptPhoto, file: FileAnswer): VisitContent {
  const { data } = content;
  if (target.panel !== null && data.panels.some((panel) => panel.id === target.panel)) {
    return { ...content, data: { ...data, panels: data.panels.map((panel) => (panel.id === target.panel ? { ...panel, labelPhotos: [...panel.labelPhotos.filter((each) => each !== file.id), file.id] } : panel)) } };
  }
  return { ...content, data: { ...data, photos: [...data.photos.filter((each) => each.id !== key), { id: key, file: file.id, what: null, caption: null }] } };
}

/** One open visit with the photos that are on their way. The caller gives it a key: another visit is another one. */
export function useVisit({ jobId, visitId, stored, kept, blank }: { jobId: string; visitId: string; stored: VisitAnswer | null; kept: KeptVisit | null; blank: VisitContent }) {
  const client = useQueryClient();
  const [keeper] = useState(() => new VisitKeeper(visitId, jobId, {
    create: (input) => visitsApi.create(jobId, input), change: (input) => visitsApi.change(visitId, input), keep: (visit) => keepVisit(visitId, visit), now: () => Date.now(),
  }, { stored, kept, blank }));
  const [queue] = useState(() => new PhotoQueue({
    send: (photo, onProgress) => uploadFile({ place: { jobId }, file: photo.file, purpose: "site photo", onProgress }),
    keep: keepPhoto,
    onStored: async (photo, file) => {
      keeper.change((content) => withPhoto(content, photo, file));
      await keeper.flush();
    },
  }));
  const state = useSyncExternalStore(keeper.subscribe, keeper.snapshot, keeper.snapshot);
  const photos = useSyncExternalStore(queue.subscribe, queue.snapshot, queue.snapshot);
  useEffect(() => {
    keeper.start();
    queue.start();
    let here = true;
    void keptPhotos(visitId).then((left) => { if (here) queue.resume(left); });
    const online = () => { void keeper.flush(); queue.flush(); };
    const hidden = () => { if (document.visibilityState === "hidden") void keeper.flush(); };
    const leaving = (event: BeforeUnloadEvent) => {
      // What the device keeps is sent by the next page; only what it could not keep needs this one.
      const lost = (!keeper.snapshot().kept && keeper.pending) || queue.snapshot().some((each) => !each.kept);
      if (lost) event.preventDefault();
    };
    window.addEventListener("online", online);
    window.addEventListener("beforeunload", leaving);
    document.addEventListener("visibilitychange", hidden);
    return () => {
      here = false;
      void keeper.flush();
      keeper.stop();
      queue.stop();
      window.removeEventListener("online", online);
      window.removeEventListener("beforeunload", leaving);
      document.removeEventListener("visibilitychange", hidden);
    };
  }, [keeper, queue, visitId]);
  const saved = state.save.kind === "saved";
  useEffect(() => {
    // Files and history of the job say something else now.
    if (saved) { void client.invalidateQueries({ queryKey: ["job", jobId] }); void client.invalidateQueries({ queryKey: ["files", jobId] }); }
  }, [saved, client, jobId]);
  const addPhotos = (files: Iterable<File>, target: PhotoTarget): void => {
    for (const file of [...files]) void queue.add({ key: newId("photo"), jobId, visitId, target, file, addedAt: Date.now() });
  };
  return { keeper, queue, state, photos, addPhotos };
}
export type OpenVisit = ReturnType<typeof useVisit>;
