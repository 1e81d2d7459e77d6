"use client";

import { useMemo } from "react";
import type { FileAnswer, LibraryEntryAnswer } from "@/lib/api";
import { useFiles } from "@/lib/client/filesApi";
import { FileDrop } from "@/components/files/FileDrop";
import { FileList } from "@/components/files/FileList";
import { FilePicture } from "@/components/files/FilePicture";
import { Panel } from "@/components/jobs/Panel";

/** Files of an entry as they are now; what came with the entry stands until they are fetched. */
export function useEntryFiles(entry: LibraryEntryAnswer) {
  const place = useMemo(() => ({ entryId: entry.id }), [entry.id]);
  const files: readonly FileAnswer[] = useFiles(place).data?.files ?? entry.files;
  return useMemo(() => ({ place, datasheets: files.filter((file) => file.purpose === "datasheet"), pictures: files.filter((file) => file.purpose === "picture") }), [place, files]);
}
type EntryFiles = ReturnType<typeof useEntryFiles>;

/** Datasheets of the entry: each rated value points to one of them. */
export function DatasheetsPanel({ files, edit }: { files: EntryFiles; edit: boolean }) {
  return (
    <Panel title="Datasheets">
      {edit && <div className="border-b border-g2 p-4"><FileDrop place={files.place} purpose="datasheet" label="Add a datasheet" /></div>}
      {files.datasheets.length === 0 ? <p className="px-5 py-4 text-text text-ink2">None yet. A value whose datasheet is stored can be looked up by everybody who checks it.</p> : <FileList files={files.datasheets} place={files.place} />}
    </Panel>
  );
}

/** What it looks like, for those who have to find it on a wall. */
export function PicturesPanel({ files, edit, name }: { files: EntryFiles; edit: boolean; name: string }) {
  const [first] = files.pictures;
  if (!first && !edit) return null;
  return (
    <Panel title="Picture">
      {first && <FilePicture file={first} width={1280} alt={`Picture of ${name}`} className="max-h-[260px] w-full object-contain" />}
      {edit && <div className="border-t border-g2 p-4"><FileDrop place={files.place} purpose="picture" multiple={false} label={first ? "Add another" : "Add a picture"} /></div>}
      {files.pictures.length > 0 && <div className="border-t border-g2"><FileList files={files.pictures} place={files.place} /></div>}
    </Panel>
  );
}
