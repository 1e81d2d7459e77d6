"use client";

import { useId, useRef, useState, type DragEvent } from "react";
import { FILE_BYTES, FILE_PIXELS, type FileAnswer, type FilePurpose } from "@/lib/api";
import type { FilePlace } from "@/lib/client/filesApi";
import { useUploads } from "@/lib/client/useUploads";
import { Button } from "@/components/ui/Button";
import { SendingRow } from "./SendingRow";

const PICTURES = "image/png,image/jpeg,image/webp";
const ACCEPT: Readonly<Record<FilePurpose, string>> = {
  document: `application/pdf,${PICTURES}`, datasheet: "application/pdf", picture: PICTURES, "site photo": PICTURES, background: PICTURES,
};
const limits = (purpose: FilePurpose) => {
  const size = `up to ${Math.round(FILE_BYTES / 1024 / 1024)} MB`;
  if (purpose === "datasheet") return `PDF, ${size}.`;
  const pictures = `PNG, JPEG or WebP, ${size} and ${FILE_PIXELS / 1e6} megapixels. Location and camera data are taken out.`;
  return purpose === "document" ? `PDF, ${pictures}` : pictures;
};

interface FileDropProps {
  place: FilePlace; purpose: FilePurpose;
  /** What the button says. */
  label?: string;
  multiple?: boolean;
  onStored?: (file: FileAnswer) => void;
}

/** A place to drop files on, with a button that does the same, and the files that are on their way. */
export function FileDrop({ place, purpose, label = "Choose files", multiple = true, onStored }: FileDropProps) {
  const input = useRef<HTMLInputElement>(null);
  const hint = useId();
  const [over, setOver] = useState(false);
  const uploads = useUploads(place, onStored);
  const take = (files: FileList | null) => {
    if (files && files.length > 0) uploads.add(multiple ? files : [...files].slice(0, 1), purpose);
  };
  const drag = (event: DragEvent, inside: boolean) => {
    if (!event.dataTransfer.types.includes("Files")) return;
    event.preventDefault();
    setOver(inside);
  };
  return (
    <div>
      <div
        onDragEnter={(event) => drag(event, true)} onDragOver={(event) => drag(event, true)} onDragLeave={() => setOver(false)}
        onDrop={(event) => { drag(event, false); take(event.dataTransfer.files); }}
        className={`flex flex-wrap items-center gap-x-4 gap-y-2 border border-dashed px-4 py-3 transition-colors duration-quick ${over ? "border-copper bg-tint" : "border-rule bg-vellum"}`}
      >
        <input
          ref={input} type="file" multiple={multiple} accept={ACCEPT[purpose]} aria-label={label} className="sr-only" tabIndex={-1}
          onChange={(event) => { take(event.target.files); event.target.value = ""; }}
        />
        <Button size="bar" aria-describedby={hint} onClick={() => input.current?.click()}>{label}</Button>
        <p id={hint} className="min-w-0 flex-1 basis-48 text-label text-ink2">{over ? "Let go to add." : `Or drop ${multiple ? "them" : "it"} here. ${limits(purpose)}`}</p>
      </div>
      {uploads.list.length > 0 && (
        <ul aria-label="Files on their way" className="border border-t-0 border-g2">
          {uploads.list.map((each) => <SendingRow key={each.key} sending={each} onStop={() => uploads.stop(each.key)} onRetry={() => uploads.retry(each.key)} />)}
        </ul>
      )}
    </div>
  );
}
