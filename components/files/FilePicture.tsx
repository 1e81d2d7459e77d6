"use client";

import { useState } from "react";
import type { FileAnswer } from "@/lib/api";
import { fileUrl } from "@/lib/client/filesApi";

interface FilePictureProps {
  file: Pick<FileAnswer, "id" | "name" | "widthPx" | "heightPx">;
  width?: 320 | 1280;
  /** What it shows; empty where its name stands beside it. */
  alt: string;
  className?: string;
}

/** A stored picture, made smaller by the server. Keeps its room while it loads. */
export function FilePicture({ file, width = 320, alt, className = "" }: FilePictureProps) {
  const [failed, setFailed] = useState(false);
  if (failed) return <span className={`grid place-items-center bg-panel px-1 text-center text-small text-ink3 ${className}`}>{alt === "" ? "No picture" : `${alt}: the picture could not be loaded`}</span>;
  return (
    // Behind the session and made to size by the server already; an optimizer has no use for it.
    // eslint-disable-next-line @next/next/no-img-element
    <img
      src={fileUrl(file.id, { width })} alt={alt} width={file.widthPx ?? undefined} height={file.heightPx ?? undefined} loading="lazy" decoding="async"
      onError={() => setFailed(true)} className={`bg-panel ${className}`}
    />
  );
}
