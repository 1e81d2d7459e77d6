"use client";

import { useState } from "react";
import type { FileAnswer } from "@/lib/api";
import { dateWords, sizeWords } from "@/lib/client/dates";
import { fileUrl, useRemoveFile, type FilePlace } from "@/lib/client/filesApi";
import { Button, buttonClass } from "@/components/ui/Button";
import { Dialog } from "@/components/ui/Dialog";
import { Refused } from "@/components/ui/Notes";
import { FilePicture } from "./FilePicture";

const counted = (count: number, word: string) => `${count.toLocaleString("en-US")} ${word}${count === 1 ? "" : "s"}`;

/** Kind and size of a file: "PDF, 12 pages, 3.1 MB", "4032 × 3024 px, 2.4 MB". */
export function fileFacts(file: FileAnswer): string {
  const what = file.contentType === "application/pdf" ? `PDF, ${counted(file.pages ?? 0, "page")}` : `${file.widthPx ?? 0} × ${file.heightPx ?? 0} px`;
  return `${what}, ${sizeWords(file.bytes)}`;
}

/** Stored files, newest first, to open, download and remove. */
export function FileList({ files, place }: { files: readonly FileAnswer[]; place: FilePlace }) {
  const [removing, setRemoving] = useState<FileAnswer | null>(null);
  const remove = useRemoveFile(place);
  const close = () => {
    setRemoving(null);
    remove.reset();
  };
  return (
    <>
      <ul aria-label="Files" className="@container">{files.map((file) => <FileRow key={file.id} file={file} onRemove={() => setRemoving(file)} />)}</ul>
      <Dialog
        open={removing !== null} onOpenChange={(open) => !open && close()} title={`Remove ${removing?.name ?? ""}`}
        description="It is taken off this list for everyone. What was sealed with it keeps it."
      >
        <div className="flex items-center gap-3">
          <Button look="primary" busy={remove.isPending} onClick={() => removing && remove.mutate(removing.id, { onSuccess: close })}>Remove it</Button>
          <Button onClick={close}>Keep it</Button>
          <Refused error={remove.error} />
        </div>
      </Dialog>
    </>
  );
}

function FileRow({ file, onRemove }: { file: FileAnswer; onRemove: () => void }) {
  const picture = file.contentType !== "application/pdf";
  return (
    <li className="grid grid-cols-[56px_minmax(0,1fr)_auto] items-center gap-4 border-b border-g2 px-5 py-3 last:border-b-0 @max-[480px]:grid-cols-[56px_minmax(0,1fr)]">
      {picture
        ? <FilePicture file={file} alt="" className="size-14 object-cover shadow-[0_0_0_1px_var(--g1)]" />
        : <span aria-hidden="true" className="grid h-14 w-11 place-items-center justify-self-center border border-ink bg-paper font-lettering text-label">PDF</span>}
      <div className="min-w-0">
        <a href={fileUrl(file.id, { inline: true })} target="_blank" rel="noreferrer" title={file.name} className="block truncate text-finding font-finding hover:underline">{file.name}</a>
        <p className="text-body text-ink2"><span className="first-letter:uppercase inline-block">{file.purpose}</span>. {fileFacts(file)}.</p>
        <p className="text-label text-ink3">{file.uploadedBy}, {dateWords(file.uploadedAt)}</p>
      </div>
      <div className="flex gap-2 @max-[480px]:col-start-2">
        <a href={fileUrl(file.id)} className={`${buttonClass("plain", "bar")} hover:bg-paper`} aria-label={`Download ${file.name}`}>Download</a>
        {file.may.remove && <Button size="bar" look="quiet" aria-label={`Remove ${file.name}`} onClick={onRemove}>Remove</Button>}
      </div>
    </li>
  );
}
